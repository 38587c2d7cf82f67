import 'fake-indexeddb/auto';

import { vi } from 'vitest';
import { createStore } from 'zustand/vanilla';

import type { SessionAnswer } from '@/app/_live/desk-identity';
import { LiveClient } from '@/app/_live/live-client';
import { openLiveDatabase } from '@/app/_live/live-database';
import type { LiveSocket } from '@/app/_live/live-socket';
import { openLiveStorage } from '@/app/_live/live-storage';
import { emptyLiveStore, type CaseFeed, type LiveStore } from '@/app/_live/live-store';
import { queueLock, type ExclusiveLock, type TabChannel, type TabMessage } from '@/app/_live/tabs';
import type { FakeServer } from '@/tests/app/live/fake-server';

/** One browser: what its tabs share. */
export interface Browser {
  readonly databaseName: string;
  readonly lock: ExclusiveLock;
  readonly ears: Set<(message: TabMessage) => void>;
  session: SessionAnswer;
  /** Stands in for the question who is signed in. */
  ask?: () => Promise<SessionAnswer>;
  clockMs: () => number;
}

let browserCount = 0;

/** A browser with an empty store, signed in as person-1. */
export function freshBrowser(): Browser {
  browserCount += 1;
  return {
    databaseName: `browser-${browserCount}`,
    lock: queueLock(),
    ears: new Set(),
    session: { kind: 'person', personId: 'person-1', displayName: 'Neurophysiologist' },
    clockMs: () => Date.now(),
  };
}

/** One tab with its own client and its own store of live state. */
export interface Tab {
  readonly client: LiveClient;
  store(): LiveStore;
  feed(caseId: string): CaseFeed;
  /** Hears every change of the store. */
  watch(listener: (store: LiveStore) => void): void;
  /** As a crash or a closed tab: nothing of it goes on. */
  kill(): void;
}

/** Opens a tab of the browser on the server. */
export async function openTab(browser: Browser, server: FakeServer): Promise<Tab> {
  const store = createStore<LiveStore>()(() => emptyLiveStore);
  const own = new Set<(message: TabMessage) => void>();
  const tabs: TabChannel = {
    tell: (message) => {
      for (const ear of browser.ears) if (!own.has(ear)) queueMicrotask(() => ear(structuredClone(message)));
    },
    hear: (listener) => {
      own.add(listener);
      browser.ears.add(listener);
    },
  };
  const storage = await openLiveStorage(() => openLiveDatabase(browser.databaseName));
  const sockets: LiveSocket[] = [];
  let isKilled = false;
  const client = new LiveClient({
    openSocket: (viewer, listener) => {
      const socket = server.open(viewer, listener);
      sockets.push(socket);
      return socket;
    },
    storage,
    lock: (name, work) => (isKilled ? new Promise<never>(() => undefined) : browser.lock(name, work)),
    tabs,
    askSession: () => browser.ask?.() ?? Promise.resolve(server.isUp ? browser.session : { kind: 'no-answer' as const }),
    nowMs: () => browser.clockMs(),
    store,
  });
  return {
    client,
    store: () => store.getState(),
    feed: (caseId) => {
      const feed = store.getState().feeds[caseId];
      if (feed === undefined) throw new Error(`Not followed: ${caseId}`);
      return feed;
    },
    watch: (listener) => store.subscribe(listener),
    kill: () => {
      isKilled = true;
      for (const ear of own) browser.ears.delete(ear);
      for (const socket of sockets) socket.close();
    },
  };
}

/** Waits for a condition. */
export function until(isTrue: () => boolean): Promise<void> {
  return vi.waitFor(
    () => {
      if (!isTrue()) throw new Error(`Not yet: ${String(isTrue)}`);
    },
    { timeout: 8000, interval: 5 },
  );
}
