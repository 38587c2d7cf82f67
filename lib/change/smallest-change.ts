import { errorFactor } from '@/lib/change/error-factor';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** Scatter of a path and the number of runs of its baseline. */
export interface ScatterOfPath {
  readonly coefficientOfVariation: number;
  readonly baselineRunCount: number;
}

/** The smallest amplitude loss that could be seen on a path today. */
export interface SmallestChange {
  readonly smallestLossPercent: number;
}

/**
 * The smallest amplitude loss that would stand out from the scatter of this path today.
 *
 * Method: twice the standard error of an unchanged response, 200 · scatter · √(1 + 1/n) percent.
 * It is cautious: after a loss the scatter shrinks with the amplitude. At or above a limit of the
 * rules, the path is not monitorable by amplitude; above 100 no partial loss can be seen at all.
 *
 * @param path coefficient of variation as a ratio (0 to 10), number of baseline runs (1 to 1,000)
 * @returns the loss in percent, rounded to 0.1, 0 or more and possibly above 100
 * @throws {RangeError} when a number lies outside its range
 * @source house rule (two standard errors)
 * @accuracy within 0.05 percent points; tests/lib/change/smallest-change.test.ts
 * @example
 * smallestChange({ coefficientOfVariation: 0.08, baselineRunCount: 3 }) // => { smallestLossPercent: 18.5 }
 */
export function smallestChange(path: ScatterOfPath): SmallestChange {
  assertWithin(path.coefficientOfVariation, bounds.coefficientOfVariation, 'scatter');
  const lossPercent = 200 * path.coefficientOfVariation * errorFactor(path.baselineRunCount);
  return { smallestLossPercent: roundTo(lossPercent, resolutions.percent) };
}
