import { timeChange, type TimeChange } from '@/lib/change/time-change';
import { measurementErrors } from '@/lib/conduction/measurement-errors';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

/** An onset now and at baseline; the error of one mark is the assumed one unless given. */
export interface LatencyPair {
  readonly baselineMs: number;
  readonly currentMs: number;
  readonly baselineRunCount: number;
  readonly markerErrorMs?: number | undefined;
}

/**
 * Change of an onset latency against its baseline.
 *
 * Method: one mark in each run. It assumes the same take-off point in both; cooling and a weaker
 * stimulus lengthen a latency too and are not seen here.
 *
 * @param pair onsets in ms (0.1 to 100), number of baseline runs (1 to 1,000), error of one mark in ms (0 to 5)
 * @returns change and standard error in ms (to 0.001) and in percent of baseline (to 0.1), later is positive
 * @throws {RangeError} when a number lies outside its range
 * @source common practice; error: variance of a difference of independent marks
 * @accuracy within half a step of each resolution; tests/lib/change/latency-change.test.ts
 * @example
 * latencyChange({ baselineMs: 3.8, currentMs: 4.1, baselineRunCount: 1 }).changeMs // => 0.3
 */
export function latencyChange(pair: LatencyPair): TimeChange {
  assertWithin(pair.baselineMs, bounds.onsetMs, 'baseline onset');
  assertWithin(pair.currentMs, bounds.onsetMs, 'onset');
  return timeChange({ ...pair, markerErrorMs: pair.markerErrorMs ?? measurementErrors.markerErrorMs, markCount: 1 });
}
