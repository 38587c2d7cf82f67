import type { Handle } from '@/db/connection';

/** Removes attempts to sign in that are older than 30 days; answers how many. The age is the database's own. */
export async function removeOldAttempts(handle: Handle): Promise<number> {
  const { rows } = await handle.raw<{ rows: { removed: number }[] }>('select remove_old_attempts() as removed');
  return rows[0]?.removed ?? 0;
}
