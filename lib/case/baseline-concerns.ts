import type { CaseState, KeptRun } from '@/lib/case/case-state';
import { supramaximalFactor } from '@/lib/change/stimulus-current';

/**
 * Why a baseline needs a written reason.
 * @param state the case with its conditions
 * @param runs the baseline runs that would be accepted
 * @returns sentences without a full stop, empty when nothing speaks against it
 * @source common practice: cuff down, four twitches, supramaximal current before a baseline
 * @accuracy exact; tests/lib/case/baseline.test.ts
 * @example
 * baselineConcerns(state, runs) // => ['Train-of-four unknown']
 */
export function baselineConcerns(state: CaseState, runs: readonly KeptRun[]): readonly string[] {
  const concerns: string[] = [];
  const cuff = state.conditions['tourniquet']?.condition;
  if (cuff?.kind === 'tourniquet' && cuff.isUp) concerns.push('Tourniquet is up');
  const train = state.conditions['train-of-four']?.condition;
  if (train?.kind !== 'train-of-four') concerns.push('Train-of-four unknown');
  else if (train.count < 4) concerns.push(`Train-of-four ${train.count} of 4`);
  if (runs.some((kept) => !isSupramaximal(kept))) concerns.push('Current not known to be supramaximal');
  return concerns;
}

function isSupramaximal({ run }: KeptRun): boolean {
  if (run.isSupramaximal) return true;
  return run.maximalResponseMa !== null && run.intensityMa >= supramaximalFactor.value * run.maximalResponseMa;
}
