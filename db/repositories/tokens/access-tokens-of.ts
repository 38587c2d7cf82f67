import type { Handle } from '@/db/connection';

/** A token as its owner may see it again. */
export interface AccessTokenLine {
  readonly id: string;
  readonly label: string;
  readonly createdAt: string;
  readonly expiresAt: string;
  readonly revokedAt: string | null;
  readonly lastUsedAt: string | null;
}

/** A person's tokens, newest first; also those that are over. */
export async function accessTokensOf(handle: Handle, personId: string): Promise<AccessTokenLine[]> {
  return handle('access_tokens')
    .where({ person_id: personId })
    .orderBy('created_at', 'desc')
    .select<AccessTokenLine[]>('id', 'label', 'created_at as createdAt', 'expires_at as expiresAt', 'revoked_at as revokedAt', 'last_used_at as lastUsedAt');
}
