import type { Knex } from 'knex';

/** Runs one migration's statements as the role that owns every table, and gives the role back before knex notes the migration. */
export async function asOwner(knex: Knex, statements: string): Promise<void> {
  await knex.raw('set local role fascicle_owner');
  await knex.raw(statements);
  await knex.raw('reset role');
}
