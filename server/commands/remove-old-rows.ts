import { removeOldScreens } from '@/db/repositories/screens/remove-old-screens';
import { removeOldAttempts } from '@/db/repositories/sign-in/remove-old-attempts';
import type { ServerContext } from '@/server/server-context';

/** Ends the growth of what strangers can add without an account. Several processes may do it at once. Entries and reads are never touched. */
export async function removeOldRows({ database, log }: Pick<ServerContext, 'database' | 'log'>): Promise<void> {
  const [attempts, screens] = [await removeOldAttempts(database.app), await removeOldScreens(database.app)];
  if (attempts + screens > 0) log.info({ attempts, screens }, 'Old attempts to sign in and old walls were removed.');
}
