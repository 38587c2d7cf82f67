import type { Handle } from '@/db/connection';

/** Who tries to sign in, from where; the address typed is kept as a hash only. */
export interface Attempt {
  readonly emailHash: Uint8Array;
  readonly address: string;
}

/** How many failures are allowed of an account and of a machine, and within which time. */
export interface AttemptLimits {
  readonly windowS: number;
  readonly perAccount: number;
  readonly perAddress: number;
}

/** An attempt that may go on has an id; one that may not has none. The failures are those that stood before it. */
export interface BegunAttempt {
  readonly id: number | null;
  readonly byEmail: number;
  readonly byAddress: number;
}

const LOCK = `select pg_advisory_xact_lock(:kind, hashtext(:key))`;
const COUNT = `
  select
    (select count(*) from sign_in_attempts a where a.email_hash = :emailHash and not a.succeeded and a.at > now() - make_interval(secs => :windowS)
      and a.at > coalesce((select max(b.at) from sign_in_attempts b where b.email_hash = :emailHash and b.succeeded), '-infinity')) as by_email,
    (select count(*) from sign_in_attempts a where a.address = :address and not a.succeeded and a.at > now() - make_interval(secs => :windowS)) as by_address`;
const [ACCOUNT, MACHINE] = [4_050_001, 4_050_002];

/**
 * Counts an attempt as failed before anything is looked at, so that attempts side by side, in however many processes,
 * cannot outrun the count. One past a limit is not counted: hammering does not prolong the wait of the account's owner.
 */
export async function beginAttempt(handle: Handle, { emailHash, address }: Attempt, limits: AttemptLimits): Promise<BegunAttempt> {
  const hash = Buffer.from(emailHash);
  return handle.transaction(async (transaction) => {
    // Always in this order, so that no two wait for each other.
    await transaction.raw(LOCK, { kind: ACCOUNT, key: hash.toString('hex') });
    await transaction.raw(LOCK, { kind: MACHINE, key: address });
    const { rows } = await transaction.raw<{ rows: { by_email: number; by_address: number }[] }>(COUNT, { emailHash: hash, address, windowS: limits.windowS });
    const [byEmail, byAddress] = [rows[0]?.by_email ?? 0, rows[0]?.by_address ?? 0];
    if (byEmail >= limits.perAccount || byAddress >= limits.perAddress) return { id: null, byEmail, byAddress };
    const begun = await transaction('sign_in_attempts').insert({ email_hash: hash, address, succeeded: false }).returning<{ id: number }[]>('id');
    return { id: begun[0]?.id ?? null, byEmail, byAddress };
  });
}

/** The attempt was right: what failed before it counts no more against the account. */
export async function noteSuccess(handle: Handle, attemptId: number): Promise<void> {
  await handle('sign_in_attempts').where({ id: attemptId }).update({ succeeded: true });
}
