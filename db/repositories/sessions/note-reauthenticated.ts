import type { Handle } from '@/db/connection';

/** Notes that the person gave password and second factor again; false when the session is no longer live. */
export async function noteReauthenticated(handle: Handle, sessionId: string): Promise<boolean> {
  const noted = await handle('sessions')
    .where({ id: sessionId })
    .whereNull('revoked_at')
    .where('expires_at', '>', handle.fn.now())
    .update({ reauthenticated_at: handle.fn.now() });
  return noted > 0;
}
