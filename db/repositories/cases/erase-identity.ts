import type { Handle } from '@/db/connection';

/** Erases who the patient is and keeps who erased it and why; false when there was nothing to erase. The log stays whole. */
export async function eraseIdentity(handle: Handle, caseId: string, erasedBy: string, reason: string): Promise<boolean> {
  const { rows } = await handle.raw<{ rows: { erased: boolean }[] }>('select erase_identity(?, ?, ?) as erased', [caseId, erasedBy, reason]);
  return rows[0]?.erased === true;
}
