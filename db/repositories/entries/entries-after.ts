import type { Handle } from '@/db/connection';
import type { SealedEntry } from '@/lib/record/entry';
import { readSealedEntry, type EntryRow } from './read-sealed-entry';

/** Entries of a case after a number, oldest first, at most `limit`. */
export async function entriesAfter(handle: Handle, caseId: string, seq: number, limit: number): Promise<SealedEntry[]> {
  const { rows } = await handle.raw<{ rows: EntryRow[] }>(
    'select bytes, hash from entries where case_id = ? and seq > ? order by seq limit ?',
    [caseId, seq, limit],
  );
  return rows.map(readSealedEntry);
}
