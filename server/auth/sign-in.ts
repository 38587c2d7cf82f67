import { v7 as newId } from 'uuid';

import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { insertSession } from '@/db/repositories/sessions/insert-session';
import { checkCredentials } from '@/server/auth/check-credentials';
import { sessionHours } from '@/server/auth/session-hours';
import { failure } from '@/server/failure';
import type { SignInReply, SignInRequest } from '@/server/auth/sign-in-reply';
import type { ServerContext } from '@/server/server-context';

/** E-mail, password and code give a session of one person. */
export async function signIn(context: ServerContext, typed: SignInRequest, address: string): Promise<SignInReply> {
  for (const [field, max] of [['email', 254], ['password', 256], ['code', 10]] as const) {
    const text: unknown = typed[field];
    if (typeof text !== 'string' || text.length > max || !text.isWellFormed() || text.includes('\u0000')) {
      throw failure('bad-request', 'bad-request', `Not text: ${field} must be at most ${max} printable characters.`, field);
    }
  }
  const email = typed.email.trim().toLowerCase();
  const code = typed.code.replace(/\s/g, '');
  const credentials = await findCredentialsByEmail(context.database.app, email);
  const { personId } = await checkCredentials(context, { email, password: typed.password, code, address, credentials });
  const id = newId();
  await insertSession(context.database.app, { id, personId, expiresAt: new Date(context.nowMs() + sessionHours * 3_600_000).toISOString() });
  return { sessionId: id, personId };
}
