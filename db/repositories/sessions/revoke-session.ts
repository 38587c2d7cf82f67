import type { Handle } from '@/db/connection';

/** Ends a session for good; the first time of revoking stays. */
export async function revokeSession(handle: Handle, sessionId: string): Promise<boolean> {
  const revoked = await handle('sessions').where({ id: sessionId }).whereNull('revoked_at').update({ revoked_at: handle.fn.now() });
  return revoked > 0;
}
