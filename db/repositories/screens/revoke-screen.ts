import type { Handle } from '@/db/connection';

/** Unbinds a wall for good; false when it was revoked before or is not the reader's to revoke. */
export async function revokeScreen(handle: Handle, screenId: string): Promise<boolean> {
  const revoked = await handle('wall_screens').where({ id: screenId }).whereNotNull('paired_at').whereNull('revoked_at').update({ revoked_at: handle.fn.now() });
  return revoked > 0;
}
