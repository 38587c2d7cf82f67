import type { Handle } from '@/db/connection';
import type { Entry } from '@/lib/record/entry';

// As text and inside the database: jsonb keeps more digits of a number than the program would see.
const FIND = `
  select e.seq from entries e
  join unnest(?::bigint[], ?::text[]) as said (seq, body) on said.seq = e.seq
  where e.case_id = ? and e.body::text is distinct from said.body::jsonb::text
  order by e.seq limit 1`;

/** The first of these entries whose column body is not what its bytes say, or null. */
export async function firstWrongBody(handle: Handle, caseId: string, entries: readonly Entry[]): Promise<number | null> {
  const seqs = entries.map((entry) => entry.seq);
  const bodies = entries.map((entry) => JSON.stringify(entry.body));
  const { rows } = await handle.raw<{ rows: { seq: number }[] }>(FIND, [seqs, bodies, caseId]);
  return rows[0]?.seq ?? null;
}
