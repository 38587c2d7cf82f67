import { headsOf } from '@/db/repositories/entries/heads-of';
import type { HealthReply } from '@/lib/contracts/http/account';
import type { ServerContext } from '@/server/server-context';
import type { EventLoopWatch } from '@/server/telemetry/event-loop';

/** Whether the database answers now, by its own clock, and how late this process's timers run. */
export async function health(context: Pick<ServerContext, 'database'>, loop: EventLoopWatch): Promise<HealthReply> {
  const eventLoopDelayP99Ms = loop.read().p99Ms;
  try {
    const { checkedAt } = await headsOf(context.database.feed, []);
    return { isDatabaseAnswering: true, eventLoopDelayP99Ms, checkedAt };
  } catch {
    return { isDatabaseAnswering: false, eventLoopDelayP99Ms, checkedAt: null };
  }
}
