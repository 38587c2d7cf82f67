import { errorFactor } from '@/lib/change/error-factor';
import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** An amplitude now and at baseline, with the scatter of the baseline. */
export interface AmplitudePair {
  readonly baselineUv: number;
  readonly currentUv: number;
  readonly coefficientOfVariation: number;
  readonly baselineRunCount: number;
}

/** A change of amplitude, or the reason why there is none. A rise is positive. */
export type AmplitudeChange =
  | {
      readonly kind: 'change';
      readonly percentOfBaseline: number;
      readonly changePercent: number;
      readonly standardErrorPercent: number;
    }
  | { readonly kind: 'not-computable'; readonly reason: 'baseline-absent' };

/**
 * Amplitude now in percent of baseline, the signed change and its standard error.
 *
 * Method: ratio of two amplitudes read by the same convention. The error assumes that scatter
 * grows with the amplitude, so it is 100 · ratio · scatter · √(1 + 1/n) percent points. An absent
 * response is not passed: it is judged as lost, which noise never vetoes. Relaxation, temperature
 * and a moved electrode change amplitudes too and are not seen here.
 *
 * @param pair amplitudes in µV (0 to 100,000), coefficient of variation as a ratio (0 to 10), number
 *   of baseline runs (1 to 1,000)
 * @returns {kind: 'change'} with percent of baseline, signed change in percent and standard error in
 *   percent points, each rounded to 0.1; or {kind: 'not-computable', reason: 'baseline-absent'} when
 *   the baseline is 0 at its resolution
 * @throws {RangeError} when a number lies outside its range
 * @source change: common practice; error: first-order propagation with a constant coefficient of variation
 * @accuracy within 0.05 percent points; tests/lib/change/amplitude-change.test.ts
 * @example
 * amplitudeChange({ baselineUv: 8000, currentUv: 3000, coefficientOfVariation: 0.08, baselineRunCount: 3 })
 * // => { kind: 'change', percentOfBaseline: 37.5, changePercent: -62.5, standardErrorPercent: 3.5 }
 */
export function amplitudeChange(pair: AmplitudePair): AmplitudeChange {
  assertWithin(pair.baselineUv, bounds.amplitudeUv, 'baseline amplitude');
  assertWithin(pair.currentUv, bounds.amplitudeUv, 'amplitude');
  assertWithin(pair.coefficientOfVariation, bounds.coefficientOfVariation, 'scatter');
  const factor = errorFactor(pair.baselineRunCount);
  if (roundTo(pair.baselineUv, resolutions.amplitudeUv) === 0) {
    return { kind: 'not-computable', reason: 'baseline-absent' };
  }
  const ratio = pair.currentUv / pair.baselineUv;
  const percentOfBaseline = roundTo(100 * ratio, resolutions.percent);
  return {
    kind: 'change',
    percentOfBaseline,
    changePercent: roundTo(percentOfBaseline - 100, resolutions.percent),
    standardErrorPercent: roundTo(100 * ratio * pair.coefficientOfVariation * factor, resolutions.percent),
  };
}
