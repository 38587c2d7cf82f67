import { cpSync, mkdirSync, mkdtempSync, readdirSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { makePool, type Handle } from '@/db/connection';
import { migrateDatabase } from '@/server/setup/database/migrate-database';
import { exitStatuses } from '@/server/setup/exit-statuses.mjs';
import { createTestDatabase, type TestDatabase } from '@/tests/support/database';

const checkout = path.resolve(import.meta.dirname, '../../..');
const migration = (statement: string) => `export const up = (knex) => knex.raw(${JSON.stringify(statement)});\nexport const down = () => Promise.resolve();\n`;

let root: string;
let made: TestDatabase;
let admin: Handle;

beforeAll(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'fascicle-migrate-'));
  mkdirSync(path.join(root, 'db'));
  for (const name of ['knexfile.ts', 'tsconfig.json', 'package.json']) cpSync(path.join(checkout, name), path.join(root, name));
  symlinkSync(path.join(checkout, 'node_modules'), path.join(root, 'node_modules'));
});
afterAll(() => rmSync(root, { recursive: true, force: true }));

beforeEach(async () => {
  rmSync(path.join(root, 'db'), { recursive: true, force: true });
  cpSync(path.join(checkout, 'db'), path.join(root, 'db'), { recursive: true });
  made = await createTestDatabase();
  admin = makePool(made.adminUrl, 1, 'fascicle test');
});
afterEach(async () => {
  await admin.destroy();
  await made.drop();
});

const write = (name: string, statement: string) => writeFileSync(path.join(root, 'db/migrations', name), migration(statement));
const noted = async () => (await admin('knex_migrations').orderBy('id').select<{ name: string }[]>('name')).map(({ name }) => name);
const tableIsThere = (name: string) => admin.schema.hasTable(name);
const failureOf = (): Promise<unknown> => migrateDatabase(root, made.adminUrl).catch((error: unknown) => error);

describe('migrateDatabase', () => {
  it('leaves a database alone that has every migration', async () => {
    expect(await migrateDatabase(root, made.adminUrl)).toBe('unchanged');
  });

  it('says which migration failed, in the database\'s words, and what to do; what came before it is kept, of it nothing', async () => {
    write('9001-first.ts', 'create table of_the_first (id int)');
    write('9002-second.ts', 'create table of_the_second (id int); select id - 1 from of_the_first; alter table nowhere add at - - timestamptz');
    write('9003-third.ts', 'create table of_the_third (id int)');
    const error = await failureOf();
    expect(error).toMatchObject({
      status: exitStatuses.database,
      message: 'The migration "9002-second.ts" failed; the database says: syntax error at or near "-". Nothing of that migration was kept and no entry was touched. Mend that and start again, or start the Fascicle that ran on this database before.',
    });
    expect((await noted()).at(-1)).toBe('9001-first.ts');
    expect([await tableIsThere('of_the_first'), await tableIsThere('of_the_second'), await tableIsThere('of_the_third')]).toEqual([true, false, false]);
  });

  it('tells the database\'s own words without the statement before them', async () => {
    write('9001-broken.ts', 'alter table nowhere add column at timestamptz');
    expect(await failureOf()).toMatchObject({ message: expect.stringMatching(/^The migration "9001-broken\.ts" failed; the database says: relation "nowhere" does not exist\. /) });
  });

  it('goes on where a start was killed in the middle of migrating', async () => {
    write('9001-first.ts', 'create table of_the_first (id int)');
    await admin('knex_migrations_lock').update({ is_locked: 1 });
    expect(await migrateDatabase(root, made.adminUrl)).toBe('1 migration');
    expect(await tableIsThere('of_the_first')).toBe(true);
  });

  it('lets two starts at once apply a migration once', async () => {
    write('9001-first.ts', 'create table of_the_first (id int); select pg_sleep(0.3)');
    const outcomes = await Promise.all([migrateDatabase(root, made.adminUrl), migrateDatabase(root, made.adminUrl)]);
    expect(outcomes.sort()).toEqual(['1 migration', 'unchanged']);
  });

  it('refuses a database that a newer program has brought up to date', async () => {
    await admin('knex_migrations').insert({ name: '9009-newer.ts', batch: 9, migration_time: admin.fn.now() });
    expect(await failureOf()).toMatchObject({ status: exitStatuses.database, message: expect.stringContaining('by a newer Fascicle: this one does not know its migration "9009-newer.ts"') });
    expect(await noted()).toHaveLength(readdirSync(path.join(root, 'db/migrations')).length + 1);
  });
});
