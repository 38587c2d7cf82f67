import path from 'node:path';
import type { Settings } from '@/server/settings/settings';
import { buildEnvironment, type BuildFolders } from './build-folders';
import type { ClusterSource } from './database/cluster-source';
import { roleAddresses } from './database/prepare-database';
import { productAddress } from './installation';
import { printWelcome } from './print-welcome';
import { updateRunning } from './running-record.mjs';
import { openServerLog } from './server-log';
import { serverEnvironment } from './server-environment';
import { startServing } from './serving-program';
import { supervise } from './supervise';

type Service = Readonly<{ root: string; stateFolder: string; stop: AbortSignal; settings: Settings; secret: string; source: ClusterSource; folders: BuildFolders }>;

/** Runs the built server under watch. The clock of "ready after" began with this program. */
export async function serve({ root, stateFolder, stop, settings, secret, source, folders }: Service): Promise<void> {
  const logFile = path.join(stateFolder, 'server.log');
  const log = openServerLog(logFile, (line) => process.stderr.write(`${line}\n`));
  await supervise({
    stop,
    cluster: source.cluster,
    restartCluster: source.start,
    startServer: (cluster) => {
      const adminUrl = cluster === null ? source.adminUrl : productAddress(cluster.adminUrl);
      return startServing({
        command: [process.execPath, '--enable-source-maps', folders.serverFile],
        cwd: root,
        environment: { ...serverEnvironment(settings, secret, roleAddresses({ adminUrl, secret })), ...buildEnvironment(folders) },
        log,
        onStarted: (program) => updateRunning(stateFolder, { server: program }),
      });
    },
    onFirstListening: () => {
      updateRunning(stateFolder, { url: settings.publicUrl });
      printWelcome({ url: settings.publicUrl, isDemo: settings.demo, hasOwnDatabase: source.cluster !== null, afterMs: performance.now(), logFile });
    },
    say: (sentence) => process.stderr.write(`${new Date().toISOString()} ${sentence}\n`),
  });
}
