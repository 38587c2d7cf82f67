import { spawn } from 'node:child_process';
import path from 'node:path';
import { settings } from '@/server/settings/settings';
import { findPostgresPrograms } from './database/postgres-programs';
import { openInstallation } from './installation';
import { readEnvironmentFile } from './read-environment-file.mjs';
import { reportFailure, SetupFailure } from './setup-failure.mjs';

/** Opens psql on the product's database as its administrator: `npm run psql`, or `npm run psql -- -c "select …"`. */
async function openPsql(words: readonly string[]): Promise<number> {
  readEnvironmentFile();
  const { adminUrl } = openInstallation(settings());
  const folder = await findPostgresPrograms();
  const url = new URL(adminUrl);
  const environment = { ...process.env, PGPASSWORD: decodeURIComponent(url.password) };
  // Without the password in the address: others on this machine see the words a program was started with.
  url.password = '';
  const child = spawn(folder === null ? 'psql' : path.join(folder, 'psql'), [url.href, ...words], { stdio: 'inherit', env: environment });
  return new Promise((resolve, reject) => {
    child.once('error', (error) => reject(new SetupFailure('missingRight', `psql could not be started: ${error.message}.`, error)));
    child.once('close', (code) => resolve(code ?? 1));
  });
}

try {
  process.exitCode = await openPsql(process.argv.slice(2));
} catch (error) {
  process.exitCode = reportFailure(error);
}
