import type { Handle } from '@/db/connection';

/**
 * Removes walls that asked a day ago and were never bound, and those through for 30 days that no read names; answers how
 * many. The ages are the database's own.
 */
export async function removeOldScreens(handle: Handle): Promise<number> {
  const { rows } = await handle.raw<{ rows: { removed: number }[] }>('select remove_old_screens() as removed');
  return rows[0]?.removed ?? 0;
}
