import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, ComparedRecord, Incident } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';

/**
 * Whether every path of a notice or alert is back inside its limit with the margin.
 *
 * Method: each path that was past a limit needs its newest `runsNeeded` comparable runs, all made after the first
 * abnormal one, inside the limit plus margin; no other path of the nerve tested since may be past a limit.
 *
 * @param runsNeeded 1 settles a notice, 2 shows the recovery of an alert
 * @returns true only with that evidence
 * @source product rule: recovery needs two comparable runs inside the limit plus margin; margin custom
 * @accuracy tests/lib/case/alert-course.test.ts
 * @example
 * hasRecovered(state, ulnar, incident, 2)
 */
export function hasRecovered(state: CaseState, nerve: Nerve, incident: Incident, runsNeeded: 1 | 2): boolean {
  const isBack = (record: ComparedRecord | null | undefined) =>
    record !== null && record !== undefined && record.seq > incident.firstSeq && isInside(state, record);
  const evidenceIsBack = incident.badPathIds.every((pathId) => {
    const record = state.paths[pathId];
    return isBack(record?.compared) && (runsNeeded === 1 || isBack(record?.previous));
  });
  const otherIsBad = state.plan.paths
    .filter((path) => path.nerveId === nerve.id)
    .map((path) => state.paths[path.id]?.compared)
    .some((record) => record !== null && record !== undefined && record.seq >= incident.firstSeq && isAbnormal(record.findings));
  const segmentIsBad = Object.values(state.segments).some(
    (segment) => segment.nerveId === nerve.id && isAbnormal(segment.findings) && segment.proximalAt >= incident.firstBadAt && segment.distalAt >= incident.firstBadAt,
  );
  return evidenceIsBack && !otherIsBad && !segmentIsBad;
}

function isInside(state: CaseState, record: ComparedRecord): boolean {
  const { amplitudeNoticeFallPercent, recoveryMarginPercent } = state.plan.rules;
  const percent = record.change.percentOfBaseline;
  const neededPercent = 100 - amplitudeNoticeFallPercent + recoveryMarginPercent;
  return !isAbnormal(record.findings) && (percent === null || percent >= neededPercent);
}
