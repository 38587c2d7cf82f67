import { noteScreenSeen } from '@/db/repositories/screens/note-screen-seen';
import { withinHospitals } from '@/db/within-hospitals';
import { followRequestSchema, type FollowReply } from '@/lib/contracts/channel/messages';
import { contractVersion } from '@/lib/contracts/contract-version';
import { decideAccess } from '@/lib/policy/decide-access';
import { roleOfRule } from '@/lib/policy/rules';
import { isFailure, notReadable } from '@/server/failure';
import { roomOf, type LiveSocket } from '@/server/live/live-socket';
import type { Departures } from '@/server/live/departures';
import type { Presence } from '@/server/cases/presence';
import type { Pump } from '@/server/live/pump';
import { largestPage, readPage } from '@/server/queries/case-entries';
import { openCase, type Visitor } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/** What following needs. */
export interface FollowParts {
  readonly context: ServerContext;
  readonly pump: Pump;
  readonly presence: Presence;
  readonly departures: Departures;
}

const mostCasesPerViewer = 20;

/**
 * Lets the viewer in, joins the room, then reads after its last number: nothing can fall between, and nothing of a case
 * reaches a viewer whom the policy does not let in. Joining and joining again are one call.
 */
export async function follow(parts: FollowParts, socket: LiveSocket, message: unknown): Promise<FollowReply> {
  const read = followRequestSchema.safeParse(message);
  if (isOtherVersion(message)) return { kind: 'refused', code: 'newer-version', message: 'Newer version: this page and the server do not speak the same version. Load the page again.' };
  if (!read.success) return { kind: 'refused', code: 'bad-request', message: `Not a request to follow: ${read.error.issues[0]?.message ?? 'unreadable'}` };
  const { caseId, after } = read.data;
  const isNew = !socket.data.caseIds.has(caseId);
  if (isNew && socket.data.caseIds.size >= mostCasesPerViewer) {
    return { kind: 'refused', code: 'bad-request', message: `Too many: ${mostCasesPerViewer} cases at most can be followed at a time.` };
  }
  try {
    const { visitor, isDesk, displayName } = socket.data;
    const { resource, rule } = await openCase(parts.context, visitor, { caseId, action: 'see-case', what: 'follow' });
    await socket.join(roomOf(caseId, visitor.kind));
    const page = await readPage(parts.context, visitor, { caseId, after, limit: largestPage });
    if (!socket.connected) throw new Error('The viewer left while the log was read.');
    parts.pump.watch(caseId, page.headSeq);
    socket.data.caseIds.add(caseId);
    // Whoever cannot write is no desk, whatever the page says of itself: a wall would call the case attended.
    const desk = isDesk && decideAccess(visitor, 'write-case', resource).isAllowed;
    if (isNew) parts.presence.arrive(caseId, socket.id, { ...whoIs(visitor), role: roleOfRule(rule) ?? visitor.kind, displayName, isDesk: desk, hospitalId: resource.hospitalId });
    if (visitor.kind === 'screen') noteSeen(parts.context, visitor);
    return { kind: 'entries', ...page };
  } catch (cause) {
    // A socket that is gone left its rooms before it was joined to this one.
    if (isNew || !socket.connected) parts.departures.leave(socket, caseId);
    if (isFailure(cause) && cause.reply.kind === 'not-found') return { kind: 'refused', code: 'not-found', message: cause.message };
    parts.context.log.warn({ err: cause, caseId }, 'A viewer could not follow.');
    return { kind: 'refused', code: 'not-saved', message: notReadable().message };
  }
}

function whoIs(visitor: Visitor): { personId: string | null; screenId: string | null } {
  return visitor.kind === 'screen' ? { personId: null, screenId: visitor.screenId } : { personId: visitor.personId, screenId: null };
}

function noteSeen({ database, log }: ServerContext, { screenId, hospitalId }: { screenId: string; hospitalId: string }): void {
  withinHospitals(database.app, [hospitalId], (transaction) => noteScreenSeen(transaction, screenId)).catch((cause: unknown) => log.warn({ err: cause, screenId }, 'It was not noted that a wall is there.'));
}

function isOtherVersion(message: unknown): boolean {
  if (typeof message !== 'object' || message === null || !('contractVersion' in message)) return false;
  return typeof message.contractVersion === 'number' && message.contractVersion !== contractVersion;
}
