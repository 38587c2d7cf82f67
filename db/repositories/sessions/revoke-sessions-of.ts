import type { Handle } from '@/db/connection';

/** Ends every session of a person; answers which ones, so that their sockets can be closed. */
export async function revokeSessionsOf(handle: Handle, personId: string): Promise<string[]> {
  const rows = await handle('sessions')
    .where({ person_id: personId })
    .whereNull('revoked_at')
    .update({ revoked_at: handle.fn.now() })
    .returning<{ id: string }[]>('id');
  return rows.map((row) => row.id);
}
