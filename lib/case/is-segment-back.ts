import type { BadSegment, CaseState } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';

/**
 * Whether a segment that was past its limit has a newer pair of runs inside it.
 * @param state the case with the newest judgement
 * @param segment which segment, and by what it was past its limit
 * @returns false also when its newest pair is no evidence: a pair that spans a step, or an onset that was not read
 * @source product rule: recovery is evidence
 * @accuracy exact; tests/lib/case/segment-course.test.ts
 * @example
 * isSegmentBack(state, { key: 'adm|above-elbow|below-elbow', measure: 'time' }) // => false
 */
export function isSegmentBack(state: CaseState, { key, measure }: BadSegment): boolean {
  const newest = state.segments[key];
  if (newest === undefined || isAbnormal(newest.findings)) return false;
  return (measure === 'time' ? newest.timeChangePercent : newest.ratioChangePercent) !== null;
}
