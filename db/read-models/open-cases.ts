import type { Handle } from '@/db/connection';

/** A case that was opened and not closed: its timers run. */
export interface OpenCase {
  readonly caseId: string;
  readonly hospitalId: string;
}

/** Open cases of every hospital, on the feed, for the timers. */
export async function openCases(feed: Handle): Promise<OpenCase[]> {
  const { rows } = await feed.raw<{ rows: OpenCase[] }>(`
    select c.id as "caseId", c.hospital_id as "hospitalId" from cases c
    join lateral (select e.kind from entries e where e.case_id = c.id and e.kind in ('case.planned', 'case.opened', 'case.closed', 'case.sealed')
      order by e.seq desc limit 1) as life on true
    where life.kind = 'case.opened' order by c.id`);
  return rows;
}
