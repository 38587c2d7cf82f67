import type { Handle } from '@/db/connection';
import { SCREEN_COLUMNS, type WallScreen } from './wall-screen';

/** The wall that waits with this code and asked within the last `withinS` seconds, or null. Needs a hospital to be set. */
export async function findWaitingScreen(handle: Handle, code: string, withinS: number): Promise<WallScreen | null> {
  const { rows } = await handle.raw<{ rows: WallScreen[] }>(
    `select ${SCREEN_COLUMNS} from wall_screens
     where code = ? and paired_at is null and revoked_at is null and asked_at > now() - make_interval(secs => ?)`,
    [code, withinS],
  );
  return rows[0] ?? null;
}
