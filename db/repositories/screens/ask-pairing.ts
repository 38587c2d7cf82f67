import type { Handle } from '@/db/connection';

/** A wall that asks to be paired. Only the hash of its token is kept. */
export interface PairingRequest {
  readonly id: string;
  readonly tokenHash: Uint8Array;
  readonly code: string;
  readonly words: string;
}

/** Adds a waiting wall, in no hospital's name. Throws the database's 23505 when another waiting wall has this code. */
export async function askPairing(handle: Handle, asked: PairingRequest): Promise<void> {
  await handle('wall_screens').insert({ id: asked.id, token_hash: Buffer.from(asked.tokenHash), code: asked.code, words: asked.words });
}
