import { findTokenSession } from '@/db/repositories/tokens/find-token-session';
import { accessTokenHash, accessTokenOf, isBearer } from '@/server/auth/access-token';
import { actorOf, requireSession, type SignedIn } from '@/server/auth/read-session';
import type { DoorParts } from '@/server/doors/door-parts';
import { failure, type Failure } from '@/server/failure';
import type { RequestSource } from '@/server/fascicle-global';

/**
 * The person who asks: by the token of a program where one is sent, and then its cookie counts for nothing; else by the
 * session of a browser. Roles are those of this moment either way. Fails where nobody is recognised.
 */
export async function whoAsks({ context, tokenLimit }: DoorParts, { cookie, authorization }: RequestSource): Promise<SignedIn> {
  if (!isBearer(authorization)) return requireSession(context, cookie);
  const token = accessTokenOf(authorization);
  const session = token === null ? null : await findTokenSession(context.database.app, accessTokenHash(token));
  if (session === null) throw tokenNotGood();
  if (!tokenLimit.take(session.sessionId)) throw failure('too-many', 'too-many', `Too many: ${tokenLimit.perSecond} requests a second are allowed for a token. It is safe to send the same again.`);
  context.log.info({ tokenId: session.sessionId, personId: session.personId }, 'A program asks with a token.');
  return { session, actor: actorOf(session) };
}

const tokenNotGood = (): Failure =>
  failure('not-signed-in', 'token-not-good', 'Token not good: it is unknown, expired or revoked. A new one is printed by npm run token.');
