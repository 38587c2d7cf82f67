import type { Handle } from '@/db/connection';
import { SCREEN_COLUMNS, type WallScreen } from './wall-screen';

/** The wall that holds the token with this hash, in whatever state, or null. Needs no hospital to be set. */
export async function findScreenByToken(handle: Handle, tokenHash: Uint8Array): Promise<WallScreen | null> {
  const { rows } = await handle.raw<{ rows: WallScreen[] }>(`select ${SCREEN_COLUMNS} from screen_by_token(?)`, [Buffer.from(tokenHash)]);
  return rows[0] ?? null;
}
