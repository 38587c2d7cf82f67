import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { startCluster, type Cluster } from '@/server/setup/database/cluster';
import { findPostgresAccount } from '@/server/setup/database/postgres-account';
import { ensurePostgresPrograms } from '@/server/setup/database/postgres-programs';

export type ThrowawayCluster = Readonly<{ adminUrl: string; cluster: () => Cluster; restart: () => Promise<void>; remove: () => Promise<void> }>;

/** A PostgreSQL of the tests' own, in a folder that goes with it; never the one of `npm start`. */
export async function startThrowawayCluster(): Promise<ThrowawayCluster> {
  const programs = await ensurePostgresPrograms();
  const account = findPostgresAccount();
  const folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-test-'));
  chmodSync(folder, 0o711);
  let running = await startCluster(folder, programs, account);
  return {
    adminUrl: running.adminUrl,
    cluster: () => running,
    restart: async () => {
      running = await startCluster(folder, programs, account);
    },
    remove: async () => {
      await running.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
