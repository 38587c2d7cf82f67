import type { Handle } from '@/db/connection';
import { HEADS, readHeads, type HeadRow, type Heads } from '@/db/repositories/entries/heads-of';
import { ELSEWHERE, readElsewhere, type CasePresence, type ElsewhereRow } from '@/db/repositories/presence/elsewhere';

/** What a pulse says of its cases: their heads, and who has them open in other processes than the asking one. */
export interface PulseFacts extends Heads {
  readonly elsewhere: ReadonlyMap<string, CasePresence>;
}

const FACTS = `select asked.*, present.* from (${HEADS}) as asked left join lateral (${ELSEWHERE}) as present on true`;

/** Heads and presence at one moment, in one query on the feed. */
export async function pulseFacts(feed: Handle, caseIds: readonly string[], processId: string): Promise<PulseFacts> {
  const { rows } = await feed.raw<{ rows: (HeadRow & ElsewhereRow)[] }>(FACTS, [[...caseIds], processId]);
  const elsewhere = new Map(rows.flatMap((row) => (row.case_id === null ? [] : [[row.case_id, readElsewhere(row)] as const])));
  return { ...readHeads(rows), elsewhere };
}
