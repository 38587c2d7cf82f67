import { assignmentsOfCases } from '@/db/repositories/cases/assignments-of-cases';
import { liveScreenIds } from '@/db/repositories/screens/live-screen-ids';
import { findLiveSessions } from '@/db/repositories/sessions/find-live-sessions';
import { withinHospitals } from '@/db/within-hospitals';
import type { Actor, Role } from '@/lib/policy/actor';
import { decideAccess } from '@/lib/policy/decide-access';
import type { CaseResource } from '@/lib/policy/resource';
import { actorOf } from '@/server/auth/read-session';
import type { Departures } from '@/server/live/departures';
import type { LiveServer, LiveSocket } from '@/server/live/live-socket';
import { hospitalsOf } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

type Context = Pick<ServerContext, 'database' | 'memory' | 'log'>;

/**
 * Holds every open socket against the database once a second, in three queries whatever their number: sessions and walls
 * that were revoked, memberships and assignments that ended. What lost its right is told so and cut.
 */
export async function sweepOnce(context: Context, io: LiveServer, departures: Departures): Promise<void> {
  const sockets = [...io.of('/').sockets.values()] as LiveSocket[];
  const sessionIds = sockets.flatMap((socket) => socket.data.sessionId ?? []);
  const screenIds = sockets.flatMap((socket) => (socket.data.visitor.kind === 'screen' ? socket.data.visitor.screenId : []));
  const [sessions, screens] = await Promise.all([
    findLiveSessions(context.database.app, [...new Set(sessionIds)]),
    liveScreenIds(context.database.feed, [...new Set(screenIds)]),
  ]);
  for (const socket of sockets) {
    const { visitor, sessionId } = socket.data;
    if (visitor.kind === 'screen') {
      if (!screens.has(visitor.screenId)) departures.cut(socket, 'revoked');
      continue;
    }
    const session = sessionId === null ? undefined : sessions.get(sessionId);
    if (session === undefined) departures.cut(socket, 'signed-out');
    else socket.data.visitor = actorOf(session);
  }
  await endFollowing(context, sockets.filter((socket) => socket.connected && socket.data.visitor.kind === 'person'), departures);
}

async function endFollowing(context: Context, sockets: readonly LiveSocket[], departures: Departures): Promise<void> {
  const caseIds = [...new Set(sockets.flatMap((socket) => [...socket.data.caseIds]))];
  const resources = await describeCases(context, caseIds, [...new Set(sockets.flatMap((socket) => hospitalsOf(socket.data.visitor)))]);
  for (const socket of sockets) {
    const actor: Actor = socket.data.visitor;
    for (const caseId of [...socket.data.caseIds]) {
      const resource = resources.get(caseId);
      if (resource === undefined || !decideAccess(actor, 'see-case', resource).isAllowed) departures.endCase(socket, caseId, 'revoked');
    }
  }
}

async function describeCases(context: Context, caseIds: readonly string[], hospitalIds: readonly string[]): Promise<Map<string, CaseResource>> {
  const resources = new Map<string, CaseResource>();
  if (caseIds.length === 0 || hospitalIds.length === 0) return resources;
  const assigned = await withinHospitals(context.database.app, hospitalIds, (transaction) => assignmentsOfCases(transaction, caseIds));
  for (const caseId of caseIds) {
    const ofCase = assigned.filter((one) => one.caseId === caseId);
    const hospitalId = ofCase[0]?.hospitalId;
    if (hospitalId === undefined) continue;
    const assignments = ofCase.map(({ personId, role }) => ({ personId, role: role as Role }));
    resources.set(caseId, { kind: 'case', hospitalId, caseId, status: await statusOf(context, caseId), assignments });
  }
  return resources;
}

/** A case that this program cannot fold stays followed by those assigned to it, and holds up the sweep of no other. */
async function statusOf({ memory, log }: Context, caseId: string): Promise<CaseResource['status']> {
  try {
    return (await memory.load(caseId)).state.status;
  } catch (cause) {
    log.warn({ err: cause, caseId }, 'The state of a followed case could not be read; it is taken as open.');
    return 'open';
  }
}
