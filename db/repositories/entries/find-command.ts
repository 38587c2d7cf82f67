import type { Handle } from '@/db/connection';
import type { SealedEntry } from '@/lib/record/entry';
import { readSealedEntry, type EntryRow } from './read-sealed-entry';

/** The entries that a command wrote, in order; none when it is not in the log. Their digest tells a repeat from a mistake. */
export async function findCommand(handle: Handle, caseId: string, commandId: string): Promise<SealedEntry[]> {
  const { rows } = await handle.raw<{ rows: EntryRow[] }>(
    'select bytes, hash from entries where case_id = ? and command_id = ? order by command_part',
    [caseId, commandId],
  );
  return rows.map(readSealedEntry);
}
