import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

const tables = `
  create table wall_screens (
    id uuid primary key,
    hospital_id uuid references hospitals (id),
    theatre_id uuid,
    case_id uuid,
    token_hash bytea not null unique check (octet_length(token_hash) = 32),
    code text not null check (length(code) between 4 and 12),
    words text not null check (length(words) between 3 and 80),
    asked_at timestamptz not null default now(),
    paired_at timestamptz,
    paired_by uuid references people (id),
    revoked_at timestamptz,
    ended_at timestamptz,
    last_seen_at timestamptz,
    foreign key (hospital_id, case_id) references cases (hospital_id, id),
    foreign key (hospital_id, theatre_id) references theatres (hospital_id, id),
    constraint wall_screens_paired check (
      (paired_at is null and hospital_id is null and case_id is null and paired_by is null)
      or (paired_at is not null and hospital_id is not null and case_id is not null and paired_by is not null))
  );
  create unique index wall_screens_code on wall_screens (code) where paired_at is null and revoked_at is null;
  create index wall_screens_case on wall_screens (case_id) where revoked_at is null;

  -- Who looked at what, and who was not let. Also reads of cases that do not exist, hence no foreign key to cases.
  create table read_audit (
    id bigint generated always as identity primary key,
    hospital_id uuid not null references hospitals (id),
    person_id uuid references people (id),
    screen_id uuid references wall_screens (id),
    case_id uuid,
    what text not null check (length(what) between 1 and 80),
    at timestamptz not null default now(),
    outcome text not null check (outcome in ('allowed', 'denied')),
    rule text not null check (length(rule) between 1 and 120),
    check (person_id is not null or screen_id is not null)
  );
  create index read_audit_hospital on read_audit (hospital_id, at);
  create index read_audit_case on read_audit (case_id, at);
  create trigger read_audit_never_changes before update or delete or truncate on read_audit for each statement execute function refuse_change();
`;

const ownHospitals = 'hospital_id = any ((select current_hospitals())::uuid[])';

// A screen that waits belongs to no hospital yet: anyone who reads in the name of a hospital may find it by its code and
// take it in, never into another hospital. With no hospital set nothing is seen.
const policies = `
  alter table wall_screens enable row level security, force row level security;
  alter table read_audit enable row level security, force row level security;
  create policy owner_reads on wall_screens for select to fascicle_owner using (true);
  create policy asks on wall_screens for insert to fascicle_app with check (hospital_id is null);
  create policy own_hospitals on wall_screens for select to fascicle_app
    using (${ownHospitals} or (hospital_id is null and cardinality((select current_hospitals())) > 0));
  create policy own_hospitals_change on wall_screens for update to fascicle_app
    using (${ownHospitals} or (hospital_id is null and cardinality((select current_hospitals())) > 0)) with check (${ownHospitals});
  create policy every_hospital on wall_screens for select to fascicle_feed using (true);
  grant select, insert, update (hospital_id, theatre_id, case_id, paired_at, paired_by, revoked_at, ended_at, last_seen_at) on wall_screens to fascicle_app;
  grant select (id, hospital_id, theatre_id, case_id, paired_at, revoked_at, ended_at, last_seen_at) on wall_screens to fascicle_feed;

  create policy append on read_audit for insert to fascicle_app with check (true);
  create policy own_hospitals on read_audit for select to fascicle_audit using (${ownHospitals});
  grant insert on read_audit to fascicle_app;
  grant select on read_audit to fascicle_audit;

  -- A wall has no person behind it, so its hospital is not known before its token is: asked by the hash of one token.
  create function screen_by_token(wanted bytea) returns setof wall_screens
    language sql stable security definer rows 1 set search_path = pg_catalog, pg_temp
    as 'select * from public.wall_screens where token_hash = wanted';
  revoke all on function screen_by_token(bytea) from public;
  grant execute on function screen_by_token(bytea) to fascicle_app;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, tables);
  await asOwner(knex, policies);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop function screen_by_token(bytea); drop table read_audit, wall_screens;');
}
