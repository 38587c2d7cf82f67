import type { Handle } from '@/db/connection';
import { readSealedEntry, type EntryRow } from '@/db/repositories/entries/read-sealed-entry';
import type { SealedEntry } from '@/lib/record/entry';

/** Which page of a case's log: after a number, at most so many, of these kinds or of all. */
export interface LogPage {
  readonly afterSeq: number;
  readonly limit: number;
  readonly kinds: readonly string[] | null;
}

/** A page of the log, oldest first. Run it within the reader's hospitals. */
export async function caseLog(handle: Handle, caseId: string, page: LogPage): Promise<SealedEntry[]> {
  const { rows } = await handle.raw<{ rows: EntryRow[] }>(
    `select bytes, hash from entries where case_id = :caseId and seq > :afterSeq
       and (:kinds::text[] is null or kind = any(:kinds::text[])) order by seq limit :limit`,
    { caseId, afterSeq: page.afterSeq, limit: page.limit, kinds: page.kinds },
  );
  return rows.map(readSealedEntry);
}
