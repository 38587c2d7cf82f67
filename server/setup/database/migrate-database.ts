import { readdirSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { runProgram, tellingLine } from '../run-program.mjs';
import { SetupFailure } from '../setup-failure.mjs';
import { hasCode } from './answers-queries';
import { readMigrationsReport } from './migrations-report';

/** Brings the tables up to date. A program of its own runs the migrations, because a test's module loader cannot read them. */
export async function migrateDatabase(root: string, adminUrl: string): Promise<string> {
  const files = readdirSync(path.join(root, 'db/migrations')).filter((name) => name.endsWith('.ts')).sort();
  const noted = await notedMigrations(adminUrl);
  const unknown = noted.filter((name) => !files.includes(name));
  if (unknown.length > 0) throw newerDatabase(unknown);
  if (noted.length === files.length) return 'unchanged';
  const words = ['--import', 'tsx', path.join(import.meta.dirname, 'run-migrations.ts')];
  const { output } = await runProgram(process.execPath, words, { cwd: root, env: { ...process.env, DATABASE_URL_ADMIN: adminUrl } });
  const report = readMigrationsReport(output);
  if (report === null) throw new SetupFailure('database', `The tables could not be brought up to date: ${tellingLine(output)}.`);
  if (report.reason !== null) throw failedMigration(report.failed, report.reason);
  return report.applied === 0 ? 'unchanged' : `${report.applied} migration${report.applied === 1 ? '' : 's'}`;
}

/** Saves a second start the program above: the names that this database has noted. */
async function notedMigrations(adminUrl: string): Promise<string[]> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    return (await client.query<{ name: string }>('select name from knex_migrations order by name collate "C"')).rows.map((row) => row.name);
  } catch (error) {
    if (hasCode(error) && error.code === '42P01') return [];
    throw error;
  } finally {
    await client.end();
  }
}

function newerDatabase(unknown: readonly string[]): SetupFailure {
  const names = unknown.map((name) => `"${name}"`).join(', ');
  return new SetupFailure('database', `The database was brought up to date by a newer Fascicle: this one does not know its migration ${names}. Nothing was changed; start the newer one, or give another database.`);
}

function failedMigration(failed: string | null, reason: string): SetupFailure {
  const words = reason.replace(/\.$/, '');
  if (failed === null) return new SetupFailure('database', `The tables could not be brought up to date; the database says: ${words}. Nothing was changed; mend that and start again.`);
  return new SetupFailure(
    'database',
    `The migration "${failed}" failed; the database says: ${words}. Nothing of that migration was kept and no entry was touched. Mend that and start again, or start the Fascicle that ran on this database before.`,
  );
}
