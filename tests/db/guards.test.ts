import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { noteRead } from '@/db/repositories/reads/note-read';
import { eraseIdentity } from '@/db/repositories/cases/erase-identity';
import { withinHospitals } from '@/db/within-hospitals';
import { addCase, openRecordDatabase, type RecordDatabase } from './record-database';

const REFUSED = '42501';
const recordTables = ['entries', 'cases', 'read_audit', 'identity_erasures'] as const;
const changes = [
  (table: string) => `update ${table} set hospital_id = hospital_id`,
  (table: string) => `delete from ${table}`,
  (table: string) => `truncate ${table} cascade`,
];

let db: RecordDatabase;
let caseId: string;
beforeAll(async () => {
  db = await openRecordDatabase();
  ({ caseId } = await addCase(db.database.app, db.hospital, ['case.opened']));
  await noteRead(db.database.app, { hospitalId: db.hospital.id, personId: db.hospital.deskId, screenId: null, caseId, what: 'case', outcome: 'allowed', rule: 'test' });
  await withinHospitals(db.database.app, [db.hospital.id], (transaction) => eraseIdentity(transaction, caseId, db.hospital.deskId, 'Asked by the patient'));
});
afterAll(() => db.drop());

async function codeOf(knex: Knex, ...statements: readonly string[]): Promise<string> {
  try {
    await knex.transaction(async (transaction) => {
      for (const statement of statements) await transaction.raw(statement);
    });
    return 'done';
  } catch (error) {
    return (error as { code: string }).code;
  }
}

describe('a record table', () => {
  test.each(recordTables)('%s holds a row, so that a refusal is not about nothing', async (table) => {
    expect((await db.admin(table).count<{ count: number }[]>())[0]?.count).toBeGreaterThan(0);
  });

  test.each(recordTables)('%s refuses update, delete and truncate to every login, to its owner and to a superuser', async (table) => {
    for (const change of changes.map((write) => write(table))) {
      const hospitals = `set local app.hospitals = '${db.hospital.id}'`;
      expect(await codeOf(db.database.app, hospitals, change), `app: ${change}`).toBe(REFUSED);
      expect(await codeOf(db.database.feed, change), `feed: ${change}`).toBe(REFUSED);
      expect(await codeOf(db.database.audit, hospitals, change), `audit: ${change}`).toBe(REFUSED);
      expect(await codeOf(db.admin, 'set local role fascicle_owner', hospitals, change), `owner: ${change}`).toBe(REFUSED);
      expect(await codeOf(db.admin, change), `superuser: ${change}`).toBe(REFUSED);
    }
    expect((await db.admin(table).count<{ count: number }[]>())[0]?.count).toBeGreaterThan(0);
  });
});

describe('the application role', () => {
  test.each([
    'alter table entries disable trigger all',
    'drop trigger entries_guard on entries',
    'alter table entries no force row level security',
    'drop table entries',
    'set role fascicle_owner',
    "set session_replication_role = 'replica'",
    'create function public.mine() returns int language sql as $$ select 1 $$',
    'create table public.mine (id int)',
    'alter function guard_entry() rename to mine',
    'grant select on people to public',
    'delete from case_identities',
    'update people set second_factor_step = 0',
    'select password_hash from people',
    'select second_factor_secret from people',
    'select * from read_audit',
    'insert into hospitals (id, slug, name, time_zone) values (gen_random_uuid(), \'x\', \'x\', \'x\')',
    'update memberships set role = \'administrator\'',
  ])('is refused: %s', async (statement) => {
    expect(await codeOf(db.database.app, statement)).toBe(REFUSED);
  });

  test('is refused to become the administrator', async () => {
    expect(await codeOf(db.database.app, `set role "${new URL(db.urls.admin).username}"`)).toBe(REFUSED);
  });

  test('and the others are neither superuser nor able to pass row-level security, and the owner cannot log in', async () => {
    const roles = await db.admin('pg_roles').whereLike('rolname', 'fascicle\\_%').orderBy('rolname').select('rolname', 'rolsuper', 'rolbypassrls', 'rolcanlogin', 'rolcreaterole');
    expect(roles).toEqual(
      ['app', 'audit', 'feed', 'migrate', 'owner'].map((name) => ({
        rolname: `fascicle_${name}`, rolsuper: false, rolbypassrls: false, rolcanlogin: name !== 'owner', rolcreaterole: false,
      })),
    );
  });
});

describe('every table', () => {
  test('with a hospital has row-level security, forced', async () => {
    const { rows } = await db.admin.raw<{ rows: { relname: string; safe: boolean }[] }>(`
      select distinct c.relname, c.relrowsecurity and c.relforcerowsecurity as safe from pg_class c
      join pg_attribute a on a.attrelid = c.oid and a.attname = 'hospital_id' and not a.attisdropped
      where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' order by 1`);
    expect(rows.length).toBeGreaterThanOrEqual(9);
    expect(rows.filter((row) => !row.safe)).toEqual([]);
  });

  test('belongs to the role that cannot log in', async () => {
    const { rows } = await db.admin.raw<{ rows: { tablename: string }[] }>(
      `select tablename from pg_tables where schemaname = 'public' and tablename not like 'knex%' and tableowner <> 'fascicle_owner'`,
    );
    expect(rows).toEqual([]);
  });

  test('no function that runs as its owner is open to everyone or lacks a fixed search path', async () => {
    const { rows } = await db.admin.raw<{ rows: { name: string }[] }>(`
      select p.oid::regprocedure::text as name from pg_proc p
      where p.pronamespace = 'public'::regnamespace and p.prosecdef
        and (has_function_privilege('public', p.oid, 'execute') or p.proconfig is null or p.proconfig[1] not like 'search_path=pg_catalog, pg_temp')`);
    expect(rows).toEqual([]);
  });
});
