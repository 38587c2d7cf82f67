'use client';

import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { readScreens } from '@/app/_features/log/read-screens';
import { useLiveStore } from '@/app/_live/live-store';
import type { Incident } from '@/lib/case/case-state';
import { paintedWords, type PaintedWords } from '@/lib/text/painted-words';

/** What is said of the wall beside an open alert. A wall that is bound and dark is still a wall: it has not confirmed. */
export function useWallWord(incident: Incident, nowMs: number): PaintedWords | null {
  const { caseId, entries, timeZone } = useLogCase();
  const wallsConnected = useLiveStore((store) => store.feeds[caseId]?.wallsConnected ?? 0);
  // Asked once; pairing a wall asks again under the same key.
  const screens = useQuery({ queryKey: ['screens', caseId], queryFn: () => readScreens(caseId), staleTime: Infinity, refetchOnWindowFocus: false });
  const hasWall = wallsConnected > 0 || (screens.data ?? []).some((screen) => screen.endedAt === null);
  const { raisedSeq, raisedAt } = incident;
  const wordAt = useMemo(() => entries.find((entry) => entry.seq === raisedSeq)?.recordedAt ?? raisedAt, [entries, raisedSeq, raisedAt]);
  return paintedWords(incident, { hasWall, wordAt }, nowMs, timeZone);
}
