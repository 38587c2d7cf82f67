import knex from 'knex';
import path from 'node:path';

// A program of its own, because a test's module loader cannot read migrations. Steps every migration up, down and up again
// on the database of DATABASE_URL_ADMIN and prints what the catalogue held after each step.

const CATALOGUE = `
  select 'relation ' || c.relname || ' ' || c.relkind::text || ' ' || c.relowner::regrole || ' ' || coalesce(c.relacl::text, '') || c.relrowsecurity || c.relforcerowsecurity as line
    from pg_class c where c.relnamespace = 'public'::regnamespace and c.relname not like 'knex%'
  union all select 'column ' || a.attrelid::regclass || '.' || a.attname || ' ' || format_type(a.atttypid, a.atttypmod) || ' ' || a.attnotnull || coalesce(a.attacl::text, '')
    from pg_attribute a join pg_class c on c.oid = a.attrelid
    where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' and a.attnum > 0 and not a.attisdropped and c.relname not like 'knex%'
  union all select 'constraint ' || conrelid::regclass || ' ' || conname || ' ' || pg_get_constraintdef(oid) from pg_constraint
    where connamespace = 'public'::regnamespace and conrelid::regclass::text not like 'knex%'
  union all select 'policy ' || tablename || ' ' || policyname || ' ' || cmd || ' ' || roles::text || coalesce(qual, '') || coalesce(with_check, '') from pg_policies where schemaname = 'public'
  union all select 'function ' || oid::regprocedure || ' ' || prosecdef || coalesce(proacl::text, '') || coalesce(proconfig::text, '') from pg_proc where pronamespace = 'public'::regnamespace
  union all select 'trigger ' || pg_get_triggerdef(oid) from pg_trigger where not tgisinternal
  union all select 'schema ' || coalesce(nspacl::text, '') from pg_namespace where nspname = 'public'
  order by 1`;

const database = knex({
  client: 'pg',
  connection: process.env.DATABASE_URL_ADMIN ?? '',
  pool: { min: 0, max: 1 },
  migrations: { directory: path.resolve(import.meta.dirname, '../../db/migrations'), extension: 'ts', loadExtensions: ['.ts'] },
});

async function catalogue(): Promise<string[]> {
  const { rows } = await database.raw<{ rows: { line: string }[] }>(CATALOGUE);
  return rows.map((row) => row.line);
}

try {
  const [, pending] = (await database.migrate.list()) as [unknown[], unknown[]];
  await database.migrate.rollback(undefined, true);
  const [, all] = (await database.migrate.list()) as [unknown[], unknown[]];
  const up = [await catalogue()];
  for (let step = 0; step < all.length; step += 1) {
    await database.migrate.up();
    up.push(await catalogue());
  }
  const down = [await catalogue()];
  for (let step = 0; step < all.length; step += 1) {
    await database.migrate.down();
    down.push(await catalogue());
  }
  await database.migrate.latest();
  process.stdout.write(JSON.stringify({ pending: pending.length, count: all.length, up, down, again: await catalogue() }));
} finally {
  await database.destroy();
}
