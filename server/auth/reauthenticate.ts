import { findCredentialsByPerson } from '@/db/repositories/people/find-credentials-by-person';
import { noteReauthenticated } from '@/db/repositories/sessions/note-reauthenticated';
import { checkCredentials } from '@/server/auth/check-credentials';
import type { SignedIn } from '@/server/auth/read-session';
import { notSignedIn } from '@/server/failure';
import type { ReauthenticateReply } from '@/lib/contracts/http/account';
import type { ServerContext } from '@/server/server-context';

/** Password and code again, for acts that need them fresh. Marks the session. */
export async function reauthenticate(
  context: ServerContext,
  { session }: SignedIn,
  typed: { password: string; code: string },
  address: string,
): Promise<ReauthenticateReply> {
  const credentials = await findCredentialsByPerson(context.database.app, session.personId);
  const code = typed.code.replace(/\s/g, '');
  await checkCredentials(context, { email: session.email, password: typed.password, code, address, credentials });
  if (!(await noteReauthenticated(context.database.app, session.sessionId))) throw notSignedIn();
  return { reauthenticatedAt: new Date(context.nowMs()).toISOString() };
}
