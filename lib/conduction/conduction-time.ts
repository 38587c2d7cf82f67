import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** Time between two sites, or why there is none. */
export type ConductionTime =
  | { readonly kind: 'time'; readonly conductionTimeMs: number }
  | { readonly kind: 'not-computable'; readonly reason: 'latencies-equal' | 'latencies-exchanged' };

/** Onset latencies of the same response from the proximal and the distal site. */
export interface OnsetPair {
  readonly proximalOnsetMs: number;
  readonly distalOnsetMs: number;
}

/**
 * Conduction time of the nerve between two stimulation sites.
 *
 * Method: the subtraction cancels what both latencies hold in common: the junction and the muscle.
 * It misleads when the two onsets are not marked at corresponding take-off points.
 *
 * @param pair both onsets in ms, 0.1 to 100
 * @returns {kind: 'time'} in ms, rounded to 0.001; or {kind: 'not-computable'} when the onsets are
 *   equal, or the proximal one is the earlier ("latencies exchanged or a wrong peak marked")
 * @throws {RangeError} when an onset lies outside 0.1 to 100 ms
 * @source common practice (difference of latencies)
 * @accuracy within 0.0005 ms; tests/lib/conduction/conduction-time.test.ts
 * @example
 * conductionTime({ proximalOnsetMs: 6.5, distalOnsetMs: 2.7 }) // => { kind: 'time', conductionTimeMs: 3.8 }
 * conductionTime({ proximalOnsetMs: 2.7, distalOnsetMs: 2.7 }) // => { kind: 'not-computable', reason: 'latencies-equal' }
 */
export function conductionTime(pair: OnsetPair): ConductionTime {
  assertWithin(pair.proximalOnsetMs, bounds.onsetMs, 'proximal onset');
  assertWithin(pair.distalOnsetMs, bounds.onsetMs, 'distal onset');
  const conductionTimeMs = roundTo(pair.proximalOnsetMs - pair.distalOnsetMs, resolutions.timeMs);
  if (conductionTimeMs === 0) return { kind: 'not-computable', reason: 'latencies-equal' };
  if (conductionTimeMs < 0) return { kind: 'not-computable', reason: 'latencies-exchanged' };
  return { kind: 'time', conductionTimeMs };
}
