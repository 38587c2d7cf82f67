import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import { planProblem } from '@/lib/case/plan-problem';

type PlanCommand = CaseCommand & { name: 'plan-case' | 'revise-plan' };

/** Plans a case or revises its plan before the first run. @returns drafts or a refusal @source house rule */
export function decidePlan(state: CaseState, command: PlanCommand): readonly EntryDraft[] | Refusal {
  const problem = planProblem(command.plan);
  if (problem !== null) return { code: 'plan-inconsistent', message: problem };
  if (command.name === 'plan-case') {
    if (state.seq > 0) return { code: 'already-planned', message: 'Case already planned: revise its plan instead' };
    const { reference, identityCommitment, plan } = command;
    const planned = draft('case.planned', { reference, identityCommitment, plan });
    return command.team === undefined ? [planned] : [planned, draft('team.assigned', { people: command.team })];
  }
  if (state.timeoutAt !== null && command.plan.side !== state.plan.side) {
    return {
      code: 'side-fixed',
      message: `Side fixed: the time-out confirmed ${state.plan.side}. Close this case and plan another for the ${command.plan.side} side`,
    };
  }
  if (state.runCount > 0) {
    return {
      code: 'plan-in-use',
      message: `Plan in use: ${state.runCount} runs are logged on it. Distances can be measured again; sites and channels stay`,
    };
  }
  return [draft('plan.revised', { plan: command.plan })];
}
