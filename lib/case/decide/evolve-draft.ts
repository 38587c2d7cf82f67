import type { CaseState } from '@/lib/case/case-state';
import type { CaseEntry, EntryDraft } from '@/lib/case/entry-bodies';
import { evolve } from '@/lib/case/evolve';
import { momentOfMs } from '@/lib/units/moment-of-ms';

/**
 * The state after a draft, as if it were committed now.
 * @param at when it happened (RFC 3339, UTC) and when it would be recorded (ms since 1970)
 * @returns a new state
 * @source house rule
 */
export function evolveDraft(state: CaseState, entry: EntryDraft, at: { readonly eventAt: string; readonly nowMs: number }): CaseState {
  const committed = {
    ...entry,
    seq: state.seq + 1,
    eventAt: at.eventAt,
    recordedAt: momentOfMs(at.nowMs),
    commandId: '',
    author: { id: '', role: '', displayName: '' },
  } as CaseEntry;
  return evolve(state, committed);
}
