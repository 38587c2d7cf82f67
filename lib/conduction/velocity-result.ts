import { measurementErrors } from '@/lib/conduction/measurement-errors';
import { shortSegmentMm } from '@/lib/conduction/short-segment-mm';
import { velocityError } from '@/lib/conduction/velocity-error';
import { velocityPlausibility, type VelocityPlausibility } from '@/lib/conduction/velocity-plausibility';

/** A velocity never travels without its error, its distance and its time. */
export interface Velocity {
  readonly kind: 'velocity';
  readonly velocityMps: number;
  readonly standardErrorMps: number;
  readonly distanceMm: number;
  readonly conductionTimeMs: number;
  readonly isShort: boolean;
  readonly plausibility: VelocityPlausibility;
}

/** Distance and time of one velocity; errors default to the assumed ones. */
export interface VelocityInput {
  readonly distanceMm: number;
  readonly conductionTimeMs: number;
  readonly distanceErrorMm?: number | undefined;
  readonly markerErrorMs?: number | undefined;
  readonly markCount: 1 | 2;
}

/**
 * The velocity of a known distance and conduction time with everything it is shown with.
 *
 * Method: millimetres over milliseconds are metres per second. The value is not rounded here.
 * It does not know how the time was taken: `twoSiteVelocity` and `oneSiteVelocity` do.
 *
 * @param input distance in mm (1 to 1,500), conduction time in ms (0.001 to 100), errors in mm and ms,
 *   number of onset marks in the time
 * @returns {kind: 'velocity'} with velocity and standard error in m/s, distance in mm, time in ms,
 *   whether the segment is short, and whether the value is plausible or asked back
 * @throws {RangeError} when a number lies outside its range
 * @source common practice (distance over time)
 * @accuracy exact to binary rounding; tests/lib/conduction/velocity-result.test.ts
 * @example
 * velocityResult({ distanceMm: 100, conductionTimeMs: 2, markCount: 2 }).velocityMps // => 50
 */
export function velocityResult(input: VelocityInput): Velocity {
  const { distanceMm, conductionTimeMs, markCount } = input;
  const standardErrorMps = velocityError({
    distanceMm,
    conductionTimeMs,
    distanceErrorMm: input.distanceErrorMm ?? measurementErrors.distanceErrorMm,
    markerErrorMs: input.markerErrorMs ?? measurementErrors.markerErrorMs,
    markCount,
  });
  const velocityMps = distanceMm / conductionTimeMs;
  return {
    kind: 'velocity',
    velocityMps,
    standardErrorMps,
    distanceMm,
    conductionTimeMs,
    isShort: distanceMm < shortSegmentMm.value,
    plausibility: velocityPlausibility(velocityMps),
  };
}
