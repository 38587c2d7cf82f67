import type { Handle } from '@/db/connection';

/** One line of the list of cases. */
export interface CaseLine {
  readonly caseId: string;
  readonly hospitalId: string;
  readonly hospitalName: string;
  readonly timeZone: string;
  readonly reference: string;
  readonly title: string;
  readonly procedure: string;
  readonly side: 'left' | 'right';
  readonly theatre: string;
  readonly status: 'planned' | 'open' | 'closed' | 'sealed';
  readonly plannedAt: string;
  readonly lastEntryAt: string;
  readonly lastSeq: number;
}

// Only the few lifecycle entries of a case are read, by their own index, and the head: a long case costs no more.
// An open case is never cut off by newer ones that are closed.
const LINES = `
  select count(*) over () as total, c.id as "caseId", c.hospital_id as "hospitalId", h.name as "hospitalName", h.time_zone as "timeZone", c.reference,
    planned.plan->>'title' as title, planned.plan->>'procedure' as procedure, planned.plan->>'side' as side, planned.plan->>'theatre' as theatre,
    case life.kind when 'case.opened' then 'open' when 'case.closed' then 'closed' when 'case.sealed' then 'sealed' else 'planned' end as status,
    c.created_at as "plannedAt", head.recorded_at as "lastEntryAt", head.seq as "lastSeq"
  from cases c
  join hospitals h on h.id = c.hospital_id
  join lateral (select e.body->'plan' as plan from entries e where e.case_id = c.id and e.kind in ('case.planned', 'plan.revised')
    order by e.seq desc limit 1) as planned on true
  join lateral (select e.kind from entries e where e.case_id = c.id and e.kind in ('case.planned', 'case.opened', 'case.closed', 'case.sealed')
    order by e.seq desc limit 1) as life on true
  join lateral (select e.seq, e.recorded_at from entries e where e.case_id = c.id order by e.seq desc limit 1) as head on true
  where exists (select from case_assignments a
      join memberships m on m.hospital_id = a.hospital_id and m.person_id = a.person_id and m.role = a.role and m.revoked_at is null
      where a.case_id = c.id and a.person_id = :personId and a.to_at is null)
    or (life.kind in ('case.closed', 'case.sealed') and exists (select from memberships m
      where m.hospital_id = c.hospital_id and m.person_id = :personId and m.role = 'reviewer' and m.revoked_at is null))
  order by (life.kind = 'case.opened') desc, head.recorded_at desc, c.id desc
  limit :limit`;

/** The first lines of a list, and how many the whole list has. */
export interface CaseLines {
  readonly lines: readonly CaseLine[];
  readonly total: number;
}

/** Cases that a person is assigned to in a role they still have, and for a reviewer every closed one of the hospital; open ones first, then the latest. Run it within the person's hospitals. */
export async function casesForPerson(handle: Handle, personId: string, limit: number): Promise<CaseLines> {
  const { rows } = await handle.raw<{ rows: (CaseLine & { readonly total: number })[] }>(LINES, { personId, limit });
  return { lines: rows.map(({ total: _total, ...line }) => line), total: rows[0]?.total ?? 0 };
}
