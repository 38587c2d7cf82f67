import type { Handle } from '@/db/connection';
import { entriesAfter } from '@/db/repositories/entries/entries-after';
import { findSnapshot } from '@/db/repositories/snapshots/find-snapshot';
import { applyEntry } from '@/lib/case/apply-entry';
import { initialState } from '@/lib/case/initial-state';
import { EMPTY_HEAD, type SealedEntry } from '@/lib/record/entry';
import type { KeptCase } from '@/server/cases/kept-case';
import { readSnapshot, stateVersion } from '@/server/cases/state-snapshot';
import { toWireEntry } from '@/server/cases/to-wire-entry';

/** Folded cases of this process. A kept case may be behind the log; it is never ahead of it. */
export interface CaseMemory {
  /** The kept case, or one folded from the log. May be behind. */
  load(caseId: string): Promise<KeptCase>;
  /** The case with every entry that the log holds now. */
  catchUp(caseId: string): Promise<KeptCase>;
  /** Adds entries that were just committed on top of `before`. */
  add(caseId: string, before: KeptCase, sealed: readonly SealedEntry[]): KeptCase;
  evict(caseId: string): void;
}

const pageSize = 1000;

/** Keeps at most so many folded cases; the one that was not used for longest goes first. */
export function makeCaseMemory(feed: Handle, capacity = 1000): CaseMemory {
  const kept = new Map<string, KeptCase>();

  function keep(caseId: string, next: KeptCase): KeptCase {
    const present = kept.get(caseId);
    // A reader that began earlier must not put back what a writer has passed since.
    if (present !== undefined && present.head.seq > next.head.seq) return present;
    kept.delete(caseId);
    kept.set(caseId, next);
    const oldest = kept.keys().next().value;
    if (kept.size > capacity && oldest !== undefined) kept.delete(oldest);
    return next;
  }

  async function readOn(caseId: string, from: KeptCase): Promise<KeptCase> {
    let next = from;
    for (;;) {
      const page = await entriesAfter(feed, caseId, next.head.seq, pageSize);
      next = applied(next, page);
      if (page.length < pageSize) return keep(caseId, next);
    }
  }

  async function begin(caseId: string): Promise<KeptCase> {
    const snapshot = await findSnapshot(feed, caseId, stateVersion);
    return (snapshot === null ? null : readSnapshot(snapshot)) ?? { state: initialState(caseId), head: EMPTY_HEAD };
  }

  return {
    load: async (caseId) => kept.get(caseId) ?? readOn(caseId, await begin(caseId)),
    catchUp: async (caseId) => readOn(caseId, kept.get(caseId) ?? (await begin(caseId))),
    add: (caseId, before, sealed) => keep(caseId, applied(before, sealed)),
    evict: (caseId) => void kept.delete(caseId),
  };
}

function applied(before: KeptCase, sealed: readonly SealedEntry[]): KeptCase {
  const last = sealed.at(-1);
  if (last === undefined) return before;
  return {
    state: sealed.reduce((state, one) => applyEntry(state, toWireEntry(one)), before.state),
    head: { seq: last.entry.seq, hash: last.hash, recordedAt: last.entry.recordedAt },
  };
}
