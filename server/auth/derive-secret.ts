import { createHmac } from 'node:crypto';

/** A secret of its own for each purpose, so that one leaked token key opens nothing else. */
export function deriveSecret(secret: string, purpose: 'session-token' | 'screen-token'): string {
  return createHmac('sha256', secret).update(`fascicle ${purpose}`).digest('base64url');
}
