import type { Sourced } from '@/lib/reference/sourced';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** The current of a run, what is known of its strength, and whether the person ticked supramaximal. */
export interface StimulusCurrent {
  readonly intensityMa: number;
  readonly isSupramaximal: boolean;
  readonly maximalResponseMa: number | null;
}

/** How two currents stand to each other. */
export type CurrentRelation = 'equal' | 'supramaximal' | 'raised' | 'lower' | 'not-supramaximal';

/** Currents that differ by no more than this share of the baseline's count as equal. */
export const equalWithinPercent: Sourced<number> = {
  value: 5,
  source: 'house',
  citation: 'House rule: about the step of a dial, too small to recruit a visible share of the fibres',
};

/** Times the maximal-response current from which a stimulus counts as supramaximal. */
export const supramaximalFactor: Sourced<number> = {
  value: 1.2,
  source: 'commonPractice',
  citation: 'Common practice, 20 to 25 % above the current of the largest response (anaesthesia textbook, sixth edition)',
};

/**
 * How the current of a run stands to that of its baseline.
 *
 * Method: equal within 5 % comes first; then both supramaximal, where the response no longer
 * depends on the current; then raised or lower. A tick of the person counts as knowledge. It does
 * not see shunting by fluid, which weakens a stimulus at the same current.
 *
 * @param run current of the run in mA (0 to 100), with its largest-response current in mA or null
 * @param baseline the same of the baseline
 * @returns 'equal', 'supramaximal' (both), 'raised', 'lower', or 'not-supramaximal': lower than a
 *   supramaximal baseline and not known to be supramaximal itself
 * @throws {RangeError} when a current lies outside 0 to 100 mA
 * @source 1.2 times: common practice; 5 %: house rule
 * @accuracy exact at both limits; tests/lib/change/stimulus-current.test.ts
 * @example
 * stimulusCurrent(
 *   { intensityMa: 21, isSupramaximal: false, maximalResponseMa: null },
 *   { intensityMa: 20, isSupramaximal: false, maximalResponseMa: null },
 * ) // => 'equal'
 */
export function stimulusCurrent(run: StimulusCurrent, baseline: StimulusCurrent): CurrentRelation {
  assertWithin(run.intensityMa, bounds.intensityMa, 'current');
  assertWithin(baseline.intensityMa, bounds.intensityMa, 'baseline current');
  if (isEqualCurrent(run, baseline)) return 'equal';
  const isBaselineSupramaximal = isSupramaximal(baseline);
  if (isBaselineSupramaximal && isSupramaximal(run)) return 'supramaximal';
  if (run.intensityMa > baseline.intensityMa) return 'raised';
  return isBaselineSupramaximal ? 'not-supramaximal' : 'lower';
}

/**
 * Whether a current is equal to another within the share that counts as equal.
 * @param run current in mA
 * @param other current in mA; the share is taken of this one
 * @returns true also at exactly 5 %
 * @source house rule
 * @accuracy exact at the limit; tests/lib/change/stimulus-current.test.ts
 * @example
 * isEqualCurrent({ intensityMa: 0.63 }, { intensityMa: 0.6 }) // => true
 */
export function isEqualCurrent(run: Pick<StimulusCurrent, 'intensityMa'>, other: Pick<StimulusCurrent, 'intensityMa'>): boolean {
  const differenceMa = roundTo(run.intensityMa - other.intensityMa, resolutions.intensityMa);
  // The nudge keeps 0.63 against 0.60 mA equal, although their binary difference lies a hair above.
  return Math.abs(differenceMa) <= (other.intensityMa * equalWithinPercent.value) / 100 + 1e-9;
}

function isSupramaximal(current: StimulusCurrent): boolean {
  if (current.isSupramaximal) return true;
  if (current.maximalResponseMa === null) return false;
  assertWithin(current.maximalResponseMa, bounds.intensityMa, 'current of the largest response');
  return current.intensityMa > 0 && current.intensityMa >= supramaximalFactor.value * current.maximalResponseMa - 1e-9;
}
