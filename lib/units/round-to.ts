import { assertFinite } from '@/lib/units/assert-finite';

/** Ten times the binary noise of ten million steps, which is the longest row here, and far below what a screen shows. */
const nudgeSteps = 1e-8;

/**
 * Rounds a quantity to its resolution, halves away from zero.
 *
 * Method: the value is counted in steps of the resolution; a count within a hundred-millionth of a half
 * is taken as the half that a person would have written, so 1.005 rounds to 1.01 although its
 * binary form lies a hair below. Minus zero becomes zero. It does not choose the resolution.
 *
 * @param value a number in any unit, finite, at most 2^53 steps of the resolution
 * @param resolution the step in the same unit, above 0; see `resolutions`
 * @returns the nearest whole number of steps, in the same unit
 * @throws {RangeError} when a number is not finite, the resolution not above 0, or the value too large for its step
 * @source house rule
 * @accuracy within half a step and a hundred-millionth, every half up to ten million steps; tests/lib/units/round-to.test.ts
 * @example
 * roundTo(1.005, 0.01) // => 1.01
 * roundTo(-0.25, 0.1) // => -0.3
 * roundTo(4.1 - 3.8, 0.001) // => 0.3
 */
export function roundTo(value: number, resolution: number): number {
  assertFinite(value, 'value to round');
  assertFinite(resolution, 'resolution');
  if (resolution <= 0) {
    throw new RangeError(`Cannot round: the resolution ${resolution} is not above 0`);
  }
  const stepsPerUnit = 1 / resolution;
  const wholeStepsPerUnit = Math.round(stepsPerUnit);
  // 1000 is exact where 0.001 is not, so the fine resolutions divide instead of multiply.
  const isFraction = wholeStepsPerUnit >= 1 && Math.abs(stepsPerUnit - wholeStepsPerUnit) < 1e-6;
  const steps = isFraction ? Math.abs(value) * wholeStepsPerUnit : Math.abs(value) / resolution;
  if (steps > Number.MAX_SAFE_INTEGER) {
    throw new RangeError(`Cannot round: ${value} is too large for a resolution of ${resolution}`);
  }
  const wholeSteps = Math.floor(steps + 0.5 + nudgeSteps);
  const size = isFraction ? wholeSteps / wholeStepsPerUnit : wholeSteps * resolution;
  return size === 0 ? 0 : Math.sign(value) * size;
}
