import { errorFactor } from '@/lib/change/error-factor';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** A change of a time. Longer is positive. */
export interface TimeChange {
  readonly changeMs: number;
  readonly changePercent: number;
  readonly standardErrorMs: number;
  readonly standardErrorPercent: number;
}

/** A time now and at baseline, the error of one mark and how many marks the time is made of. */
export interface TimePair {
  readonly baselineMs: number;
  readonly currentMs: number;
  readonly baselineRunCount: number;
  readonly markerErrorMs: number;
  readonly markCount: 1 | 2;
}

/**
 * Change of a time against its baseline with its standard error.
 *
 * Method: difference, rounded to the marker's resolution so that binary noise cannot cross a
 * limit; marks err independently, so two marks and the mean of n baseline runs add as squares.
 * The error in percent treats the baseline as the measure and is not propagated through it.
 *
 * @param pair times in ms (0.001 to 100), number of baseline runs (1 to 1,000), error of one mark in
 *   ms (0 to 5), number of marks in the time
 * @returns change and standard error in ms (to 0.001) and in percent of baseline (to 0.1), signed
 * @throws {RangeError} when a number lies outside its range
 * @source common practice; error: variance of a difference of independent marks
 * @accuracy within half a step of each resolution; tests/lib/change/time-change.test.ts
 * @example
 * timeChange({ baselineMs: 3.8, currentMs: 4.1, baselineRunCount: 1, markerErrorMs: 0.05, markCount: 1 })
 * // => { changeMs: 0.3, changePercent: 7.9, standardErrorMs: 0.071, standardErrorPercent: 1.9 }
 */
export function timeChange(pair: TimePair): TimeChange {
  assertWithin(pair.baselineMs, bounds.conductionTimeMs, 'baseline time');
  assertWithin(pair.currentMs, bounds.conductionTimeMs, 'time');
  assertWithin(pair.markerErrorMs, bounds.markerErrorMs, 'marker error');
  const changeMs = roundTo(pair.currentMs - pair.baselineMs, resolutions.timeMs);
  const errorMs = pair.markerErrorMs * Math.sqrt(pair.markCount) * errorFactor(pair.baselineRunCount);
  return {
    changeMs,
    changePercent: roundTo((100 * changeMs) / pair.baselineMs, resolutions.percent),
    standardErrorMs: roundTo(errorMs, resolutions.timeMs),
    standardErrorPercent: roundTo((100 * errorMs) / pair.baselineMs, resolutions.percent),
  };
}
