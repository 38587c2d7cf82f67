import { errorFactor } from '@/lib/change/error-factor';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** Amplitudes of one muscle from two sites, with the scatter of the baseline of one site. */
export interface SitePair {
  readonly proximalUv: number;
  readonly distalUv: number;
}

/** Both sites now and at baseline. The scatter is that of the site which scatters more. */
export interface RatioPair {
  readonly baseline: SitePair;
  readonly current: SitePair;
  readonly coefficientOfVariation: number;
  readonly baselineRunCount: number;
}

/** The proximal/distal ratio against its own baseline, or the reason why there is none. */
export type AmplitudeRatio =
  | {
      readonly kind: 'ratio';
      readonly ratio: number;
      readonly baselineRatio: number;
      readonly changePercent: number;
      readonly standardErrorPercent: number;
    }
  | { readonly kind: 'not-computable'; readonly reason: 'distal-absent' | 'baseline-absent' };

/**
 * Proximal/distal amplitude ratio against its own baseline: whatever weakens the muscle as a whole cancels.
 *
 * Method: proximal over distal amplitude now, in percent of the same ratio at baseline. The four
 * amplitudes are taken to scatter independently, so the error carries √2 more than that of one
 * amplitude. It is silent when the harm lies distal to both sites, since both fall together.
 *
 * @param pair amplitudes in µV (0 to 100,000), coefficient of variation as a ratio (0 to 10), number of
 *   baseline runs (1 to 1,000)
 * @returns {kind: 'ratio'} with both ratios (to 0.001), change in percent and standard error in percent
 *   points (to 0.1), a fall is negative; or {kind: 'not-computable'} when a distal or baseline amplitude is 0
 * @throws {RangeError} when a number lies outside its range
 * @source proximal/distal ratio of the recurrent laryngeal nerve: Thyroid 2019, doi 10.1089/thy.2019.0361
 *   (abstract); use against its own baseline and error: house rule
 * @accuracy within 0.05 percent points; tests/lib/change/amplitude-ratio.test.ts
 * @example
 * amplitudeRatio({
 *   baseline: { proximalUv: 8000, distalUv: 10000 },
 *   current: { proximalUv: 3000, distalUv: 5000 },
 *   coefficientOfVariation: 0.05,
 *   baselineRunCount: 1,
 * })
 * // => { kind: 'ratio', ratio: 0.6, baselineRatio: 0.8, changePercent: -25, standardErrorPercent: 7.5 }
 */
export function amplitudeRatio(pair: RatioPair): AmplitudeRatio {
  for (const site of [pair.baseline, pair.current]) {
    assertWithin(site.proximalUv, bounds.amplitudeUv, 'proximal amplitude');
    assertWithin(site.distalUv, bounds.amplitudeUv, 'distal amplitude');
  }
  assertWithin(pair.coefficientOfVariation, bounds.coefficientOfVariation, 'scatter');
  const factor = Math.SQRT2 * errorFactor(pair.baselineRunCount);
  if (isZero(pair.baseline.proximalUv) || isZero(pair.baseline.distalUv)) {
    return { kind: 'not-computable', reason: 'baseline-absent' };
  }
  if (isZero(pair.current.distalUv)) return { kind: 'not-computable', reason: 'distal-absent' };
  const ratio = pair.current.proximalUv / pair.current.distalUv;
  const baselineRatio = pair.baseline.proximalUv / pair.baseline.distalUv;
  const share = ratio / baselineRatio;
  return {
    kind: 'ratio',
    ratio: roundTo(ratio, resolutions.ratio),
    baselineRatio: roundTo(baselineRatio, resolutions.ratio),
    changePercent: roundTo(100 * share - 100, resolutions.percent),
    standardErrorPercent: roundTo(100 * share * pair.coefficientOfVariation * factor, resolutions.percent),
  };
}

function isZero(amplitudeUv: number): boolean {
  return roundTo(amplitudeUv, resolutions.amplitudeUv) === 0;
}
