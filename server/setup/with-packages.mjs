// Plain JavaScript: at the first run there are no packages yet. Installs them, then runs the TypeScript file that is named.
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { assertNodeVersion } from './assert-node-version.mjs';
import { installPackages } from './install-packages.mjs';
import { endRunningPrograms } from './run-program.mjs';
import { reportFailure } from './setup-failure.mjs';
import { step } from './step.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const stop = new AbortController();

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    stop.abort();
    void endRunningPrograms();
  });
}

/**
 * @param {string} file exports `run(words, stop)`, which gives the exit status
 * @param {readonly string[]} words
 * @returns {Promise<number>}
 */
async function runWithPackages(file, words) {
  assertNodeVersion(process.versions.node);
  process.chdir(root);
  await step('packages', () => installPackages(root));
  const { register } = await import('tsx/esm/api');
  register();
  const { run } = await import(pathToFileURL(path.join(root, file)).href);
  return run(words, stop.signal);
}

try {
  const [file = '', ...words] = process.argv.slice(2);
  process.exitCode = await runWithPackages(file, words);
} catch (error) {
  process.exitCode = reportFailure(error);
}
process.exit();
