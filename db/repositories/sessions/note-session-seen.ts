import type { Handle } from '@/db/connection';

/** Notes that a session was used. */
export async function noteSessionSeen(handle: Handle, sessionId: string): Promise<void> {
  await handle('sessions').where({ id: sessionId }).update({ last_seen_at: handle.fn.now() });
}
