import { v7 as newId } from 'uuid';

import type { CasePresence, PresentViewer } from '@/db/repositories/presence/elsewhere';
import type { HeldViewer } from '@/db/repositories/presence/hold-presence';

/** Somebody who opens a case; since when is this process's own knowledge. */
export type Arrival = Omit<PresentViewer, 'since'> & { readonly hospitalId: string };

/** Who has which case open in this process. It knows that at first hand, whatever becomes of the table that tells the others. */
export interface Presence {
  /** Drawn anew at each start: the rows of a process that ended are nobody's. */
  readonly processId: string;
  arrive(caseId: string, socketId: string, as: Arrival): void;
  leave(caseId: string, socketId: string): void;
  of(caseId: string): CasePresence;
  /** All of them, for the table. */
  held(): readonly HeldViewer[];
  /** Told after each arrival and each leave. */
  whenChanged(tell: () => void): void;
}

interface Present {
  readonly viewers: Map<string, PresentViewer & { readonly hospitalId: string }>;
  deskGoneAt: string | null;
}

const mostCases = 5_000;

/** Keeps presence in memory. A case that nobody is at stays known, so that "desk not connected since" can be said. */
export function makePresence(nowMs: () => number): Presence {
  const processId = newId();
  const cases = new Map<string, Present>();
  let tell: () => void = () => undefined;
  const now = () => new Date(nowMs()).toISOString();
  return {
    processId,
    arrive(caseId, socketId, as) {
      const present = cases.get(caseId) ?? { viewers: new Map<string, PresentViewer & { hospitalId: string }>(), deskGoneAt: null };
      present.viewers.set(socketId, { ...as, since: now() });
      cases.set(caseId, present);
      tell();
    },
    leave(caseId, socketId) {
      const present = cases.get(caseId);
      const left = present?.viewers.get(socketId);
      if (present === undefined || left === undefined) return;
      present.viewers.delete(socketId);
      if (left.isDesk) present.deskGoneAt = now();
      if (cases.size > mostCases && present.viewers.size === 0) cases.delete(caseId);
      tell();
    },
    of: (caseId) => ({ viewers: [...(cases.get(caseId)?.viewers.values() ?? [])], deskGoneAt: cases.get(caseId)?.deskGoneAt ?? null }),
    held: () => [...cases].flatMap(([caseId, { viewers }]) => [...viewers].map(([viewerId, viewer]) => ({ ...viewer, viewerId, caseId }))),
    whenChanged(next) {
      tell = next;
    },
  };
}
