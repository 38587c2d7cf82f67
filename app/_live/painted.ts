'use client';

import { tabClient } from '@/app/_live/tab-client';

/** Confirms from a wall that an entry is on the glass: after two animation frames, so that the frame with it was handed over. */
export function painted(caseId: string, seq: number, alertId: string | null): void {
  requestAnimationFrame(() => {
    requestAnimationFrame(() => {
      void tabClient().then((client) => client.painted(caseId, seq, alertId));
    });
  });
}
