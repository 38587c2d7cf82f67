import type { Settings } from '@/server/settings/settings';
import { productAddress } from '../installation';
import { startCluster, type Cluster } from './cluster';
import { findPostgresAccount } from './postgres-account';
import { ensurePostgresPrograms } from './postgres-programs';

/** Where the product's database comes from: a private cluster, or a server of the owner's that is neither started nor stopped by us. */
export type ClusterSource = Readonly<{ cluster: Cluster | null; adminUrl: string; start: () => Promise<Cluster> }>;

export async function openClusterSource(settings: Settings, stateFolder: string): Promise<ClusterSource> {
  if (settings.databaseUrl !== null) return { cluster: null, adminUrl: settings.databaseUrl, start: () => Promise.reject(new Error('This database server is not ours to start.')) };
  const programs = await ensurePostgresPrograms();
  const account = findPostgresAccount();
  const start = () => startCluster(stateFolder, programs, account);
  const cluster = await start();
  return { cluster, adminUrl: productAddress(cluster.adminUrl), start };
}
