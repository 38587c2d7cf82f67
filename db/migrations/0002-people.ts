import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

const tables = `
  create table hospitals (
    id uuid primary key,
    slug text not null unique check (slug ~ '^[a-z0-9]+(-[a-z0-9]+)*$'),
    name text not null unique check (length(name) between 1 and 200),
    time_zone text not null check (length(time_zone) between 1 and 60),
    created_at timestamptz not null default now()
  );
  create table theatres (
    hospital_id uuid not null references hospitals (id),
    id uuid not null unique,
    name text not null check (length(name) between 1 and 80),
    primary key (hospital_id, id),
    unique (hospital_id, name)
  );
  create table people (
    id uuid primary key,
    email text not null unique check (email = lower(email) and email like '%_@_%' and length(email) <= 254),
    display_name text not null check (length(display_name) between 1 and 200),
    password_hash text not null,
    second_factor_secret text not null,
    second_factor_step bigint not null default -1,
    is_demo boolean not null default false,
    created_at timestamptz not null default now()
  );
  create table memberships (
    hospital_id uuid not null references hospitals (id),
    person_id uuid not null references people (id),
    role text not null check (role in ('neurophysiologist', 'surgeon', 'physician', 'reviewer', 'administrator')),
    created_at timestamptz not null default now(),
    revoked_at timestamptz,
    primary key (hospital_id, person_id, role)
  );
  create index memberships_person on memberships (person_id);
  create table sessions (
    id uuid primary key,
    person_id uuid not null references people (id),
    created_at timestamptz not null default now(),
    expires_at timestamptz not null,
    last_seen_at timestamptz not null default now(),
    reauthenticated_at timestamptz,
    revoked_at timestamptz,
    check (expires_at > created_at)
  );
  create index sessions_person on sessions (person_id) where revoked_at is null;
  create table sign_in_attempts (
    id bigint generated always as identity primary key,
    email_hash bytea not null check (octet_length(email_hash) = 32),
    address text not null check (length(address) between 1 and 64),
    at timestamptz not null default now(),
    succeeded boolean not null
  );
  create index sign_in_attempts_email on sign_in_attempts (email_hash, at);
  create index sign_in_attempts_address on sign_in_attempts (address, at);
`;

const policies = `
  alter table hospitals enable row level security, force row level security;
  alter table theatres enable row level security, force row level security;
  alter table people enable row level security, force row level security;
  alter table memberships enable row level security, force row level security;
  create policy owner_reads on hospitals for select to fascicle_owner using (true);
  create policy owner_reads on people for select to fascicle_owner using (true);
  create policy owner_steps on people for update to fascicle_owner using (true);
  create policy owner_reads on memberships for select to fascicle_owner using (true);
  create policy own_hospitals on hospitals for select to fascicle_app using (id = any ((select current_hospitals())::uuid[]));
  create policy own_hospitals on theatres for select to fascicle_app using (hospital_id = any ((select current_hospitals())::uuid[]));
  create policy own_hospitals on memberships for select to fascicle_app using (hospital_id = any ((select current_hospitals())::uuid[]));
  -- A person is seen by those who share a hospital with them: the subquery passes memberships' own policy first.
  create policy own_hospitals on people for select to fascicle_app
    using (exists (select from memberships where memberships.person_id = people.id));
  grant select on hospitals, theatres, memberships to fascicle_app;
  grant select (id, email, display_name, is_demo) on people to fascicle_app;
  grant select, insert, update (last_seen_at, reauthenticated_at, revoked_at) on sessions to fascicle_app;
  grant select, insert on sign_in_attempts to fascicle_app;
`;

// Signing in and every request ask about one person before any hospital is known. The application therefore has no right
// to read password hashes, second-factor secrets or foreign memberships at all; it may only ask these functions, each of
// which answers about one person at a time (a lost WHERE or an injected one can not empty the table). They run as the
// owner, which cannot log in, with a fixed search path.
const functions = `
  create function credentials_by_email(wanted text) returns setof people
    language sql stable security definer rows 1 set search_path = pg_catalog, pg_temp
    as 'select * from public.people where email = pg_catalog.lower(wanted)';
  create function credentials_by_person(wanted uuid) returns setof people
    language sql stable security definer rows 1 set search_path = pg_catalog, pg_temp
    as 'select * from public.people where id = wanted';
  create function demo_people() returns setof people
    language sql stable security definer set search_path = pg_catalog, pg_temp
    as 'select * from public.people where is_demo order by email';
  -- A code is good once: only a later time step than the last accepted one is taken, also when two requests race.
  create function accept_second_factor_step(wanted uuid, step bigint) returns boolean
    language sql volatile security definer set search_path = pg_catalog, pg_temp
    as 'with taken as (update public.people set second_factor_step = step where id = wanted and second_factor_step < step returning 1)
        select exists (select from taken)';
  create function live_memberships(wanted uuid)
    returns table (hospital_id uuid, hospital_name text, time_zone text, role text)
    language sql stable security definer set search_path = pg_catalog, pg_temp
    as 'select m.hospital_id, h.name, h.time_zone, m.role from public.memberships m join public.hospitals h on h.id = m.hospital_id
        where m.person_id = wanted and m.revoked_at is null order by h.name, m.role';
  create function session_person(wanted uuid)
    returns table (person_id uuid, email text, display_name text, is_demo boolean, expires_at timestamptz, reauthenticated_at timestamptz)
    language sql stable security definer rows 1 set search_path = pg_catalog, pg_temp
    as 'select p.id, p.email, p.display_name, p.is_demo, s.expires_at, s.reauthenticated_at
        from public.sessions s join public.people p on p.id = s.person_id
        where s.id = wanted and s.revoked_at is null and s.expires_at > pg_catalog.now()';
`;

const signatures = [
  'credentials_by_email(text)',
  'credentials_by_person(uuid)',
  'demo_people()',
  'accept_second_factor_step(uuid, bigint)',
  'live_memberships(uuid)',
  'session_person(uuid)',
].join(', ');

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, tables);
  await asOwner(knex, policies);
  await asOwner(knex, functions);
  await asOwner(knex, `revoke all on function ${signatures} from public; grant execute on function ${signatures} to fascicle_app;`);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, `drop function ${signatures};`);
  await asOwner(knex, 'drop table sign_in_attempts, sessions, memberships, people, theatres, hospitals;');
}
