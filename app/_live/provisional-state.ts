import type { WaitingCommand } from '@/app/_live/live-store';
import type { CaseState } from '@/lib/case/case-state';
import type { Refusal } from '@/lib/case/commands';
import { decide } from '@/lib/case/decide';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { evolve } from '@/lib/case/evolve';

/** The case as its author expects it: committed entries and what waits on top. Never shown to anybody else. */
export interface ProvisionalCase {
  readonly state: CaseState;
  /** Entries that the waiting commands would give, in order, numbered from the committed head. Not committed. */
  readonly entries: readonly CaseEntry[];
  /** Waiting commands that would be refused as things stand. */
  readonly refusals: readonly { readonly commandId: string; readonly refusal: Refusal }[];
}

/**
 * Applies waiting commands by the same `decide` and `evolve` as the server. The server's decision replaces it.
 * @param committed state of the committed log; not modified
 * @param waiting the author's commands for this case in order; refused ones are passed over
 */
export function provisionalState(committed: CaseState, waiting: readonly WaitingCommand[], author: CaseEntry['author']): ProvisionalCase {
  let state = committed;
  const entries: CaseEntry[] = [];
  const refusals: { commandId: string; refusal: Refusal }[] = [];
  for (const { commandId, caseId, eventAt, command, status } of waiting) {
    if (status !== 'waiting' || caseId !== committed.caseId) continue;
    const decision = decide(state, command, { eventAt, nowMs: Date.parse(eventAt), role: author.role });
    if (decision.kind === 'refused') {
      refusals.push({ commandId, refusal: decision.refusal });
      continue;
    }
    for (const draft of decision.drafts) {
      const entry: CaseEntry = { ...draft, seq: state.seq + 1, eventAt, recordedAt: eventAt, commandId, author };
      state = evolve(state, entry);
      entries.push(entry);
    }
  }
  return { state, entries, refusals };
}
