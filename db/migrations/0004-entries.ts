import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

const tables = `
  -- bytes are the entry; every other column is read from them, for queries and for psql.
  create table entries (
    hospital_id uuid not null,
    case_id uuid not null,
    seq bigint not null check (seq >= 1),
    format smallint not null check (format = 1),
    kind text not null check (length(kind) between 3 and 60),
    kind_version integer not null check (kind_version >= 1),
    command_id text not null check (length(command_id) between 1 and 120),
    command_part integer not null check (command_part >= 0),
    command_digest bytea not null check (octet_length(command_digest) = 32),
    event_at timestamptz(3) not null check (event_at between '1900-01-01Z' and '9999-12-31Z'),
    recorded_at timestamptz(3) not null check (recorded_at between '2000-01-01Z' and '9999-12-31Z'),
    author_id text not null check (length(author_id) between 1 and 120),
    author_role text not null check (length(author_role) between 1 and 60),
    author_display_name text not null check (length(author_display_name) between 1 and 200),
    body jsonb not null check (jsonb_typeof(body) = 'object'),
    previous_hash bytea not null check (octet_length(previous_hash) = 32),
    hash bytea not null check (octet_length(hash) = 32),
    bytes bytea not null check (octet_length(bytes) <= 131072),
    constraint entries_pkey primary key (case_id, seq),
    constraint entries_command_unique unique (case_id, command_id, command_part),
    constraint entries_case foreign key (hospital_id, case_id) references cases (hospital_id, id)
  );
  create index entries_lifecycle on entries (case_id, seq desc)
    where kind in ('case.planned', 'plan.revised', 'case.opened', 'case.closed', 'case.sealed');
  create unique index entries_sealed_once on entries (case_id) where kind = 'case.sealed';

  create table case_snapshots (
    hospital_id uuid not null,
    case_id uuid not null,
    seq bigint not null,
    state_version integer not null check (state_version >= 1),
    bytes bytea not null,
    primary key (case_id, seq, state_version),
    foreign key (hospital_id, case_id) references cases (hospital_id, id),
    foreign key (case_id, seq) references entries (case_id, seq)
  );
`;

const guards = `
  create function entry_as_json(e entries) returns jsonb language sql stable
    set search_path = pg_catalog, pg_temp
    as $$ select jsonb_build_object(
      'format', e.format, 'hospitalId', e.hospital_id, 'caseId', e.case_id, 'seq', e.seq,
      'previousHash', encode(e.previous_hash, 'hex'), 'kind', e.kind, 'kindVersion', e.kind_version,
      'commandId', e.command_id, 'commandPart', e.command_part, 'commandDigest', encode(e.command_digest, 'hex'),
      'eventAt', to_char(e.event_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'),
      'recordedAt', to_char(e.recorded_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'),
      'author', jsonb_build_object('id', e.author_id, 'role', e.author_role, 'displayName', e.author_display_name),
      'body', e.body) $$;

  -- The primary key is the lock: two writers of the same number cannot both commit, and number seq - 1 must be there and
  -- visible, so the chain is dense and what this function reads of it cannot change any more.
  create function guard_entry() returns trigger language plpgsql security definer
    set search_path = pg_catalog, pg_temp as $$
  declare
    previous record;
  begin
    if new.hash is distinct from sha256(convert_to(E'fascicle-entry-1\\n', 'UTF8') || new.bytes) then
      raise exception 'Entry % is refused: its hash is not that of its bytes.', new.seq
        using errcode = 'check_violation', constraint = 'entries_hash';
    end if;
    if public.entry_as_json(new) is distinct from convert_from(new.bytes, 'UTF8')::jsonb then
      raise exception 'Entry % is refused: a column differs from its bytes.', new.seq
        using errcode = 'check_violation', constraint = 'entries_columns';
    end if;
    if (new.seq = 1) is distinct from (new.kind = 'case.planned') then
      raise exception 'Entry % is refused: case.planned is the first entry of a case and no other.', new.seq
        using errcode = 'check_violation', constraint = 'entries_grammar';
    end if;
    if new.seq = 1 then
      if new.previous_hash <> decode(repeat('00', 32), 'hex') then
        raise exception 'Entry 1 is refused: nothing stands before it.' using errcode = 'check_violation', constraint = 'entries_chain';
      end if;
      return null;
    end if;
    select e.hash, e.recorded_at into previous from public.entries e where e.case_id = new.case_id and e.seq = new.seq - 1;
    if previous.hash is distinct from new.previous_hash then
      raise exception 'Entry % is refused: it does not follow entry %.', new.seq, new.seq - 1
        using errcode = 'check_violation', constraint = 'entries_chain';
    end if;
    if new.recorded_at < previous.recorded_at then
      raise exception 'Entry % is refused: it was recorded before entry %.', new.seq, new.seq - 1
        using errcode = 'check_violation', constraint = 'entries_time';
    end if;
    if new.kind not like 'addendum.%' and exists (
      select from public.entries e where e.case_id = new.case_id and e.kind = 'case.sealed' and e.seq < new.seq
    ) then
      raise exception 'Entry % is refused: after the seal only addenda are allowed.', new.seq
        using errcode = 'check_violation', constraint = 'entries_sealed';
    end if;
    return null;
  end $$;

  create trigger entries_guard after insert on entries for each row execute function guard_entry();
  create trigger entries_never_change before update or delete or truncate on entries for each statement execute function refuse_change();
  revoke all on function entry_as_json(entries), guard_entry() from public;
`;

// Reading is by hospital. Appending is not checked against app.hospitals, so that it stays one statement without a
// set_config round trip, and that is safe: the foreign key ties (hospital, case) to one row of cases, which could be
// written only by someone in that hospital; the trigger ties both columns to the hashed bytes; and an append tells its
// writer nothing about the case (no RETURNING without a select policy). Who may append is the policy's question, asked before.
const policies = `
  alter table entries enable row level security, force row level security;
  alter table case_snapshots enable row level security, force row level security;
  create policy owner_reads on entries for select to fascicle_owner using (true);
  create policy own_hospitals on entries for select to fascicle_app using (hospital_id = any ((select current_hospitals())::uuid[]));
  create policy append on entries for insert to fascicle_app with check (true);
  create policy every_hospital on entries for select to fascicle_feed using (true);
  grant select, insert on entries to fascicle_app;
  grant select on entries to fascicle_feed;
  -- A snapshot repeats what the entries say, so the feed, which fills the caches, may read it as it reads them.
  create policy every_hospital on case_snapshots for select to fascicle_feed using (true);
  create policy own_hospitals on case_snapshots for select to fascicle_app using (hospital_id = any ((select current_hospitals())::uuid[]));
  create policy own_hospitals_gone on case_snapshots for delete to fascicle_app using (hospital_id = any ((select current_hospitals())::uuid[]));
  create policy append on case_snapshots for insert to fascicle_app with check (true);
  grant select, insert, delete on case_snapshots to fascicle_app;
  grant select on case_snapshots to fascicle_feed;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, tables);
  await asOwner(knex, guards);
  await asOwner(knex, policies);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop table case_snapshots; drop trigger entries_guard on entries; drop function guard_entry(); drop function entry_as_json(entries); drop table entries;');
}
