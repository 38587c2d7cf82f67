import { velocityResult, type Velocity } from '@/lib/conduction/velocity-result';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

/** One onset of a nerve response and the distance from cathode to recording electrode; null where nobody measured it. */
export interface OneSiteInput {
  readonly distanceMm: number | null;
  readonly onsetMs: number;
  readonly distanceErrorMm?: number | undefined;
  readonly markerErrorMs?: number | undefined;
}

/** A velocity, or the reason why there is none. */
export type OneSiteVelocity = Velocity | { readonly kind: 'not-computable'; readonly reason: 'distance-missing' };

/**
 * Conduction velocity of a nerve action potential from one stimulation site.
 *
 * Method: distance over onset latency. It holds only where the nerve itself is recorded: a muscle
 * latency contains the junction and the muscle and gives no velocity. The stimulus mark is taken
 * as exact; a delay of the stimulator is not corrected.
 *
 * @param input distance in mm (1 to 1,500, or null), onset in ms (0.1 to 100), tape error in mm and
 *   error of the mark in ms, one standard deviation each
 * @returns {kind: 'velocity'}, unrounded, with standard error, distance, time, `isShort` and
 *   `plausibility`; or {kind: 'not-computable', reason: 'distance-missing'}. Never Infinity, never NaN
 * @throws {RangeError} when a number lies outside its range
 * @source common practice (distance over onset latency)
 * @accuracy published means to 0.05 m/s; tests/reference/velocity.test.ts
 * @example
 * oneSiteVelocity({ distanceMm: 140, onsetMs: 2.5 }).velocityMps // => 56
 */
export function oneSiteVelocity(input: OneSiteInput): OneSiteVelocity {
  assertWithin(input.onsetMs, bounds.onsetMs, 'onset');
  if (input.distanceMm === null) return { kind: 'not-computable', reason: 'distance-missing' };
  return velocityResult({
    distanceMm: input.distanceMm,
    conductionTimeMs: input.onsetMs,
    distanceErrorMm: input.distanceErrorMm,
    markerErrorMs: input.markerErrorMs,
    markCount: 1,
  });
}
