import type { Handle } from '@/db/connection';

/** A sign-in that lasts until `expiresAt` unless it is revoked. */
export interface NewSession {
  readonly id: string;
  readonly personId: string;
  readonly expiresAt: string;
}

/** Begins a session. */
export async function insertSession(handle: Handle, session: NewSession): Promise<void> {
  await handle('sessions').insert({ id: session.id, person_id: session.personId, expires_at: session.expiresAt });
}
