import type { Server as HttpServer } from 'node:http';
import { Server } from 'socket.io';

import { makeRateLimit, type RateLimit } from '@/server/auth/rate-limit';
import { isAllowedOrigin } from '@/server/http/guard-request';
import type { AllowedOrigins } from '@/server/http/allowed-origins';
import { makeDepartures, type Departures } from '@/server/live/departures';
import { everySecond } from '@/server/live/every-second';
import { follow } from '@/server/live/follow';
import { giveCommandMessage } from '@/server/live/give-command-message';
import { admit, viewerOf } from '@/server/live/handshake';
import { reply, type LiveServer, type LiveSocket, type SocketFacts } from '@/server/live/live-socket';
import { notePainted } from '@/server/live/note-painted';
import type { Presence } from '@/server/cases/presence';
import { makePresenceKeeper } from '@/server/live/presence-keeper';
import { makePump, type Pump } from '@/server/live/pump';
import { pulseOnce } from '@/server/live/pulse-once';
import { sweepOnce } from '@/server/live/sweep-once';
import type { ServerContext } from '@/server/server-context';

/** The live channel of one process. */
export interface LiveChannel {
  readonly pump: Pump;
  /** Cuts every socket of a session or of a wall at once. */
  revoke(of: { readonly sessionId: string } | { readonly screenId: string }, reason: 'revoked' | 'signed-out'): void;
  close(): Promise<void>;
}

/** A body of a command and its frame. */
const largestMessageBytes = 65_536 + 4_096;
const mostSockets = 10_000;

/** Opens the channel on the server's own port. Nothing is kept for absent viewers: the log is the queue. */
export function openLiveChannel(httpServer: HttpServer, parts: { context: ServerContext; presence: Presence; allowed: AllowedOrigins }): LiveChannel {
  const { context, presence, allowed } = parts;
  const io: LiveServer = new Server(httpServer, {
    path: '/socket.io',
    transports: ['websocket'],
    serveClient: false,
    destroyUpgrade: false,
    perMessageDeflate: false,
    pingInterval: 1_500,
    pingTimeout: 3_000,
    connectTimeout: 5_000,
    maxHttpBufferSize: largestMessageBytes,
    allowRequest: (request, decide) => {
      const isOurs = isAllowedOrigin(request.headers.origin, allowed) && allowed.hosts.has((request.headers.host ?? '').toLowerCase());
      decide(null, isOurs && io.engine.clientsCount < mostSockets);
    },
  });
  const late: { departures: Departures | null } = { departures: null };
  const pump = makePump(context, io, (caseId) => late.departures?.endWalls(caseId));
  const departures = makeDepartures(io, presence, pump);
  late.departures = departures;
  const keeper = makePresenceKeeper(context, presence);
  // A fault is told by the beat, which tries again.
  presence.whenChanged(() => void keeper.hold().catch(() => undefined));
  admitViewers(io, context);
  listenToViewers(io, { context, presence, pump, departures });
  const beats = [
    everySecond(() => keeper.hold(), (cause) => context.log.warn({ err: cause }, 'Other processes were not told who is connected here; the next second tries again.')),
    everySecond(() => pulseOnce({ context, io, pump, presence }), (cause) => context.log.warn({ err: cause }, 'No pulse: the database did not answer.')),
    everySecond(() => sweepOnce(context, io, departures), (cause) => context.log.warn({ err: cause }, 'Open sockets could not be held against the database.')),
  ];
  return {
    pump,
    revoke(of, reason) {
      for (const socket of [...io.of('/').sockets.values()] as LiveSocket[]) {
        const { visitor, sessionId } = socket.data;
        const isMeant = 'sessionId' in of ? sessionId === of.sessionId : visitor.kind === 'screen' && visitor.screenId === of.screenId;
        if (isMeant) departures.cut(socket, reason);
      }
    },
    async close() {
      for (const beat of beats) beat.stop();
      io.disconnectSockets(true);
      await io.close();
      await keeper.hold().catch((cause: unknown) => context.log.warn({ err: cause }, 'Other processes were not told that everybody left; they see it by age.'));
    },
  };
}

function admitViewers(io: LiveServer, context: ServerContext): void {
  io.use((socket, next) => {
    const viewer = viewerOf(socket.handshake.auth);
    if (viewer === null) return next(new Error('bad-request'));
    admit(context, socket.request.headers.cookie ?? null, viewer)
      .then((facts) => {
        if (facts === null) return next(new Error('not-signed-in'));
        Object.assign(socket.data, facts satisfies SocketFacts);
        next();
      })
      .catch((cause: unknown) => {
        context.log.warn({ err: cause }, 'A viewer could not be recognised.');
        next(new Error('not-reachable'));
      });
  });
}

type Parts = { context: ServerContext; presence: Presence; pump: Pump; departures: Departures };

function listenToViewers(io: LiveServer, parts: Parts): void {
  const { context, departures } = parts;
  const limit: RateLimit = makeRateLimit({ perSecond: 20, burst: 60, nowMs: context.nowMs });
  io.on('connection', (socket) => {
    const tooMany = (answer: unknown): boolean => {
      if (limit.take(socket.id)) return false;
      reply(answer, { kind: 'refused', code: 'not-saved', message: 'Too many: 20 messages a second are allowed. It is safe to send the same again.' });
      return true;
    };
    socket.on('follow', (message, answer) => {
      if (!tooMany(answer)) void follow(parts, socket, message).then((found) => reply(answer, found));
    });
    socket.on('command', (message, answer) => {
      if (!tooMany(answer)) void giveCommandMessage(context, socket, message).then((given) => reply(answer, given));
    });
    socket.on('painted', (message, answer) => {
      if (!tooMany(answer)) void notePainted(context, socket, message).then((noted) => reply(answer, noted));
    });
    socket.on('error', (cause) => context.log.warn({ err: cause }, 'A socket met a fault.'));
    socket.on('disconnect', () => {
      departures.forget(socket);
      limit.forget(socket.id);
    });
  });
}
