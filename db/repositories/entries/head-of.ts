import type { Handle } from '@/db/connection';
import type { ChainHead } from '@/lib/record/entry';

/** The last entry's number, hash and time, or null for a case without entries (or one that this handle may not see). */
export async function headOf(handle: Handle, caseId: string): Promise<Required<ChainHead> | null> {
  const { rows } = await handle.raw<{ rows: { seq: number; hash: Buffer; recorded_at: string }[] }>(
    'select seq, hash, recorded_at from entries where case_id = ? order by seq desc limit 1',
    [caseId],
  );
  const row = rows[0];
  return row === undefined ? null : { seq: row.seq, hash: row.hash.toString('hex'), recordedAt: row.recorded_at };
}
