import type { CaseState, KeptRun } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { alertDrafts } from '@/lib/case/decide/alert-drafts';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { draft } from '@/lib/case/decide/draft';
import { evolveDraft } from '@/lib/case/decide/evolve-draft';
import { judgedDraft, type Judged } from '@/lib/case/decide/judged-draft';
import { roundRun } from '@/lib/case/decide/round-run';
import { runProblem } from '@/lib/case/decide/run-problem';
import { uncoveredDrafts } from '@/lib/case/decide/uncovered-drafts';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/**
 * Corrects or withdraws a run and judges its paths again.
 *
 * Method: an alert whose every abnormal run is gone is withdrawn and says so; an alert with other evidence stays.
 * A correction that shows a change the typing had hidden raises it with the run's own time, and waits for a test that
 * comes after it. A run that its baseline was made of, or that is older, is not held against that baseline.
 *
 * @param state the case
 * @param command the run as it should read, or null to withdraw it
 * @param context times of the command
 * @returns drafts: run.corrected, run.judged, then alert entries; or a refusal
 * @source product rule: a correction judges its path again; nothing ends by itself
 */
export function decideCorrection(
  state: CaseState,
  command: CaseCommand & { name: 'correct-run' },
  context: DecideContext,
): readonly EntryDraft[] | Refusal {
  const kept = state.runs.find((run) => run.seq === command.runSeq);
  if (kept === undefined) {
    return { code: 'run-unknown', message: `Run not correctable: entry ${command.runSeq} is no run among the newest six of a site` };
  }
  if (command.run !== null && command.run.siteId !== kept.run.siteId) {
    return {
      code: 'site-differs',
      message: `Site differs: entry ${command.runSeq} was made at ${kept.run.siteId}. Withdraw it and log the run again at ${command.run.siteId}`,
    };
  }
  const run = command.run === null ? null : roundRun(command.run);
  const problem = run === null ? null : runProblem(state, run);
  if (problem !== null) return problem;
  const corrected = draft('run.corrected', { runSeq: command.runSeq, run, reason: command.reason });
  const drafts: EntryDraft[] = [corrected];
  let after = evolveDraft(state, corrected, context);
  const judged = run === null ? null : judgedAgain(after, kept);
  if (judged !== null) {
    drafts.push(judged.entry);
    after = evolveDraft(after, judged.entry, context);
  }
  const withdrawn = Object.values(state.incidents).filter(
    (incident) => incident.badSeqs.includes(command.runSeq) && after.incidents[incident.nerveId]?.badSeqs.length === 0,
  );
  for (const { alertId } of withdrawn) {
    const gone = draft('alert.withdrawn', { alertId, runSeq: command.runSeq });
    drafts.push(gone);
    after = evolveDraft(after, gone, context);
  }
  const shown = judged === null ? [] : alertDrafts(withdrawn.length > 0 ? after : state, after, judged.body);
  return [...drafts, ...(shown.length > 0 ? shown : uncoveredDrafts(state, after, kept))];
}

/** The judgement of a corrected run; none where its baseline was made of it or is newer, and it has no older one. */
function judgedAgain(state: CaseState, kept: KeptRun): Judged | null {
  const judged = judgedDraft(state, kept.seq);
  const isOlder = Object.values(state.baselines).some((baseline) => baseline.pathId.startsWith(`${kept.run.siteId}/`) && kept.at <= baseline.at);
  return isOlder && judged?.body.paths.every((path) => path.kind === 'not-compared') === true ? null : judged;
}
