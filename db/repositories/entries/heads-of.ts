import type { Handle } from '@/db/connection';
import type { ChainHead } from '@/lib/record/entry';

/** Heads of several cases at one moment of the database's own clock. */
export interface Heads {
  /** When the query began, so that a head is never said to be fresher than it is. */
  readonly checkedAt: string;
  readonly heads: ReadonlyMap<string, Required<ChainHead>>;
}

/** One row for each case of `?`. The first row is there even for no case at all: a pulse needs the time of a query that was answered. */
export const HEADS = `
  select statement_timestamp() as checked_at, asked.case_id, head.seq, head.hash, head.recorded_at
  from (select 1) as one
  left join unnest(?::uuid[]) as asked (case_id) on true
  left join lateral (
    select e.seq, e.hash, e.recorded_at from entries e where e.case_id = asked.case_id order by e.seq desc limit 1
  ) as head on true`;

/** The row as the database gives it. */
export interface HeadRow {
  checked_at: string;
  case_id: string | null;
  seq: number | null;
  hash: Buffer | null;
  recorded_at: string | null;
}

/** Heads of these cases by id; a case without entries is not in the map. */
export async function headsOf(handle: Handle, caseIds: readonly string[]): Promise<Heads> {
  const { rows } = await handle.raw<{ rows: HeadRow[] }>(HEADS, [[...caseIds]]);
  return readHeads(rows);
}

/** The heads in the rows of an answer. */
export function readHeads(rows: readonly HeadRow[]): Heads {
  const heads = new Map<string, Required<ChainHead>>();
  for (const { case_id, seq, hash, recorded_at } of rows) {
    if (case_id !== null && seq !== null && hash !== null && recorded_at !== null) {
      heads.set(case_id, { seq, hash: hash.toString('hex'), recordedAt: recorded_at });
    }
  }
  const checkedAt = rows[0]?.checked_at;
  if (checkedAt === undefined) throw new Error('The database gave no time for its heads.');
  return { checkedAt, heads };
}
