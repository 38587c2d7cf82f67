import { readFile } from 'node:fs/promises';
import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

const logins = 'fascicle_app, fascicle_feed, fascicle_audit';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(await readFile(new URL('../roles.sql', import.meta.url), 'utf8'));
  await knex.raw(`
    revoke create on schema public from public;
    grant usage, create on schema public to fascicle_owner;
    grant usage on schema public to ${logins}, fascicle_migrate;
    grant select, insert, update, delete on knex_migrations, knex_migrations_lock to fascicle_migrate;
    grant usage, select, update on all sequences in schema public to fascicle_migrate;
  `);
  await asOwner(knex, `
    -- The hospitals of the person in whose name this transaction reads; none when nothing was set.
    create function current_hospitals() returns uuid[] language sql stable parallel safe
      return coalesce(string_to_array(nullif(current_setting('app.hospitals', true), ''), ',')::uuid[], '{}'::uuid[]);

    -- As a statement trigger it also answers on an empty table and for an owner whose policies hide every row.
    create function refuse_change() returns trigger language plpgsql set search_path = pg_catalog, pg_temp as $$
    begin
      raise exception '% of % is refused: its rows are never changed or removed.', tg_op, tg_table_name
        using errcode = 'insufficient_privilege', table = tg_table_name;
    end $$;

    revoke all on function current_hospitals(), refuse_change() from public;
    grant execute on function current_hospitals() to ${logins};
  `);
}

/** The roles stay: other databases of the server may use them. */
export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop function refuse_change(); drop function current_hospitals();');
  await knex.raw(`
    revoke select, insert, update, delete on knex_migrations, knex_migrations_lock from fascicle_migrate;
    revoke usage, select, update on all sequences in schema public from fascicle_migrate;
    revoke usage on schema public from ${logins}, fascicle_migrate;
    revoke usage, create on schema public from fascicle_owner;
  `);
}
