import type { Handle } from '@/db/connection';

/** A new token as the database keeps it: its hash, never the token. */
export interface NewAccessToken {
  readonly id: string;
  readonly tokenHash: Buffer;
  readonly personId: string;
  readonly label: string;
  readonly expiresAt: string;
}

/** Keeps a new token of a person. */
export async function insertAccessToken(handle: Handle, { id, tokenHash, personId, label, expiresAt }: NewAccessToken): Promise<void> {
  await handle.raw('insert into access_tokens (id, token_hash, person_id, label, expires_at) values (?, ?, ?, ?, ?)', [id, tokenHash, personId, label, expiresAt]);
}
