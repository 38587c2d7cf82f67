import { parseSettings, type Settings } from '@/server/settings/settings';
import { buildWhenChanged } from './build-when-changed';
import { buildFolders } from './build-folders';
import { openClusterSource, type ClusterSource } from './database/cluster-source';
import { migrateDatabase } from './database/migrate-database';
import { prepareDatabase } from './database/prepare-database';
import { whyPortIsTaken } from './free-port';
import { seedWhenEmpty } from './seed-when-empty';
import { ensureSecret } from './ensure-secret';
import { serve } from './serve';
import { serveDevelopment } from './serve-development';
import { SetupFailure } from './setup-failure.mjs';
import { step } from './step.mjs';

export type Launch = Readonly<{ root: string; stateFolder: string; stop: AbortSignal; dev: boolean }>;

/** Everything of `npm start` that comes after the packages, in order, until it is told to stop. */
export async function launch({ root, stateFolder, stop, dev }: Launch): Promise<void> {
  const settings = parseSettings(process.env);
  await assertPortFree(settings);
  const secret = ensureSecret(stateFolder, settings.secret);
  const opened: { source: ClusterSource | null } = { source: null };
  try {
    await step('database', async () => void (opened.source = await openClusterSource(settings, stateFolder)));
    const { source } = opened;
    if (source === null) throw new Error('The database was opened and is not there.');
    await readyDatabase(root, settings, source.adminUrl, secret);
    stop.throwIfAborted();
    const folders = buildFolders(root);
    if (dev) return await serveDevelopment({ root, settings, secret, adminUrl: source.adminUrl, stop });
    await step('build', () => buildWhenChanged(root, folders));
    stop.throwIfAborted();
    await serve({ root, stateFolder, stop, settings, secret, source, folders });
  } finally {
    await opened.source?.cluster?.stop();
  }
}

/** Looked at first: nobody wants to hear after a minute of building that the port is taken. */
async function assertPortFree({ host, port }: Settings): Promise<void> {
  const reason = await whyPortIsTaken(host, port);
  if (reason === null) return;
  if (reason === 'EADDRINUSE') throw new SetupFailure('takenPort', `Port ${port} on ${host} is taken by another program; stop that one or choose another port, for example "PORT=${port + 1} npm start".`);
  if (reason === 'EACCES') throw new SetupFailure('missingRight', `This user may not listen on port ${port}; choose one from 1024 on, for example "PORT=4050 npm start".`);
  throw new SetupFailure('wrongSetting', `HOST is "${host}", which is no address of this machine (${reason}); 127.0.0.1 always is.`);
}

async function readyDatabase(root: string, settings: Settings, adminUrl: string, secret: string): Promise<void> {
  await step('roles', async () => {
    const { noted } = await prepareDatabase({ adminUrl, secret });
    if (noted.length === 0) return;
    const lacks = `The database server lacks ${noted.join('; ')}.`;
    if (settings.databaseUrl === null) throw new SetupFailure('database', lacks);
    return lacks;
  });
  await step('tables', () => migrateDatabase(root, adminUrl));
  if (settings.demo) await step('demo', () => seedWhenEmpty(adminUrl));
}
