import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

// Who has which case open, in which process of the server. Not part of any record: lost with a crash of the database, when
// every process writes its own rows again within a second.
const table = `
  create unlogged table case_presence (
    process_id uuid not null,
    viewer_id text not null check (length(viewer_id) between 1 and 60),
    hospital_id uuid not null,
    case_id uuid not null,
    person_id uuid,
    screen_id uuid,
    role text not null check (length(role) between 1 and 60),
    display_name text not null check (length(display_name) <= 200),
    is_desk boolean not null,
    since timestamptz not null,
    seen_at timestamptz not null,
    left_at timestamptz,
    primary key (process_id, viewer_id, case_id),
    foreign key (hospital_id, case_id) references cases (hospital_id, id),
    check ((person_id is null) <> (screen_id is null))
  );
  create index case_presence_case on case_presence (case_id);
  alter table case_presence enable row level security, force row level security;
  create policy owner_keeps on case_presence to fascicle_owner using (true) with check (true);
  create policy every_hospital on case_presence for select to fascicle_feed using (true);
  grant select on case_presence to fascicle_feed;
`;

// One statement a second for all viewers of a process, and the whole truth each time: who is not named has left. Rows go
// after a day, which is longer than any case lasts, so that "desk not connected since" can be said until then.
const hold = `
  create function hold_presence(holder uuid, viewers jsonb) returns void
    language sql volatile security definer set search_path = pg_catalog, pg_temp
    as $$
      with present as (
        select * from jsonb_to_recordset(viewers) as (viewer_id text, hospital_id uuid, case_id uuid, person_id uuid,
          screen_id uuid, role text, display_name text, is_desk boolean, since timestamptz)),
      gone as (
        delete from public.case_presence p where coalesce(p.left_at, p.seen_at) < now() - interval '1 day'
          and (p.process_id <> holder or p.left_at is not null)
          and not exists (select from present h where p.process_id = holder and h.viewer_id = p.viewer_id and h.case_id = p.case_id)),
      departed as (
        update public.case_presence p set left_at = now() where p.process_id = holder and p.left_at is null
          and not exists (select from present h where h.viewer_id = p.viewer_id and h.case_id = p.case_id))
      insert into public.case_presence (process_id, viewer_id, hospital_id, case_id, person_id, screen_id, role, display_name, is_desk, since, seen_at)
        select holder, viewer_id, hospital_id, case_id, person_id, screen_id, role, display_name, is_desk, since, now() from present
        on conflict (process_id, viewer_id, case_id)
        do update set role = excluded.role, is_desk = excluded.is_desk, since = excluded.since, seen_at = now(), left_at = null
    $$;
  revoke all on function hold_presence(uuid, jsonb) from public;
  grant execute on function hold_presence(uuid, jsonb) to fascicle_app;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, table);
  await asOwner(knex, hold);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop function hold_presence(uuid, jsonb); drop table case_presence;');
}
