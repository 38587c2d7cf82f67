import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';
import { assertFinite } from '@/lib/units/assert-finite';
import type { Sourced } from '@/lib/reference/sourced';

/** Whether a velocity is believed, or asked back with the likely cause. It is never refused. */
export type VelocityPlausibility =
  | 'plausible'
  | { readonly kind: 'ask-back'; readonly cause: 'centimetres-typed-as-millimetres' | 'check-distance-and-latencies' };

/** The velocities in m/s between which nothing is asked. Both ends are believed. */
export const plausibleVelocityMps: Sourced<{ readonly min: number; readonly max: number }> = {
  value: { min: 10, max: 120 },
  source: 'house',
  citation: 'House rule for limb nerve trunks: fast fibres lie near 40 to 70 m/s, severe slowing stays above 10',
};

/**
 * Asks back a velocity that no limb nerve trunk has.
 *
 * Method: a velocity below the limit that would be believed with a distance ten times as long
 * points to centimetres typed as millimetres; any other is asked back without a guess. Exchanged
 * latencies give no velocity at all and are told by the function that takes the latencies.
 * A regenerating nerve can conduct below 10 m/s: the person may confirm the value.
 *
 * @param velocityMps velocity in m/s, finite, above 0
 * @returns 'plausible', or {kind: 'ask-back', cause}
 * @throws {RangeError} when the velocity is not finite or not above 0
 * @source house rule
 * @accuracy exact at both limits; tests/lib/conduction/velocity-plausibility.test.ts
 * @example
 * velocityPlausibility(64.5) // => 'plausible'
 * velocityPlausibility(6.45) // => { kind: 'ask-back', cause: 'centimetres-typed-as-millimetres' }
 */
export function velocityPlausibility(velocityMps: number): VelocityPlausibility {
  assertFinite(velocityMps, 'velocity');
  if (velocityMps <= 0) throw new RangeError(`Cannot judge velocity: ${velocityMps} m/s is not above 0`);
  if (isBelieved(velocityMps)) return 'plausible';
  const isTenTimesTooShort = velocityMps < plausibleVelocityMps.value.min && isBelieved(velocityMps * 10);
  return {
    kind: 'ask-back',
    cause: isTenTimesTooShort ? 'centimetres-typed-as-millimetres' : 'check-distance-and-latencies',
  };
}

function isBelieved(velocityMps: number): boolean {
  const { min, max } = plausibleVelocityMps.value;
  const shownMps = roundTo(velocityMps, resolutions.velocityMps);
  return shownMps >= min && shownMps <= max;
}
