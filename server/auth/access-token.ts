import { createHash, randomBytes } from 'node:crypto';

/** A new token for a program: 256 bits, known by its beginning so that a leaked one is recognised. */
export const newAccessToken = (): string => `fascicle_${randomBytes(32).toString('base64url')}`;

/** What the database keeps of a token. */
export const accessTokenHash = (token: string): Buffer => createHash('sha256').update(token).digest();

/** Whether a program speaks. What a proxy in front asks of browsers (another scheme) is not ours. */
export const isBearer = (authorization: string | null | undefined): authorization is string => /^bearer(?:\s|$)/i.test(authorization?.trim() ?? '');

/** The token of an Authorization header; null when it is none of ours. */
export function accessTokenOf(authorization: string): string | null {
  return /^Bearer +(fascicle_[A-Za-z0-9_-]{43})$/i.exec(authorization.trim())?.[1] ?? null;
}
