import type { CaseState, Incident } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isSegmentBack } from '@/lib/case/is-segment-back';
import { isSince } from '@/lib/case/is-since';
import { segmentPathId } from '@/lib/case/keys';

/**
 * Whether a path that was past a limit is inside it again while the notice or alert is open.
 * @param state the case with the newest judgement
 * @param incident the open notice or alert
 * @returns true from the first such path on
 * @source house rule: a path that comes back is recovery, not a new place
 * @accuracy exact; tests/lib/case/alert-course.test.ts
 * @example
 * isComingBack(state, incident) // => false
 */
export function isComingBack(state: CaseState, incident: Incident): boolean {
  return incident.badPathIds.some((pathId) => {
    const record = state.paths[pathId]?.compared ?? null;
    const from = { at: incident.locateFromAt, seq: incident.locateFromSeq };
    if (record === null || record.seq === from.seq || !isSince(record, from) || isAbnormal(record.findings)) return false;
    return incident.badSegments.filter((segment) => segmentPathId(segment.key) === pathId).every((segment) => isSegmentBack(state, segment));
  });
}
