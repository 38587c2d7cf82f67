import { spawnSync } from 'node:child_process';
import { SetupFailure } from '../setup-failure.mjs';

export type PostgresAccount = Readonly<{ uid: number; gid: number }>;

/** The account that runs a private database: PostgreSQL refuses root, so root lends it to Debian's `postgres`. Null means this user. */
export function findPostgresAccount(uid = process.getuid?.() ?? 0): PostgresAccount | null {
  if (uid !== 0) return null;
  const found = spawnSync('getent', ['passwd', 'postgres'], { encoding: 'utf8' });
  const [, , accountUid, accountGid] = (found.stdout ?? '').split(':');
  if (!accountUid || !accountGid) {
    throw new SetupFailure('missingRight', 'PostgreSQL does not run as root and there is no user "postgres" on this machine; add it with "adduser --system --group postgres" or start as an ordinary user.');
  }
  return { uid: Number(accountUid), gid: Number(accountGid) };
}
