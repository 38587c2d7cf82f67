import pg from 'pg';
import { BELL_CHANNEL, readPayload, type Ring } from './bell';

const FIRST_WAIT_MS = 100;
const LONGEST_WAIT_MS = 2000;
const CONNECT_TIMEOUT_MS = 3000;

/** Who is told. A bell may be lost or come twice: readers poll as well and read from their own last number. */
export interface ListenerEvents {
  onBell(rings: readonly Ring[]): void;
  /** Listening again after the connection was lost: whatever was rung meanwhile is not known. */
  onReconnect(): void;
  onLost?(reason: string): void;
}

export interface Listener {
  /** Resolves when the channel is listened to for the first time. */
  readonly ready: Promise<void>;
  stop(): Promise<void>;
}

/** Listens for bells on a connection of its own, and connects again for as long as it is not stopped. */
export function makeListener(url: string, events: ListenerEvents): Listener {
  let client: pg.Client | null = null;
  let timer: NodeJS.Timeout | null = null;
  let waitMs = FIRST_WAIT_MS;
  let isStopped = false;
  let wasReady = false;
  let settle: () => void = () => undefined;
  const ready = new Promise<void>((resolve) => {
    settle = resolve;
  });

  function lost(of: pg.Client, reason: string): void {
    if (isStopped || client !== of) return;
    client = null;
    of.end().catch(() => undefined);
    events.onLost?.(reason);
    timer = setTimeout(() => void connect(), waitMs);
    waitMs = Math.min(waitMs * 2, LONGEST_WAIT_MS);
  }

  async function connect(): Promise<void> {
    const next = new pg.Client({ connectionString: url, application_name: 'fascicle bell', connectionTimeoutMillis: CONNECT_TIMEOUT_MS, keepAlive: true });
    client = next;
    next.on('error', (error) => lost(next, error.message));
    next.on('end', () => lost(next, 'The database ended the connection.'));
    next.on('notification', ({ payload }) => {
      const rings = readPayload(payload ?? '');
      if (rings !== null) events.onBell(rings);
    });
    try {
      await next.connect();
      await next.query(`listen ${BELL_CHANNEL}`);
    } catch (error) {
      lost(next, error instanceof Error ? error.message : String(error));
      return;
    }
    if (isStopped || client !== next) return;
    waitMs = FIRST_WAIT_MS;
    if (wasReady) events.onReconnect();
    wasReady = true;
    settle();
  }

  void connect();
  return {
    ready,
    async stop() {
      isStopped = true;
      if (timer !== null) clearTimeout(timer);
      await client?.end().catch(() => undefined);
    },
  };
}
