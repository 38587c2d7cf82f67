import { io } from 'socket.io-client';

/** Who looks: decides what the server sends and whose presence it counts. */
export type Viewer = 'desk' | 'follow' | 'wall';

/** What a connection tells. */
export interface SocketListener {
  connected(): void;
  disconnected(): void;
  received(event: 'entries' | 'pulse' | 'ended', body: unknown): void;
}

/** One connection to the server. Injected, so that tests stand in for the server and not for the client. */
export interface LiveSocket {
  readonly isConnected: boolean;
  /** Sends and waits for the answer. Rejects at once without a connection, and after `timeoutMs` without an answer. */
  request(event: 'follow' | 'command' | 'painted', body: unknown, timeoutMs: number): Promise<unknown>;
  /** Drops the connection and makes a new one. */
  reconnect(): void;
  close(): void;
}

/** Makes a connection and reports to the listener until it is closed. */
export type OpenSocket = (viewer: Viewer, listener: SocketListener) => LiveSocket;

const retryRefusedMs = 2000;

/** The real connection: websocket only, tried again for ever. */
export const openSocket: OpenSocket = (viewer, listener) => {
  const socket = io({
    path: '/socket.io',
    transports: ['websocket'],
    auth: { viewer },
    forceNew: true,
    reconnectionDelay: 250,
    reconnectionDelayMax: 2000,
    timeout: 5000,
  });
  let retryTimer: ReturnType<typeof setTimeout> | undefined;
  // The library gives up after a refused handshake and after a disconnect by the server; a wall has nobody to touch it.
  const retryIfGivenUp = () => {
    if (socket.active) return;
    clearTimeout(retryTimer);
    retryTimer = setTimeout(() => socket.connect(), retryRefusedMs);
  };
  socket.on('connect', () => listener.connected());
  socket.on('disconnect', () => {
    listener.disconnected();
    retryIfGivenUp();
  });
  socket.on('connect_error', retryIfGivenUp);
  for (const event of ['entries', 'pulse', 'ended'] as const) socket.on(event, (body: unknown) => listener.received(event, body));
  return {
    get isConnected() {
      return socket.connected;
    },
    request: async (event, body, timeoutMs) => {
      // A packet emitted without a connection would be kept and sent later, out of order.
      if (!socket.connected) throw new Error('No link to the server');
      return (await socket.timeout(timeoutMs).emitWithAck(event, body)) as unknown;
    },
    reconnect: () => {
      socket.disconnect();
      clearTimeout(retryTimer);
      socket.connect();
    },
    close: () => {
      clearTimeout(retryTimer);
      socket.removeAllListeners();
      socket.disconnect();
    },
  };
};
