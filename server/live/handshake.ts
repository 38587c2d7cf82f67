import { findScreenByToken } from '@/db/repositories/screens/find-screen-by-token';
import { readSession } from '@/server/auth/read-session';
import { screenTokenHash, screenTokenOf } from '@/server/auth/screen-token';
import type { SocketFacts } from '@/server/live/live-socket';
import type { ServerContext } from '@/server/server-context';

/** What a viewer says of itself when it connects. Only `viewer` is read, and it opens nothing: the cookie does. */
export function viewerOf(auth: unknown): 'desk' | 'follow' | 'wall' | null {
  const viewer: unknown = typeof auth === 'object' && auth !== null && 'viewer' in auth ? auth.viewer : null;
  return viewer === 'desk' || viewer === 'follow' || viewer === 'wall' ? viewer : null;
}

type Facts = Pick<ServerContext, 'database' | 'publicUrl' | 'secret'>;

/** Who connects, by the cookie of the handshake; null when nobody may. A wall comes with its token, everyone else with a session. */
export async function admit(context: Facts, cookie: string | null, viewer: 'desk' | 'follow' | 'wall'): Promise<SocketFacts | null> {
  if (viewer === 'wall') return admitWall(context, cookie);
  const signedIn = await readSession(context, cookie);
  if (signedIn === null) return null;
  return { visitor: signedIn.actor, sessionId: signedIn.session.sessionId, displayName: signedIn.session.displayName, isDesk: viewer === 'desk', caseIds: new Set() };
}

async function admitWall(context: Facts, cookie: string | null): Promise<SocketFacts | null> {
  const token = screenTokenOf(cookie, context.publicUrl);
  const screen = token === null ? null : await findScreenByToken(context.database.app, screenTokenHash(token));
  if (screen === null || screen.hospitalId === null || screen.caseId === null || screen.revokedAt !== null || screen.endedAt !== null) return null;
  const visitor = { kind: 'screen', screenId: screen.id, hospitalId: screen.hospitalId, caseId: screen.caseId } as const;
  return { visitor, sessionId: null, displayName: '', isDesk: false, caseIds: new Set() };
}
