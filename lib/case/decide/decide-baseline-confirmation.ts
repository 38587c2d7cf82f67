import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/** The physician accepts a baseline that the desk accepted provisionally. @returns one draft or a refusal @source product rule */
export function decideBaselineConfirmation(state: CaseState, command: CaseCommand & { name: 'confirm-baseline' }): readonly EntryDraft[] | Refusal {
  const { baselineSeq, text } = command;
  const isWaiting = Object.values(state.baselines).some((baseline) => baseline.seq === baselineSeq && baseline.isProvisional);
  if (isWaiting) return [draft('baseline.confirmed', { baselineSeq, text })];
  return { code: 'no-baseline', message: `No baseline waits: entry ${baselineSeq} is no provisional baseline in force, or it is accepted already` };
}
