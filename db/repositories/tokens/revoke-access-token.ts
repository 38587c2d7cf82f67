import type { Handle } from '@/db/connection';

/** Ends a token at once. False when there is none of this id that is still good. */
export async function revokeAccessToken(handle: Handle, id: string): Promise<boolean> {
  const changed = await handle('access_tokens').where({ id }).whereNull('revoked_at').update({ revoked_at: handle.fn.now() });
  return changed === 1;
}
