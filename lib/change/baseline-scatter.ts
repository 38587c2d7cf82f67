import type { Sourced } from '@/lib/reference/sourced';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** How far amplitudes of one path scatter from run to run, and what that rests on. */
export interface BaselineScatter {
  readonly coefficientOfVariation: number;
  readonly baselineRunCount: number;
  readonly isAssumed: boolean;
}

/** Amplitudes of the runs a baseline is made of, and the figure to fall back on. */
export interface BaselineRuns {
  readonly amplitudesUv: readonly number[];
  readonly assumedCoefficientOfVariation?: number | undefined;
}

/** Fewer runs than this tell nothing about scatter. */
const runsNeeded = 3;

/** Amplitude scatter within one session where the baseline has too few runs to show its own. */
export const assumedAmplitudeScatter: Sourced<number> = {
  value: 0.08,
  source: 'house',
  citation:
    'Middle of 3 to 14 %: 15.6 to 19.8 % between sessions, 30 to 80 % lower within one (reliability of nerve conduction studies, 2009, PMC2777171)',
};

/** Three runs can agree by chance; no path is taken to scatter less than the steadiest one published. */
export const smallestAmplitudeScatter: Sourced<number> = {
  value: 0.03,
  source: 'house',
  citation: 'Lower end of 3 to 14 % within one session, from the same paper as the assumed scatter',
};

/**
 * Scatter of the amplitude from run to run, from the baseline runs themselves where they suffice.
 *
 * Method: three runs or more give the sample standard deviation (n − 1) over the mean, not below
 * a floor; fewer give the assumed figure, marked so. It assumes runs under the same conditions: a
 * drift within the baseline is read as scatter. Absent responses are not passed.
 *
 * @param runs amplitudes in µV (0 to 100,000), at least one, not modified; the assumed coefficient
 *   of variation as a ratio (0 to 10), 0.08 unless given
 * @returns coefficient of variation as a ratio (0.08 is 8 %), number of runs, and `isAssumed`, which
 *   is true for fewer than three runs and for runs whose mean is 0
 * @throws {RangeError} when there is no run or a number lies outside its range
 * @source sample standard deviation: common practice; floor and assumed figure: house rule from PMC2777171
 * @accuracy exact to 0.00005; tests/lib/change/baseline-scatter.test.ts
 * @example
 * baselineScatter({ amplitudesUv: [9000, 10000, 11000] }) // => { coefficientOfVariation: 0.1, baselineRunCount: 3, isAssumed: false }
 * baselineScatter({ amplitudesUv: [9000] }) // => { coefficientOfVariation: 0.08, baselineRunCount: 1, isAssumed: true }
 */
export function baselineScatter(runs: BaselineRuns): BaselineScatter {
  const { amplitudesUv, assumedCoefficientOfVariation = assumedAmplitudeScatter.value } = runs;
  const baselineRunCount = amplitudesUv.length;
  assertWithin(baselineRunCount, bounds.runCount, 'number of baseline runs');
  assertWithin(assumedCoefficientOfVariation, bounds.coefficientOfVariation, 'assumed scatter');
  for (const amplitudeUv of amplitudesUv) assertWithin(amplitudeUv, bounds.amplitudeUv, 'amplitude');
  const meanUv = amplitudesUv.reduce((sum, amplitudeUv) => sum + amplitudeUv, 0) / baselineRunCount;
  if (baselineRunCount < runsNeeded || roundTo(meanUv, resolutions.amplitudeUv) === 0) {
    return { coefficientOfVariation: assumedCoefficientOfVariation, baselineRunCount, isAssumed: true };
  }
  const squares = amplitudesUv.reduce((sum, amplitudeUv) => sum + (amplitudeUv - meanUv) ** 2, 0);
  const ownScatter = Math.sqrt(squares / (baselineRunCount - 1)) / meanUv;
  const coefficientOfVariation = Math.max(smallestAmplitudeScatter.value, roundTo(ownScatter, resolutions.coefficientOfVariation));
  return { coefficientOfVariation, baselineRunCount, isAssumed: false };
}
