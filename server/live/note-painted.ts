import { paintedMessageSchema } from '@/lib/contracts/channel/messages';
import { decideAccess } from '@/lib/policy/decide-access';
import type { LiveSocket } from '@/server/live/live-socket';
import type { ServerContext } from '@/server/server-context';

/** A wall says that something was painted. Noted for this wall's own case only; anything else is passed over. */
export function notePainted(context: ServerContext, socket: LiveSocket, message: unknown): boolean {
  const read = paintedMessageSchema.safeParse(message);
  const { visitor } = socket.data;
  if (!read.success || visitor.kind !== 'screen') return false;
  const { caseId, seq, alertId, paintedAt } = read.data;
  const resource = { kind: 'case', hospitalId: visitor.hospitalId, caseId, status: 'open', assignments: [] } as const;
  if (!decideAccess(visitor, 'confirm-paint', resource).isAllowed) return false;
  context.log.info({ caseId, screenId: visitor.screenId, seq, alertId, paintedAt, arrivedAt: new Date(context.nowMs()).toISOString() }, 'A wall painted.');
  return true;
}
