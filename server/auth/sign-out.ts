import { revokeSession } from '@/db/repositories/sessions/revoke-session';
import type { ServerContext } from '@/server/server-context';

/** Ends a session for good and closes what it holds open. */
export async function signOut(context: ServerContext, sessionId: string): Promise<void> {
  await revokeSession(context.database.app, sessionId);
  context.onRevoked({ sessionId }, 'signed-out');
}
