'use client';

import { useEffect } from 'react';

import { useLiveStore, type DeskSession } from '@/app/_live/live-store';
import { tabClient } from '@/app/_live/tab-client';

/** Who works at this desk, also without a link. Starts sending what waits. */
export function useDeskSession(): DeskSession {
  useEffect(() => {
    void tabClient().then((client) => client.startDesk());
  }, []);
  return useLiveStore((store) => store.session);
}
