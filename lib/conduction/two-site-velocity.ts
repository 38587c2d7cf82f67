import { conductionTime, type OnsetPair } from '@/lib/conduction/conduction-time';
import { velocityResult, type Velocity } from '@/lib/conduction/velocity-result';

/** Two onsets and the distance between their sites, cathode to cathode; null where nobody measured it. */
export interface TwoSiteInput extends OnsetPair {
  readonly distanceMm: number | null;
  readonly distanceErrorMm?: number | undefined;
  readonly markerErrorMs?: number | undefined;
}

/** A velocity, or the reason why there is none. */
export type TwoSiteVelocity =
  | Velocity
  | {
      readonly kind: 'not-computable';
      readonly reason: 'latencies-equal' | 'latencies-exchanged' | 'distance-missing';
    };

/**
 * Conduction velocity of a nerve between two stimulation sites, with its standard error.
 *
 * Method: distance cathode to cathode over the difference of the onset latencies. It assumes the
 * same take-off point in both responses and the distance measured along the nerve in this
 * position of the limb; a peak latency in place of an onset gives too low a value. It does not
 * check that the two runs are fresh, nor that no risk step lies between them.
 *
 * @param input distance in mm (1 to 1,500, or null), onsets in ms (0.1 to 100), tape error in mm and
 *   error of one mark in ms, one standard deviation each
 * @returns {kind: 'velocity'}, unrounded, with standard error, distance, time, `isShort` and
 *   `plausibility`; or {kind: 'not-computable'} with the reason. Never Infinity, never NaN
 * @throws {RangeError} when a number lies outside its range
 * @source Hodes, Larrabee and German 1948 (from memory); the arithmetic is common practice
 * @accuracy published worked examples to 0.05 m/s; tests/reference/velocity.test.ts
 * @example
 * twoSiteVelocity({ distanceMm: 220, proximalOnsetMs: 7.8, distalOnsetMs: 3.8 }).velocityMps // => 55
 * twoSiteVelocity({ distanceMm: null, proximalOnsetMs: 7.8, distalOnsetMs: 3.8 }) // => { kind: 'not-computable', reason: 'distance-missing' }
 */
export function twoSiteVelocity(input: TwoSiteInput): TwoSiteVelocity {
  const time = conductionTime(input);
  if (time.kind === 'not-computable') return time;
  if (input.distanceMm === null) return { kind: 'not-computable', reason: 'distance-missing' };
  return velocityResult({
    distanceMm: input.distanceMm,
    conductionTimeMs: time.conductionTimeMs,
    distanceErrorMm: input.distanceErrorMm,
    markerErrorMs: input.markerErrorMs,
    markCount: 2,
  });
}
