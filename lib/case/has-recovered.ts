import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, ComparedRecord, Incident } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isRebased } from '@/lib/case/is-rebased';
import { isSegmentBack } from '@/lib/case/is-segment-back';
import { isSince } from '@/lib/case/is-since';

/**
 * Whether every path and segment of a notice or alert is back inside its limit with the margin.
 *
 * Method: each path that was past a limit needs its newest `runsNeeded` comparable runs, all made after the first
 * abnormal one and with the amplitude read, inside the limit plus margin; so does the onset where it was part of the
 * finding. A slowed segment needs a newer pair inside its limit. No other path of the nerve tested since may be past one.
 * Being like a baseline that was set after the loss is no recovery.
 *
 * @param state the case with the newest judgement
 * @param nerve the nerve
 * @param incident its open notice or alert
 * @param runsNeeded 1 settles a notice, 2 shows the recovery of an alert
 * @returns true only with that evidence
 * @source product rule: recovery needs two comparable runs inside the limit plus margin; margin custom
 * @accuracy tests/lib/case/alert-course.test.ts
 * @example
 * hasRecovered(state, ulnar, incident, 2)
 */
export function hasRecovered(state: CaseState, nerve: Nerve, incident: Incident, runsNeeded: 1 | 2): boolean {
  const first = { at: incident.firstBadAt, seq: incident.firstSeq };
  const isBack = (record: ComparedRecord | null) =>
    record !== null && record.seq !== first.seq && isSince(record, first) && isInside(state, incident, record);
  const evidenceIsBack = incident.badPathIds.every((pathId) => {
    const record = state.paths[pathId];
    if (record === undefined || isRebased(state, pathId, first.at)) return false;
    return isBack(record.compared) && (runsNeeded === 1 || isBack(record.previous));
  });
  const otherIsBad = state.plan.paths
    .filter((path) => path.nerveId === nerve.id)
    .map((path) => state.paths[path.id]?.compared ?? null)
    .some((record) => record !== null && isSince(record, first) && isAbnormal(record.findings));
  const segmentIsBad = Object.values(state.segments).some(
    (segment) => segment.nerveId === nerve.id && isAbnormal(segment.findings) && segment.proximalAt >= first.at && segment.distalAt >= first.at,
  );
  return evidenceIsBack && !otherIsBad && !segmentIsBad && incident.badSegments.every((segment) => isSegmentBack(state, segment));
}

function isInside(state: CaseState, incident: Incident, record: ComparedRecord): boolean {
  const { amplitudeNoticeFallPercent, onsetNoticeRisePercent, recoveryMarginPercent } = state.plan.rules;
  const { percentOfBaseline, onsetChangePercent } = record.change;
  if (isAbnormal(record.findings) || percentOfBaseline === null) return false;
  if (percentOfBaseline < 100 - amplitudeNoticeFallPercent + recoveryMarginPercent) return false;
  const isOnsetPart = incident.finding === 'onset-late' || incident.finding === 'amplitude-and-onset';
  return !isOnsetPart || (onsetChangePercent !== null && onsetChangePercent <= onsetNoticeRisePercent - recoveryMarginPercent);
}
