import { hasAnswered } from '@/db/has-answered';
import { pulseFacts, type PulseFacts } from '@/db/read-models/pulse-facts';
import { headsOf } from '@/db/repositories/entries/heads-of';
import type { PulseMessage } from '@/lib/contracts/channel/messages';
import type { LiveServer, LiveSocket } from '@/server/live/live-socket';
import type { Presence } from '@/server/cases/presence';
import { wholePresence } from '@/server/cases/whole-presence';
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
 * One beat: heads and presence of all followed cases in one query, what is new to its viewers, then one pulse for each viewer. No
 * answer of the database, no pulse: a screen that gets none says within 3 s that it is not live.
 */
export async function pulseOnce({ context, io, pump, presence }: PulseParts): Promise<void> {
  const sockets = [...io.of('/').sockets.values()] as LiveSocket[];
  const caseIds = new Set(sockets.flatMap((socket) => [...socket.data.caseIds]));
  const facts = await askFacts(context, [...caseIds], presence.processId);
  for (const [caseId, head] of facts.heads) {
    await pump.reach(caseId, head.seq).catch((cause: unknown) => context.log.warn({ err: cause, caseId }, 'The log could not be read for viewers; the next beat tries again.'));
  }
  for (const socket of sockets) {
    if (socket.data.caseIds.size > 0) socket.emit('pulse', { checkedAt: facts.checkedAt, cases: casesOf(socket, facts, presence) });
  }
}

/**
 * Heads and presence in one query. When the database refuses that, the heads alone: viewers then know of the people of
 * this process only, and their case stays live.
 */
async function askFacts({ database, log }: PulseParts['context'], caseIds: readonly string[], processId: string): Promise<PulseFacts> {
  try {
    return await pulseFacts(database.feed, caseIds, processId);
  } catch (cause) {
    if (!hasAnswered(cause)) throw cause;
    log.warn({ err: cause }, 'Who is connected elsewhere could not be read; viewers are told of this process only.');
    return { ...(await headsOf(database.feed, caseIds)), elsewhere: new Map() };
  }
}

function casesOf(socket: LiveSocket, { heads, elsewhere }: PulseFacts, presence: Presence): PulseMessage['cases'] {
  return [...socket.data.caseIds].flatMap((caseId) => {
    const head = heads.get(caseId);
    if (head === undefined) return [];
    const others = elsewhere.get(caseId);
    const whole = wholePresence(others === undefined ? [presence.of(caseId)] : [presence.of(caseId), others]);
    // A wall is for the theatre: who reads along is not its business.
    const peopleConnected = socket.data.visitor.kind === 'screen' ? [] : whole.peopleConnected;
    return [{ caseId, headSeq: head.seq, headHash: head.hash, ...whole, peopleConnected }];
  });
}
