import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

// A person's token for a program of theirs. Only its hash is kept, and the application can write a hash but not read one.
const table = `
  create table access_tokens (
    id uuid primary key,
    token_hash bytea not null unique check (octet_length(token_hash) = 32),
    person_id uuid not null references people (id),
    label text not null check (length(label) between 1 and 60),
    created_at timestamptz not null default now(),
    expires_at timestamptz not null,
    revoked_at timestamptz,
    last_used_at timestamptz,
    check (expires_at > created_at)
  );
  create index access_tokens_person on access_tokens (person_id);
  grant insert, select (id, person_id, label, created_at, expires_at, revoked_at, last_used_at), update (revoked_at) on access_tokens to fascicle_app;
`;

// Whose token it is, asked by the hash of one token: the person of a token that is neither revoked nor past its time. The
// time of use is noted once a minute at most, so that a busy program does not write at every request.
const use = `
  create function use_access_token(wanted bytea)
    returns table (token_id uuid, person_id uuid, email text, display_name text, is_demo boolean, expires_at timestamptz)
    language sql volatile security definer rows 1 set search_path = pg_catalog, pg_temp
    as $$
      with noted as (
        update public.access_tokens set last_used_at = now() where token_hash = wanted and revoked_at is null and expires_at > now()
          and (last_used_at is null or last_used_at < now() - interval '1 minute'))
      select t.id, p.id, p.email, p.display_name, p.is_demo, t.expires_at
        from public.access_tokens t join public.people p on p.id = t.person_id
        where t.token_hash = wanted and t.revoked_at is null and t.expires_at > now()
    $$;
  revoke all on function use_access_token(bytea) from public;
  grant execute on function use_access_token(bytea) to fascicle_app;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, table);
  await asOwner(knex, use);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop function use_access_token(bytea); drop table access_tokens;');
}
