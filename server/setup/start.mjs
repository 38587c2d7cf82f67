// Plain JavaScript: at the first start there are no packages yet.
import { fileURLToPath } from 'node:url';
import { assertNodeVersion } from './assert-node-version.mjs';
import { installPackages } from './install-packages.mjs';
import { readEnvironmentFile } from './read-environment-file.mjs';
import { claimRunning, removeRunning, updateRunning } from './running-record.mjs';
import { endRunningPrograms, watchPrograms } from './run-program.mjs';
import { reportFailure } from './setup-failure.mjs';
import { chooseStateFolder, makeStateFolder } from './state-folder.mjs';
import { step } from './step.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const stop = new AbortController();
let stateFolder = '';

// A terminal that was closed must not take the product's watch with it.
for (const output of [process.stdout, process.stderr]) output.on('error', () => {});

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    stop.abort();
    void endRunningPrograms();
  });
}

async function start() {
  assertNodeVersion(process.versions.node);
  process.chdir(root);
  readEnvironmentFile();
  const folder = chooseStateFolder(root, { wish: process.env.FASCICLE_STATE_FOLDER });
  makeStateFolder(folder);
  const leftBehind = await claimRunning(folder, 'server.mjs');
  stateFolder = folder;
  watchPrograms((programs) => updateRunning(folder, { programs }));
  process.stdout.write(`Fascicle is being set up.${leftBehind ? ' A server that an earlier start left behind was stopped.' : ''}\n`);
  await step('packages', () => installPackages(root));
  const { register } = await import('tsx/esm/api');
  register();
  const { launch } = await import('./launch.ts');
  await launch({ root, stateFolder: folder, stop: stop.signal, dev: process.argv.includes('--dev') });
}

try {
  await start();
  process.exitCode = 0;
} catch (error) {
  process.exitCode = stop.signal.aborted ? 0 : reportFailure(error);
} finally {
  if (stateFolder !== '') removeRunning(stateFolder);
}
process.exit();
