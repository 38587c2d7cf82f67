'use client';

import { useMemo } from 'react';

import { useLiveStore, type WaitingCommand } from '@/app/_live/live-store';
import { provisionalState, type ProvisionalCase } from '@/app/_live/provisional-state';

/** The case as its author expects it, and the author's own commands of this case that wait or were refused. */
export function useProvisionalCase(caseId: string, role: string): (ProvisionalCase & { readonly waiting: readonly WaitingCommand[] }) | null {
  const committed = useLiveStore((store) => store.feeds[caseId]?.state ?? null);
  const allWaiting = useLiveStore((store) => store.waiting);
  const session = useLiveStore((store) => store.session);
  return useMemo(() => {
    if (committed === null) return null;
    const waiting = allWaiting.filter((one) => one.caseId === caseId);
    const isKnown = session.status === 'signed-in' || session.status === 'unconfirmed';
    const author = { id: isKnown ? session.personId : '', role, displayName: isKnown ? session.displayName : '' };
    return { ...provisionalState(committed, waiting, author), waiting };
  }, [committed, allWaiting, session, caseId, role]);
}
