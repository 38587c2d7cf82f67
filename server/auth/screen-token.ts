import { createHash, randomBytes } from 'node:crypto';

import { readCookies } from '@/server/auth/read-cookies';

const dayS = 86_400;

/** Name of the cookie that holds a wall's token. */
function screenCookieName(publicUrl: string): string {
  return publicUrl.startsWith('https:') ? '__Host-fascicle-screen' : 'fascicle-screen';
}

/** A new token of a wall; only its hash is ever stored. */
export const newScreenToken = (): string => randomBytes(32).toString('base64url');

/** What the database keeps of a token. */
export const screenTokenHash = (token: string): Buffer => createHash('sha256').update(token).digest();

/** The token in a request's cookie, or null. */
export function screenTokenOf(cookie: string | null, publicUrl: string): string | null {
  const token = readCookies(cookie).get(screenCookieName(publicUrl));
  return token !== undefined && /^[A-Za-z0-9_-]{43}$/.test(token) ? token : null;
}

/** The Set-Cookie line that gives a wall its token: scripts cannot read it and other sites cannot send it. */
export function screenCookie(token: string, publicUrl: string): string {
  const secure = publicUrl.startsWith('https:') ? '; Secure' : '';
  return `${screenCookieName(publicUrl)}=${token}; Path=/; HttpOnly; SameSite=Strict; Max-Age=${7 * dayS}${secure}`;
}
