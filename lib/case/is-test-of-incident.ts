import type { CaseState, Incident } from '@/lib/case/case-state';
import { isEndOfSegment } from '@/lib/case/is-end-of-segment';

/**
 * Whether a run is one of those that say if a notice or alert is back: of the two newest comparable runs of a path
 * that was past a limit, or of the newest pair of a segment that was.
 * @param state the case with the run's judgement
 * @param incident the open notice or alert
 * @param runSeq number of the run
 * @returns false for a run elsewhere on the nerve, and for one that is too old to count
 * @source house rule: what was past a limit is settled or recovered only by a test of it
 * @accuracy exact; tests/lib/case/late-entry.test.ts
 * @example
 * isTestOfIncident(state, incident, 52) // => true
 */
export function isTestOfIncident(state: CaseState, incident: Incident, runSeq: number): boolean {
  const kept = state.runs.find((run) => run.seq === runSeq);
  const isOfPath = incident.badPathIds.some((pathId) => {
    const record = state.paths[pathId];
    return record?.compared?.seq === runSeq || record?.previous?.seq === runSeq;
  });
  if (isOfPath || kept === undefined) return isOfPath;
  return incident.badSegments.some(({ key }) => {
    const newest = state.segments[key];
    return newest !== undefined && isEndOfSegment(newest, kept);
  });
}
