import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand, Refusal } from '@/lib/case/commands';
import { baselineConcerns } from '@/lib/case/baseline-concerns';
import { baselineRuns } from '@/lib/case/baseline-runs';
import { baselineValues } from '@/lib/case/baseline-values';
import type { DecideContext } from '@/lib/case/decide/decide-context';
import { draft } from '@/lib/case/decide/draft';
import type { EntryDraft } from '@/lib/case/entry-bodies';

/**
 * Accepts the newest baseline runs as the working baseline of their paths.
 *
 * Method: runs with the purpose "baseline", made after the time-out with this electrode and family since the last
 * acceptance. Cuff up, train-of-four under 4 or unknown, or a submaximal current need a written reason. A baseline
 * set after a loss carries how much was lost.
 *
 * @returns one draft, or a refusal
 * @source product rule; what needs a reason: common practice
 */
export function decideBaseline(
  state: CaseState,
  command: CaseCommand & { name: 'accept-baseline' },
  context: DecideContext,
): readonly EntryDraft[] | Refusal {
  const runs = baselineRuns(state, command.electrodeId, command.family);
  const values = state.plan.paths
    .map((path) => baselineValues(runs, path.id, state.plan.rules.assumedAmplitudeScatter))
    .filter((value) => value !== null);
  const pathIds = values.map((value) => value.pathId);
  if (pathIds.length === 0) {
    const why = state.timeoutAt === null ? 'Runs before the time-out are set-up runs' : 'Log at least one run with the purpose "baseline" and a response';
    return { code: 'no-baseline-run', message: `No baseline to accept with this electrode and family. ${why}` };
  }
  const concerns = baselineConcerns(state, runs);
  if (concerns.length > 0 && command.reason === null) {
    return { code: 'reason-needed', message: `Reason missing: ${concerns.join('. ')}. Say why this baseline is accepted` };
  }
  const isOpening = pathIds.some((pathId) => !hasBaseline(state, pathId));
  return [
    draft('baseline.accepted', {
      family: command.family,
      electrodeId: command.electrodeId,
      runSeqs: runs.map((run) => run.seq),
      pathIds,
      isOpening,
      isProvisional: context.role !== 'physician',
      reason: command.reason,
      setAfterPercent: lostBefore(state, pathIds),
      values,
    }),
  ];
}

function hasBaseline(state: CaseState, pathId: string): boolean {
  return Object.values(state.baselines).some((baseline) => baseline.pathId === pathId);
}

/** Amplitude change in percent that was open on these paths when the baseline moved; null when nothing was lost. */
function lostBefore(state: CaseState, pathIds: readonly string[]): number | null {
  const falls = pathIds
    .map((pathId) => state.paths[pathId]?.compared?.change.amplitudeChangePercent ?? null)
    .filter((change) => change !== null && change <= -state.plan.rules.amplitudeWatchFallPercent) as number[];
  const earlier = Object.values(state.baselines)
    .filter((baseline) => pathIds.includes(baseline.pathId) && baseline.setAfterPercent !== null)
    .map((baseline) => baseline.setAfterPercent as number);
  const all = [...falls, ...earlier];
  return all.length === 0 ? null : Math.min(...all);
}
