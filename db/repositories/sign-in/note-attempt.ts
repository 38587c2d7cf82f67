import type { Handle } from '@/db/connection';

/** An attempt to sign in; the address typed is kept as a hash only. */
export interface Attempt {
  readonly emailHash: Uint8Array;
  readonly address: string;
  readonly succeeded: boolean;
}

/** Notes an attempt to sign in. */
export async function noteAttempt(handle: Handle, attempt: Attempt): Promise<void> {
  await handle('sign_in_attempts').insert({ email_hash: Buffer.from(attempt.emailHash), address: attempt.address, succeeded: attempt.succeeded });
}
