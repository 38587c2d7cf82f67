// Plain JavaScript: at the first run there are no packages yet. `npm test -- --full` and `-- --only lib,db`.
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { assertNodeVersion } from '../../server/setup/node-version.mjs';
import { installPackages } from '../../server/setup/packages.mjs';
import { endRunningPrograms } from '../../server/setup/run-program.mjs';
import { reportFailure } from '../../server/setup/setup-failure.mjs';
import { step } from '../../server/setup/step.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const stop = new AbortController();

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    stop.abort();
    void endRunningPrograms();
  });
}

async function test() {
  assertNodeVersion(process.versions.node);
  process.chdir(root);
  const { values } = parseArgs({ options: { full: { type: 'boolean', default: false }, only: { type: 'string', default: '' } } });
  await step('packages', () => installPackages(root));
  const { register } = await import('tsx/esm/api');
  register();
  const { runLevels } = await import('./run-levels.ts');
  return runLevels({ only: values.only.split(',').filter(Boolean), full: values.full, stop: stop.signal });
}

try {
  process.exitCode = await test();
} catch (error) {
  process.exitCode = reportFailure(error);
}
process.exit();
