import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

const tables = `
  create table cases (
    hospital_id uuid not null references hospitals (id),
    id uuid primary key,
    reference text not null check (length(reference) between 1 and 40),
    planned_by uuid not null references people (id),
    created_at timestamptz not null default now(),
    unique (hospital_id, id),
    unique (hospital_id, reference)
  );
  -- Who the patient is. The log holds only a commitment made with this salt; when the row is gone, so is the link.
  create table case_identities (
    hospital_id uuid not null,
    case_id uuid not null,
    salt bytea not null check (octet_length(salt) >= 16),
    patient_label text not null check (length(patient_label) between 1 and 200),
    record_number text not null check (length(record_number) between 1 and 80),
    primary key (hospital_id, case_id),
    foreign key (hospital_id, case_id) references cases (hospital_id, id)
  );
  create table identity_erasures (
    hospital_id uuid not null,
    case_id uuid not null,
    erased_at timestamptz not null default now(),
    erased_by uuid not null references people (id),
    reason text not null check (length(reason) between 1 and 500),
    primary key (hospital_id, case_id, erased_at),
    foreign key (hospital_id, case_id) references cases (hospital_id, id)
  );
  create table case_assignments (
    hospital_id uuid not null,
    case_id uuid not null,
    person_id uuid not null,
    role text not null,
    from_at timestamptz not null default now(),
    to_at timestamptz,
    primary key (hospital_id, case_id, person_id, role, from_at),
    foreign key (hospital_id, case_id) references cases (hospital_id, id),
    foreign key (hospital_id, person_id, role) references memberships (hospital_id, person_id, role),
    check (to_at >= from_at)
  );
  create unique index case_assignments_now on case_assignments (case_id, person_id, role) where to_at is null;
  create index case_assignments_person on case_assignments (person_id);

  create trigger cases_never_change before update or delete or truncate on cases for each statement execute function refuse_change();
  create trigger erasures_never_change before update or delete or truncate on identity_erasures for each statement execute function refuse_change();
`;

const ownHospitals = 'hospital_id = any ((select current_hospitals())::uuid[])';

const policies = `
  alter table cases enable row level security, force row level security;
  alter table case_identities enable row level security, force row level security;
  alter table identity_erasures enable row level security, force row level security;
  alter table case_assignments enable row level security, force row level security;
  create policy own_hospitals on cases for select to fascicle_app using (${ownHospitals});
  create policy own_hospitals_new on cases for insert to fascicle_app with check (${ownHospitals});
  -- The feed reads every hospital's heads for the walls, the caches and the timers; it has no right to who the patient is.
  create policy every_hospital on cases for select to fascicle_feed using (true);
  create policy own_hospitals on case_identities to fascicle_app, fascicle_owner using (${ownHospitals}) with check (${ownHospitals});
  create policy own_hospitals on identity_erasures to fascicle_app, fascicle_owner using (${ownHospitals}) with check (${ownHospitals});
  create policy own_hospitals on case_assignments to fascicle_app using (${ownHospitals}) with check (${ownHospitals});
  grant select, insert on cases, case_identities to fascicle_app;
  grant select on cases to fascicle_feed;
  grant select on identity_erasures to fascicle_app;
  grant select, insert, update (to_at) on case_assignments to fascicle_app;
`;

// The application cannot delete: it asks this, which keeps who did it and why. The owner's policies are the hospital's
// own, so the function reaches no further than the person's transaction does.
const erase = `
  create function erase_identity(wanted uuid, eraser uuid, why text) returns boolean
    language sql volatile security definer set search_path = pg_catalog, pg_temp
    as 'with gone as (delete from public.case_identities where case_id = wanted returning hospital_id, case_id),
        noted as (insert into public.identity_erasures (hospital_id, case_id, erased_by, reason)
          select hospital_id, case_id, eraser, why from gone returning 1)
        select exists (select from noted)';
  revoke all on function erase_identity(uuid, uuid, text) from public;
  grant execute on function erase_identity(uuid, uuid, text) to fascicle_app;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, tables);
  await asOwner(knex, policies);
  await asOwner(knex, erase);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, 'drop function erase_identity(uuid, uuid, text);');
  await asOwner(knex, 'drop table case_assignments, identity_erasures, case_identities, cases;');
}
