import type { SegmentEnd, SegmentPairInput } from '@/lib/alert/segment-pair';
import { amplitudeChange } from '@/lib/change/amplitude-change';
import { amplitudeRatio } from '@/lib/change/amplitude-ratio';
import { isBeyondNoise, type ChangeWithError } from '@/lib/change/is-beyond-noise';

/** A change of the ratio in percent, with its standard error. */
export interface RatioChange extends ChangeWithError {
  readonly changePercent: number;
}

/**
 * Whether the response of an end itself fell beyond noise. A ratio also falls when only the distal response grew: that is a
 * gain, and nothing was lost proximally.
 * @param end one end of a pair, with its baseline; not modified
 * @returns false where it is not computable
 * @source house rule
 */
export function hasFallen(end: SegmentEnd): boolean {
  if (end.amplitudeUv === null || end.baselineAmplitudeUv === null) return false;
  const change = amplitudeChange({
    baselineUv: end.baselineAmplitudeUv,
    currentUv: end.amplitudeUv,
    coefficientOfVariation: end.baselineScatter,
    baselineRunCount: end.baselineRunCount,
  });
  if (change.kind === 'not-computable' || change.changePercent >= 0) return false;
  return isBeyondNoise({ change: change.changePercent, standardError: change.standardErrorPercent });
}

/** Above this many times its baseline a ratio says nothing but that one end is next to nothing. House rule. */
const largestRatioShare = 1000;

/**
 * The proximal/distal ratio of a pair against its own baseline.
 * @returns signed change and its standard error in percent points; null where it is not computable or says nothing
 * @source house rule
 */
export function ratioChangeOf({ proximal, distal }: SegmentPairInput): RatioChange | null {
  if (proximal.amplitudeUv === null || distal.amplitudeUv === null) return null;
  if (proximal.baselineAmplitudeUv === null || distal.baselineAmplitudeUv === null) return null;
  const nowTimesBaseline = proximal.amplitudeUv * distal.baselineAmplitudeUv;
  if (nowTimesBaseline > largestRatioShare * distal.amplitudeUv * proximal.baselineAmplitudeUv) return null;
  const ratio = amplitudeRatio({
    baseline: { proximalUv: proximal.baselineAmplitudeUv, distalUv: distal.baselineAmplitudeUv },
    current: { proximalUv: proximal.amplitudeUv, distalUv: distal.amplitudeUv },
    coefficientOfVariation: Math.max(proximal.baselineScatter, distal.baselineScatter),
    baselineRunCount: Math.min(proximal.baselineRunCount, distal.baselineRunCount),
  });
  if (ratio.kind === 'not-computable') return null;
  return { changePercent: ratio.changePercent, change: ratio.changePercent, standardError: ratio.standardErrorPercent };
}
