import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { alertDrafts } from '@/lib/case/decide/alert-drafts';
import { draft } from '@/lib/case/decide/draft';
import { evolveDraft } from '@/lib/case/decide/evolve-draft';
import { judgedDraft } from '@/lib/case/decide/judged-draft';
import { roundRun } from '@/lib/case/decide/round-run';
import { runProblem } from '@/lib/case/decide/run-problem';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/**
 * Logs a run, judges it, and raises, confirms, worsens, locates or recovers what it shows.
 * @param state the case
 * @param command the run
 * @param context times of the command
 * @returns drafts: run.logged, run.judged, then alert entries; a refusal only for what the plan does not have, or an amplitude of 0
 * @source product rule: a well-formed run is never refused for the case's state
 */
export function decideRun(
  state: CaseState,
  command: CaseCommand & { name: 'log-run' },
  context: DecideContext,
): readonly EntryDraft[] | Refusal {
  const run = roundRun(command.run);
  const problem = runProblem(state, run);
  if (problem !== null) return problem;
  const logged = draft('run.logged', run);
  const afterRun = evolveDraft(state, logged, context);
  const judged = judgedDraft(afterRun, state.seq + 1);
  if (judged === null) return [logged];
  const afterJudgement = evolveDraft(afterRun, judged.entry, context);
  return [logged, judged.entry, ...alertDrafts(state, afterJudgement, judged.body)];
}
