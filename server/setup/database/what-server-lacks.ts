import type { Client } from 'pg';

export type ServerLacks = Readonly<{ refused: readonly string[]; noted: readonly string[] }>;

const lowestVersion = 150_000;

/**
 * What a database server lacks for a record that must not be lost. Refused: it may forget what it acknowledged, or cannot
 * be set up by this user. Noted: it keeps less watch than a server set up by us.
 */
export async function whatServerLacks(client: Client): Promise<ServerLacks> {
  const show = async (name: string) => (await client.query<{ value: string }>('select current_setting($1) as value', [name])).rows[0]?.value ?? '';
  const refused: string[] = [];
  const noted: string[] = [];
  if (Number(await show('server_version_num')) < lowestVersion) refused.push(`PostgreSQL 15 or later (this is ${await show('server_version')})`);
  if ((await show('fsync')) !== 'on') refused.push('fsync = on (a power cut would destroy the record)');
  if ((await show('synchronous_commit')) === 'off') refused.push('synchronous_commit = on (an entry would be acknowledged before it is on disk)');
  for (const override of await weakenedRoles(client)) refused.push(`synchronous_commit = on for ${override}`);
  if (!(await mayCreateRoles(client))) refused.push('a user in DATABASE_URL with the attribute CREATEROLE');
  if ((await show('full_page_writes')) !== 'on') noted.push('full_page_writes = on (a torn page after a power cut is not repaired)');
  if ((await show('data_checksums')) !== 'on') noted.push('data checksums (a damaged page is not noticed)');
  return { refused, noted };
}

/** A role or a database may carry its own setting, which the administrator's session does not show. */
async function weakenedRoles(client: Client): Promise<string[]> {
  const found = await client.query<{ place: string }>(
    `select coalesce('the role ' || r.rolname, 'the database ' || d.datname, 'every role') as place
       from pg_db_role_setting s left join pg_roles r on r.oid = s.setrole left join pg_database d on d.oid = s.setdatabase
      where 'synchronous_commit=off' = any (s.setconfig) and (d.datname is null or d.datname = current_database())`,
  );
  return found.rows.map((row) => row.place);
}

async function mayCreateRoles(client: Client): Promise<boolean> {
  const found = await client.query<{ may: boolean }>('select rolsuper or rolcreaterole as may from pg_roles where rolname = current_user');
  return found.rows[0]?.may === true;
}
