import { readdirSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { runProgram, tellingLine } from '../run-program.mjs';
import { SetupFailure } from '../setup-failure.mjs';
import { hasCode } from './answers-queries';

/** Brings the tables up to date. A program of its own runs the migrations, because a test's module loader cannot read them. */
export async function migrateDatabase(root: string, adminUrl: string): Promise<string> {
  if (await hasAllMigrations(root, adminUrl)) return 'unchanged';
  const knex = path.join(root, 'node_modules/knex/bin/cli.js');
  const words = ['--import', 'tsx', knex, 'migrate:latest', '--knexfile', 'knexfile.ts'];
  const { status, output } = await runProgram(process.execPath, words, { cwd: root, env: { ...process.env, DATABASE_URL_ADMIN: adminUrl } });
  if (status === 0) return /Batch \d+ run: (\d+ migrations?)/.exec(output)?.[1] ?? 'unchanged';
  throw new SetupFailure('database', `The tables could not be brought up to date: ${tellingLine(output)}.`);
}

/** Saves a second start the program above: the same names noted as there are files, in either direction. */
async function hasAllMigrations(root: string, adminUrl: string): Promise<boolean> {
  const files = readdirSync(path.join(root, 'db/migrations')).filter((name) => name.endsWith('.ts')).sort();
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    const noted = await client.query<{ name: string }>('select name from knex_migrations order by name collate "C"');
    return noted.rows.map((row) => row.name).join() === files.join();
  } catch (error) {
    if (hasCode(error) && error.code === '42P01') return false;
    throw error;
  } finally {
    await client.end();
  }
}
