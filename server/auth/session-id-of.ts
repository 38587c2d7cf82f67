import { decode } from 'next-auth/jwt';

import { readCookies } from '@/server/auth/read-cookies';
import { deriveSecret } from '@/server/auth/derive-secret';

const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/** Name of the cookie that holds the session's token; over https only the name that browsers guard is taken. */
function sessionCookieName(publicUrl: string): string {
  return publicUrl.startsWith('https:') ? '__Secure-next-auth.session-token' : 'next-auth.session-token';
}

/** The session id in a request's cookie, or null. Says only that we wrote the token, not that the session still lives. */
export async function sessionIdOf(cookie: string | null, facts: { publicUrl: string; secret: string }): Promise<string | null> {
  const token = readCookies(cookie).get(sessionCookieName(facts.publicUrl));
  if (token === undefined) return null;
  const read = await decode({ token, secret: deriveSecret(facts.secret, 'session-token') }).catch(() => null);
  const sessionId: unknown = read?.['sessionId'];
  return typeof sessionId === 'string' && uuid.test(sessionId) ? sessionId : null;
}
