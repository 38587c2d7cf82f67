import { io, type Socket } from 'socket.io-client';

import { contractVersion } from '@/lib/contracts/contract-version';
import type { EndedMessage, EntriesMessage, FollowReply, PulseMessage } from '@/lib/contracts/channel/messages';
import type { WireEntry } from '@/lib/contracts/http/replies';

import type { TestHouse } from './open-test-house';

/** A viewer of the live channel that keeps everything it got. */
export interface Viewer {
  readonly socket: Socket;
  /** Entries in the order of arrival, from `follow` and from `entries`. */
  readonly got: WireEntry[];
  readonly pulses: PulseMessage[];
  readonly ended: EndedMessage[];
  readonly disconnects: string[];
  /** Everything that arrived, as text. */
  readonly raw: string[];
  follow(caseId: string, after?: number, version?: number): Promise<FollowReply>;
  ask(event: string, message: unknown): Promise<unknown>;
  close(): void;
}

/** Connects as a page of the product would; rejects with the server's word when it is not let in. */
export function connectViewer(house: Pick<TestHouse, 'url'>, options: { cookie: string; viewer: 'desk' | 'follow' | 'wall'; origin?: string }): Promise<Viewer> {
  const socket = io(house.url, {
    transports: ['websocket'],
    reconnection: false,
    forceNew: true,
    auth: { viewer: options.viewer },
    extraHeaders: { cookie: options.cookie, origin: options.origin ?? house.url },
  });
  const viewer: Viewer = {
    socket,
    got: [],
    pulses: [],
    ended: [],
    disconnects: [],
    raw: [],
    async follow(caseId, after = 0, version = contractVersion) {
      const reply = (await viewer.ask('follow', { contractVersion: version, caseId, after })) as FollowReply;
      if (reply.kind === 'entries') viewer.got.push(...reply.entries);
      return reply;
    },
    ask: (event, message) => socket.timeout(5_000).emitWithAck(event, message) as Promise<unknown>,
    close: () => void socket.disconnect(),
  };
  socket.onAny((...words: unknown[]) => viewer.raw.push(JSON.stringify(words)));
  socket.on('entries', (message: EntriesMessage) => viewer.got.push(...message.entries));
  socket.on('pulse', (message: PulseMessage) => viewer.pulses.push(message));
  socket.on('ended', (message: EndedMessage) => viewer.ended.push(message));
  socket.on('disconnect', (reason) => viewer.disconnects.push(reason));
  return new Promise((resolve, reject) => {
    socket.once('connect', () => resolve(viewer));
    socket.once('connect_error', (cause) => reject(cause));
  });
}
