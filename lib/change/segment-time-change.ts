import { timeChange, type TimeChange } from '@/lib/change/time-change';
import { conductionTime, type OnsetPair } from '@/lib/conduction/conduction-time';
import { measurementErrors } from '@/lib/conduction/measurement-errors';

/** Onsets of one segment now and at baseline, the runs the baseline is made of and the error of one mark. */
export interface SegmentPair {
  readonly baseline: OnsetPair;
  readonly current: OnsetPair;
  readonly baselineRunCount: number;
  readonly markerErrorMs?: number | undefined;
}

/** A change of the conduction time of a segment, or the reason why there is none. Slower is positive. */
export type SegmentTimeChange =
  | ({ readonly kind: 'change'; readonly baselineMs: number; readonly currentMs: number } & TimeChange)
  | {
      readonly kind: 'not-computable';
      readonly when: 'baseline' | 'now';
      readonly reason: 'latencies-equal' | 'latencies-exchanged';
    };

/**
 * Change of the conduction time of one segment against its own baseline.
 *
 * Method: no distance enters, so a tape error common to both cancels and an unmeasured segment can
 * still be judged. Two marks in each time. It holds only while the nerve keeps its course: after a
 * transposition the sites stand elsewhere on the nerve. Freshness of the pair is not checked.
 *
 * @param pair onsets in ms (0.1 to 100), number of baseline runs (1 to 1,000), error of one mark in ms (0 to 5)
 * @returns {kind: 'change'} with both times in ms, change and standard error in ms (to 0.001) and in
 *   percent of baseline (to 0.1); or {kind: 'not-computable'} with which pair fails and why
 * @throws {RangeError} when a number lies outside its range
 * @source common practice; error: variance of a difference of independent marks
 * @accuracy within half a step of each resolution; tests/lib/change/segment-time-change.test.ts
 * @example
 * segmentTimeChange({
 *   baseline: { proximalOnsetMs: 9.1, distalOnsetMs: 7.1 },
 *   current: { proximalOnsetMs: 9.6, distalOnsetMs: 7.1 },
 *   baselineRunCount: 1,
 * })
 * // => { kind: 'change', baselineMs: 2, currentMs: 2.5, changeMs: 0.5, changePercent: 25, standardErrorMs: 0.1, standardErrorPercent: 5 }
 */
export function segmentTimeChange(pair: SegmentPair): SegmentTimeChange {
  const baseline = conductionTime(pair.baseline);
  if (baseline.kind === 'not-computable') return { ...baseline, when: 'baseline' };
  const current = conductionTime(pair.current);
  if (current.kind === 'not-computable') return { ...current, when: 'now' };
  const change = timeChange({
    baselineMs: baseline.conductionTimeMs,
    currentMs: current.conductionTimeMs,
    baselineRunCount: pair.baselineRunCount,
    markerErrorMs: pair.markerErrorMs ?? measurementErrors.markerErrorMs,
    markCount: 2,
  });
  return { kind: 'change', baselineMs: baseline.conductionTimeMs, currentMs: current.conductionTimeMs, ...change };
}
