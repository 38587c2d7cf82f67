import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';

import type { SessionReply } from '@/lib/contracts/http/replies';
import { sourceOf } from '@/server/http/answer-route';

/** Only signed-in people pass. A server without its database lets the shell through, as null: the page itself says what is missing. */
export async function requirePerson(): Promise<SessionReply | null> {
  const reply = await globalThis.fascicle.query('session', {}, sourceOf(await headers()));
  if (reply.isOk) return reply.body;
  if (reply.status === 401) redirect('/sign-in');
  return null;
}

/** A case that this person may not see is not there, in the page as in the interface. */
export async function requireCase(caseId: string): Promise<void> {
  const reply = await globalThis.fascicle.query('case-access', { caseId }, sourceOf(await headers()));
  if (reply.isOk) return;
  if (reply.status === 401) redirect('/sign-in');
  if (reply.status === 404 || reply.status === 400) notFound();
}
