import type { CaseState, Incident } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';

/**
 * Whether a path that was past a limit is inside it again while the notice or alert is open.
 * @returns true from the first such path on
 * @source house rule: a path that comes back is recovery, not a new place
 * @accuracy exact; tests/lib/case/alert-course.test.ts
 * @example
 * isComingBack(state, incident) // => false
 */
export function isComingBack(state: CaseState, incident: Incident): boolean {
  return incident.badPathIds
    .map((pathId) => state.paths[pathId]?.compared ?? null)
    .some((record) => record !== null && record.seq > incident.locateFromSeq && !isAbnormal(record.findings));
}
