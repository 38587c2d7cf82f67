import type { Handle } from '@/db/connection';

/** Ends the walls of a case that closed: they say so and get nothing more. Answers which ones. */
export async function endScreensForCase(handle: Handle, caseId: string): Promise<string[]> {
  const rows = await handle('wall_screens')
    .where({ case_id: caseId })
    .whereNull('revoked_at')
    .whereNull('ended_at')
    .update({ ended_at: handle.fn.now() })
    .returning<{ id: string }[]>('id');
  return rows.map((row) => row.id);
}
