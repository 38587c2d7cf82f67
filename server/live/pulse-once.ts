import { headsOf, type Heads } from '@/db/repositories/entries/heads-of';
import type { LiveServer, LiveSocket } from '@/server/live/live-socket';
import type { Presence } from '@/server/cases/presence';
import type { Pump } from '@/server/live/pump';
import type { ServerContext } from '@/server/server-context';

/** What one beat of the live channel needs. */
export interface PulseParts {
  readonly context: Pick<ServerContext, 'database' | 'log'>;
  readonly io: LiveServer;
  readonly pump: Pump;
  readonly presence: Presence;
}

/**
 * One beat: the heads of all followed cases in one query, what is new to its viewers, then one pulse for each viewer. No
 * answer of the database, no pulse: a screen that gets none says within 3 s that it is not live.
 */
export async function pulseOnce({ context, io, pump, presence }: PulseParts): Promise<void> {
  const sockets = [...io.of('/').sockets.values()] as LiveSocket[];
  const caseIds = new Set(sockets.flatMap((socket) => [...socket.data.caseIds]));
  const heads = await headsOf(context.database.feed, [...caseIds]);
  for (const [caseId, head] of heads.heads) {
    await pump.reach(caseId, head.seq).catch((cause: unknown) => context.log.warn({ err: cause, caseId }, 'The log could not be read for viewers; the next beat tries again.'));
  }
  for (const socket of sockets) {
    if (socket.data.caseIds.size > 0) socket.emit('pulse', { checkedAt: heads.checkedAt, cases: casesOf(socket, heads, presence) });
  }
}

function casesOf(socket: LiveSocket, { heads }: Heads, presence: Presence) {
  return [...socket.data.caseIds].flatMap((caseId) => {
    const head = heads.get(caseId);
    return head === undefined ? [] : [{ caseId, headSeq: head.seq, headHash: head.hash, ...presence.of(caseId) }];
  });
}
