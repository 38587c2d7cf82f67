import type { Handle } from '@/db/connection';

/** Notes that a bound wall is there. */
export async function noteScreenSeen(handle: Handle, screenId: string): Promise<void> {
  await handle('wall_screens').where({ id: screenId }).update({ last_seen_at: handle.fn.now() });
}
