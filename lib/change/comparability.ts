import { stimulusCurrent, type StimulusCurrent } from '@/lib/change/stimulus-current';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** How a run on one path was made; the same shape describes its baseline. */
export interface RunConditions extends StimulusCurrent {
  readonly electrode: string;
  readonly family: 'pre-position' | 'through-skin' | 'exposed';
  readonly pulseWidthUs: number;
  readonly convention: string;
}

/** Whether a run can be set against its baseline. */
export type Comparability =
  | { readonly kind: 'comparable'; readonly current: 'equal' | 'supramaximal' }
  | { readonly kind: 'raised' }
  | {
      readonly kind: 'not-compared';
      readonly reason:
        | 'electrode-differs'
        | 'family-differs'
        | 'pulse-width-differs'
        | 'convention-differs'
        | 'current-lower'
        | 'current-not-supramaximal';
    };

/**
 * Like with like: whether a run and a baseline of the same path were made alike.
 *
 * Method: electrode, baseline family, pulse width and amplitude convention must be the same, and
 * the current equal within 5 % or supramaximal in both. 'raised' stands apart: a response that is
 * still small at a higher current is evidence of loss, a larger one proves nothing. The first
 * difference found is the reason. That both belong to the same path is the caller's part.
 *
 * @param run how the run was made: currents in mA (0 to 100), pulse width in µs (10 to 2,000)
 * @param baseline the same of the baseline
 * @returns {kind: 'comparable', current}, {kind: 'raised'}, or {kind: 'not-compared', reason}
 * @throws {RangeError} when a current lies outside 0 to 100 mA or a pulse width is not finite
 * @source common practice; limits see `stimulusCurrent`
 * @accuracy exact; tests/lib/change/comparability.test.ts
 * @example
 * comparability(
 *   { electrode: 'probe', family: 'exposed', pulseWidthUs: 200, convention: 'peak-to-peak', intensityMa: 2, isSupramaximal: true, maximalResponseMa: null },
 *   { electrode: 'hook', family: 'exposed', pulseWidthUs: 200, convention: 'peak-to-peak', intensityMa: 2, isSupramaximal: true, maximalResponseMa: null },
 * ) // => { kind: 'not-compared', reason: 'electrode-differs' }
 */
export function comparability(run: RunConditions, baseline: RunConditions): Comparability {
  if (run.electrode !== baseline.electrode) return { kind: 'not-compared', reason: 'electrode-differs' };
  if (run.family !== baseline.family) return { kind: 'not-compared', reason: 'family-differs' };
  if (roundTo(run.pulseWidthUs - baseline.pulseWidthUs, resolutions.pulseWidthUs) !== 0) {
    return { kind: 'not-compared', reason: 'pulse-width-differs' };
  }
  if (run.convention !== baseline.convention) return { kind: 'not-compared', reason: 'convention-differs' };
  const current = stimulusCurrent(run, baseline);
  switch (current) {
    case 'equal':
    case 'supramaximal':
      return { kind: 'comparable', current };
    case 'raised':
      return { kind: 'raised' };
    case 'lower':
      return { kind: 'not-compared', reason: 'current-lower' };
    case 'not-supramaximal':
      return { kind: 'not-compared', reason: 'current-not-supramaximal' };
  }
}
