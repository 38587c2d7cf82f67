'use client';

import { useLiveStore } from '@/app/_live/live-store';
import { tellServiceWorker } from '@/app/_live/service-worker';
import { tabClient } from '@/app/_live/tab-client';

/** The sentence to show before signing out while entries wait; null when none does. */
export function signOutWarning(): string | null {
  const count = useLiveStore.getState().waiting.filter((one) => one.status === 'waiting').length;
  if (count === 0) return null;
  const subject = count === 1 ? '1 entry waits' : `${count} entries wait`;
  return `${subject} for the link. Signing out keeps ${count === 1 ? 'it' : 'them'} in this browser, for you and this case only; ${count === 1 ? 'it goes' : 'they go'} up when you sign in here again.`;
}

/** Call before the session ends: drops the connection and all that was read; what waits is kept. */
export async function forgetDesk(): Promise<void> {
  await (await tabClient()).signOut();
  await tellServiceWorker({ kind: 'forget-pages' });
}
