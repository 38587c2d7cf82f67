import knex from 'knex';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { Client } from 'pg';
import type { MigrationsReport } from './migrations-report';

// A program of its own, started in the folder that holds knexfile.ts: applies what is missing, one at a time, and prints
// one line of JSON. It never fails by its status alone, so that its starter can say which migration failed and why.

const lockNumber = 4_050_006;
const patience = '120s';

async function runMigrations(): Promise<MigrationsReport> {
  const { default: config } = (await import(pathToFileURL(path.resolve('knexfile.ts')).href)) as { default: knex.Knex.Config };
  const guard = new Client({ connectionString: process.env.DATABASE_URL_ADMIN, options: `-c lock_timeout=${patience}` });
  const database = knex({ ...config, compileSqlOnError: false, log: { warn: () => undefined, error: () => undefined } });
  let applied = 0;
  let next: string | null = null;
  let firstWords: string | null = null;
  // Knex puts the whole statement before what the database said, and errors after the first say only that there was one.
  database.on('query-error', (error: Error, { sql }: { sql: string }) => (firstWords ??= error.message.slice(`${sql} - `.length)));
  try {
    await guard.connect();
    // This lock ends with its program. With it held, the mark that knex leaves in its table is one of a program that was killed.
    await guard.query('select pg_advisory_lock($1)', [lockNumber]);
    await database.migrate.forceFreeMigrationsLock();
    for (;;) {
      const [, pending] = (await database.migrate.list()) as [unknown, { file: string }[]];
      next = pending[0]?.file ?? null;
      if (next === null) return { applied, failed: null, reason: null };
      firstWords = null;
      await database.migrate.up();
      applied += 1;
    }
  } catch (error) {
    return { applied, failed: next, reason: firstWords ?? (error instanceof Error ? error.message : String(error)) };
  } finally {
    await database.destroy();
    await guard.end().catch(() => undefined);
  }
}

process.stdout.write(`\n${JSON.stringify(await runMigrations())}\n`);
