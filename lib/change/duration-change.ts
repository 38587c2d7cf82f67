import { timeChange, type TimeChange } from '@/lib/change/time-change';
import { measurementErrors } from '@/lib/conduction/measurement-errors';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

/** A negative-peak duration now and at baseline; the error of one mark is the assumed one unless given. */
export interface DurationPair {
  readonly baselineMs: number;
  readonly currentMs: number;
  readonly baselineRunCount: number;
  readonly markerErrorMs?: number | undefined;
}

/**
 * Change of a negative-peak duration against its baseline.
 *
 * Method: a duration has two marks, onset and return to the baseline, in each run. Both durations
 * must be read by the same rule. A longer duration with a lower amplitude points to dispersion,
 * which this function does not judge.
 *
 * @param pair durations in ms (0.1 to 100), number of baseline runs (1 to 1,000), error of one mark in ms (0 to 5)
 * @returns change and standard error in ms (to 0.001) and in percent of baseline (to 0.1), longer is positive
 * @throws {RangeError} when a number lies outside its range
 * @source common practice; error: variance of a difference of independent marks
 * @accuracy within half a step of each resolution; tests/lib/change/duration-change.test.ts
 * @example
 * durationChange({ baselineMs: 5.6, currentMs: 6.9, baselineRunCount: 3 }).changePercent // => 23.2
 */
export function durationChange(pair: DurationPair): TimeChange {
  assertWithin(pair.baselineMs, bounds.durationMs, 'baseline duration');
  assertWithin(pair.currentMs, bounds.durationMs, 'duration');
  return timeChange({ ...pair, markerErrorMs: pair.markerErrorMs ?? measurementErrors.markerErrorMs, markCount: 2 });
}
