import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/** Id of a step that is not in the plan and is named by hand. It counts as a risk step: calm has to be earned again. */
export const otherStepId = 'other';

/** Logs a surgical step of the plan, or another one in the person's words. @returns drafts or a refusal @source product rule */
export function decideStep(state: CaseState, command: CaseCommand & { name: 'log-step' }): readonly EntryDraft[] | Refusal {
  const step = state.plan.steps.find((candidate) => candidate.id === command.stepId);
  if (step !== undefined) {
    const { id, label, since, isRisk, voidsDistances } = step;
    return [draft('step.logged', { stepId: id, label, since, isRisk, voidsDistances })];
  }
  if (command.stepId !== otherStepId || command.label === null) {
    const known = state.plan.steps.map((candidate) => candidate.id).join(', ');
    return { code: 'step-unknown', message: `Step unknown: ${command.stepId}. The plan has ${known}, or "other" with its name` };
  }
  const since = command.label.charAt(0).toLowerCase() + command.label.slice(1);
  return [draft('step.logged', { stepId: otherStepId, label: command.label, since, isRisk: true, voidsDistances: false })];
}
