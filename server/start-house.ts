import type { Server as HttpServer } from 'node:http';
import type { Logger } from 'pino';

import { makeDatabase } from '@/db/connection';
import { makeListener } from '@/db/listener';
import { apiLimits } from '@/lib/contracts/http/api-limits';
import { makeRateLimit } from '@/server/auth/rate-limit';
import { removeOldRows } from '@/server/commands/remove-old-rows';
import { runTimers } from '@/server/commands/run-timers';
import { makeFascicle } from '@/server/doors/make-fascicle';
import type { FascicleGlobal } from '@/server/fascicle-global';
import type { AllowedOrigins } from '@/server/http/allowed-origins';
import { makeBellRinger } from '@/server/live/bell-ringer';
import { everySecond } from '@/server/live/every-second';
import { openLiveChannel, type LiveChannel } from '@/server/live/open-live-channel';
import { makePresence } from '@/server/cases/presence';
import { makeServerContext } from '@/server/make-server-context';
import type { ServerSettings } from '@/server/settings/server-settings';
import { watchEventLoop } from '@/server/telemetry/event-loop';

/** Everything of the server but its pages. */
export interface House {
  readonly fascicle: FascicleGlobal;
  stop(): Promise<void>;
}

type Settings = Pick<ServerSettings, 'publicUrl' | 'secret' | 'demo' | 'databaseUrlApp' | 'databaseUrlFeed' | 'databaseUrlAudit'>;

function atOnceAndEveryHour(work: () => Promise<void>, onFault: (cause: unknown) => void): { stop: () => void } {
  work().catch(onFault);
  return everySecond(work, onFault, 3_600_000);
}

/** Puts database, commands, live channel and timers together. */
export function startHouse(parts: { settings: Settings; log: Logger; httpServer: HttpServer; allowed: AllowedOrigins }): House {
  const { settings, log, httpServer, allowed } = parts;
  const database = makeDatabase({ app: settings.databaseUrlApp, feed: settings.databaseUrlFeed, audit: settings.databaseUrlAudit });
  const late: { channel: LiveChannel | null } = { channel: null };
  const bell = makeBellRinger({ database, log });
  const context = makeServerContext({
    database,
    log,
    publicUrl: settings.publicUrl,
    secret: settings.secret,
    isDemo: settings.demo,
    onCommitted(caseId, entries) {
      late.channel?.pump.publish(caseId, entries);
      bell.ring(caseId, entries.at(-1)?.seq ?? 0);
    },
    onRevoked: (of, reason) => late.channel?.revoke(of, reason),
  });
  const presence = makePresence(context.nowMs);
  const channel = openLiveChannel(httpServer, { context, presence, allowed });
  late.channel = channel;
  const listener = makeListener(settings.databaseUrlFeed, {
    onBell: (rings) => {
      for (const { caseId, seq } of rings) channel.pump.reach(caseId, seq).catch((cause: unknown) => log.warn({ err: cause, caseId }, 'The log could not be read after a bell; the poll tries again.'));
    },
    onReconnect: () => log.info('Listening for the bell again; the poll has covered the time between.'),
    onLost: (reason) => log.warn({ reason }, 'The bell is not heard; the poll covers it.'),
  });
  const timers = everySecond(async () => void (await runTimers(context)), (cause) => log.warn({ err: cause }, 'Timers of open cases did not run; the next second tries again.'));
  const removing = atOnceAndEveryHour(() => removeOldRows(context), (cause) => log.warn({ err: cause }, 'Old rows were not removed; the next hour tries again.'));
  const loop = watchEventLoop();
  const tokenLimit = makeRateLimit({ perSecond: apiLimits.requestsPerSecond, burst: apiLimits.requestsAtOnce, nowMs: context.nowMs });
  const pairingLimit = makeRateLimit({ perSecond: 0.2, burst: 20, nowMs: context.nowMs });
  return {
    fascicle: makeFascicle({ context, presence, loop, pairingLimit, tokenLimit }),
    async stop() {
      timers.stop();
      removing.stop();
      await channel.close();
      httpServer.closeAllConnections();
      await listener.stop();
      loop.stop();
      await database.close();
    },
  };
}
