'use client';

import { checkThatCounts, useLiveStore } from '@/app/_live/live-store';
import { liveForMs } from '@/app/_live/pulse-reader';
import { useNow } from '@/app/_live/use-now';

/** Whether a case is live here: its newest database check is younger than 3 s, all it saw is held, and nothing is odd. */
export function useIsLive(caseId: string): boolean {
  const nowMs = useNow(250);
  const checkedAt = useLiveStore((store) => checkThatCounts(store.feeds[caseId]));
  return isLiveAt(checkedAt, nowMs);
}

/** Whether a check that counts is young enough at this time; never before the browser's clock is known. */
export function isLiveAt(checkedAt: string | null, nowMs: number): boolean {
  return checkedAt !== null && nowMs > 0 && nowMs - Date.parse(checkedAt) < liveForMs;
}
