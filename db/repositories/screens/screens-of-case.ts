import type { Handle } from '@/db/connection';
import { SCREEN_COLUMNS, type WallScreen } from './wall-screen';

/** Walls bound to a case and not revoked, oldest pairing first. */
export async function screensOfCase(handle: Handle, caseId: string): Promise<WallScreen[]> {
  const { rows } = await handle.raw<{ rows: WallScreen[] }>(
    `select ${SCREEN_COLUMNS} from wall_screens where case_id = ? and revoked_at is null order by paired_at`,
    [caseId],
  );
  return rows;
}
