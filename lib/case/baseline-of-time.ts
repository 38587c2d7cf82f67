import type { Baseline, CaseState } from '@/lib/case/case-state';
import { baselineKey } from '@/lib/case/keys';
import type { RunToJudge } from '@/lib/case/run-to-judge';

/**
 * The baseline that a run had at its own time.
 *
 * Method: the working baseline when the run is newer than it, else the opening one when it is newer than that: those are
 * the two that the state keeps, and the opening one is never moved by what happened since.
 *
 * @param state the case
 * @param judged the run with its event time
 * @param pathId one of its paths
 * @returns null for a run that its baseline was made of, for one from before the first, and where there is none
 * @source product rule: a late entry is judged with the conditions of its own time
 * @accuracy exact; tests/lib/case/baseline-moved.test.ts
 * @example
 * baselineOfTime(state, { at, run }, 'wrist/adm')?.amplitudeUv
 */
export function baselineOfTime(state: CaseState, judged: RunToJudge, pathId: string): Baseline | null {
  const key = baselineKey(pathId, judged.run.electrodeId, judged.run.family);
  const candidates = [state.baselines[key], state.openingBaselines[key]];
  return candidates.find((baseline) => baseline !== undefined && judged.at > baseline.at) ?? null;
}
