import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

/**
 * How much a comparison with a mean of several runs widens the error of one run.
 *
 * Method: the run now and the mean of n baseline runs err independently, so their variances add:
 * the square root of 1 + 1/n. It does not know whether the baseline runs were taken alike.
 *
 * @param baselineRunCount number of baseline runs, a whole number from 1 to 1,000
 * @returns the factor, from 1 to 1.42, without a unit
 * @throws {RangeError} when the count is not a whole number from 1 to 1,000
 * @source variance of a difference of independent means, common practice
 * @accuracy exact to binary rounding; tests/lib/change/error-factor.test.ts
 * @example
 * errorFactor(1) // => Math.SQRT2
 */
export function errorFactor(baselineRunCount: number): number {
  assertWithin(baselineRunCount, bounds.runCount, 'number of baseline runs');
  if (!Number.isInteger(baselineRunCount)) {
    throw new RangeError(`Cannot use number of baseline runs: ${baselineRunCount} is not a whole number`);
  }
  return Math.sqrt(1 + 1 / baselineRunCount);
}
