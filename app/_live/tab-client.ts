'use client';

import { askSession } from '@/app/_live/ask-session';
import { LiveClient } from '@/app/_live/live-client';
import { openSocket } from '@/app/_live/live-socket';
import { openLiveStorage, type LiveStorage } from '@/app/_live/live-storage';
import { useLiveStore } from '@/app/_live/live-store';
import { broadcastTabChannel, browserLock } from '@/app/_live/tabs';

let storage: Promise<LiveStorage> | null = null;
let client: Promise<LiveClient> | null = null;

/** What this browser keeps, opened once per tab. */
export function tabStorage(): Promise<LiveStorage> {
  storage ??= openLiveStorage();
  return storage;
}

/** The one live client of this tab, made when it is first needed. Browser only. */
export function tabClient(): Promise<LiveClient> {
  client ??= tabStorage().then(
    (opened) =>
      new LiveClient({
        openSocket,
        storage: opened,
        lock: browserLock(),
        tabs: broadcastTabChannel(),
        askSession,
        nowMs: () => Date.now(),
        store: useLiveStore,
      }),
  );
  return client;
}

/** Stands another client in for the browser's own; for tests of components. */
export function setTabClient(other: LiveClient): void {
  client = Promise.resolve(other);
}
