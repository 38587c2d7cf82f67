import type { LiveSession } from '@/db/repositories/sessions/find-live-session';
import { findLiveSession } from '@/db/repositories/sessions/find-live-session';
import type { Actor, Role } from '@/lib/policy/actor';
import { sessionIdOf } from '@/server/auth/session-id-of';
import { notSignedIn } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** A person who is signed in, as the policy and the log need them. */
export interface SignedIn {
  readonly session: LiveSession;
  readonly actor: Extract<Actor, { kind: 'person' }>;
}

type Facts = Pick<ServerContext, 'database' | 'publicUrl' | 'secret'>;

/** Who sent this cookie, asked of the database every time: a revoked session is nobody at once. */
export async function readSession(context: Facts, cookie: string | null): Promise<SignedIn | null> {
  const sessionId = await sessionIdOf(cookie, context);
  return sessionId === null ? null : readSessionById(context, sessionId);
}

/** The same for a session whose token was read before, as on an open socket. */
export async function readSessionById(context: Pick<ServerContext, 'database'>, sessionId: string): Promise<SignedIn | null> {
  const session = await findLiveSession(context.database.app, sessionId);
  return session === null ? null : { session, actor: actorOf(session) };
}

/** The person of a session with their present roles, as the policy sees them. */
export function actorOf(session: LiveSession): SignedIn['actor'] {
  const memberships = session.memberships.map(({ hospitalId, role }) => ({ hospitalId, role: role as Role }));
  return { kind: 'person', personId: session.personId, memberships };
}

/** Who sent this cookie; fails with "not signed in" when nobody is. */
export async function requireSession(context: Facts, cookie: string | null): Promise<SignedIn> {
  const signedIn = await readSession(context, cookie);
  if (signedIn === null) throw notSignedIn();
  return signedIn;
}
