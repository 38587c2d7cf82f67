import { judgeVersion, type Location } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import type { AbnormalRun } from '@/lib/case/decide/abnormal-of';
import type { AlertEvidence } from '@/lib/case/entry-bodies';
import { isComingBack } from '@/lib/case/is-coming-back';
import { locateInCase } from '@/lib/case/locate-in-case';
import { stepsBetween } from '@/lib/case/steps-between';

/**
 * The evidence of a notice or alert: paths, worst value, location and onset bracket.
 * @param state the case with the run's judgement
 * @param nerve the nerve
 * @param abnormal the run that is past a limit
 * @param open the id, and the incident it belongs to if one is open
 * @returns evidence; of an open incident the worst value and the paths only grow, and the bracket only moves to an earlier run
 * @source product rule: onset bracket is last good, first bad, every step between
 */
export function evidenceOf(
  state: CaseState,
  nerve: Nerve,
  abnormal: AbnormalRun,
  open: { readonly alertId: string; readonly incident: Incident | null },
): AlertEvidence {
  const { incident } = open;
  return {
    alertId: open.alertId,
    nerveId: nerve.id,
    runSeq: abnormal.runSeq,
    pathIds: [...new Set([...(incident?.pathIds ?? []), ...abnormal.pathIds])],
    finding: abnormal.finding,
    worstPercentOfBaseline: worstPercent(abnormal, incident),
    location: locationOf(state, nerve, abnormal, incident),
    ...bracketOf(state, abnormal, incident),
    judgeVersion,
  };
}

/** What came back and fell again is counted from there. */
function worstPercent(abnormal: AbnormalRun, incident: Incident | null): number | null {
  const before = incident === null || incident.recoveredAt !== null ? null : incident.worstPercentOfBaseline;
  const percents = [before, abnormal.worstPercentOfBaseline].filter((percent) => percent !== null);
  return percents.length === 0 ? null : Math.min(...percents);
}

function locationOf(state: CaseState, nerve: Nerve, abnormal: AbnormalRun, incident: Incident | null): Location {
  const unknown: Location = { kind: 'not-known', nextSiteId: null };
  if (incident === null || incident.recoveredAt !== null) {
    return locateInCase(state, nerve, { at: abnormal.at, seq: abnormal.runSeq }) ?? unknown;
  }
  if (isComingBack(state, incident)) return incident.location;
  return locateInCase(state, nerve, { at: incident.locateFromAt, seq: incident.locateFromSeq }) ?? incident.location;
}

function bracketOf(state: CaseState, abnormal: AbnormalRun, incident: Incident | null) {
  // A late run from before the last good one belongs to an earlier change: the bracket of this one stays.
  if (incident !== null && (incident.firstBadAt <= abnormal.at || (incident.lastGoodAt ?? '') > abnormal.at)) {
    const { lastGoodAt, firstBadAt, stepsBetween: between } = incident;
    return { lastGoodAt, firstBadAt, stepsBetween: between };
  }
  const bracket = { lastGoodAt: lastGoodBefore(state, abnormal), firstBadAt: abnormal.at };
  return { ...bracket, stepsBetween: stepsBetween(state.steps, bracket) };
}

function lastGoodBefore(state: CaseState, abnormal: AbnormalRun): string | null {
  const times = abnormal.pathIds.map((pathId) => state.paths[pathId]?.lastGoodAt ?? null).filter((at) => at !== null && at <= abnormal.at);
  return times.reduce<string | null>((latest, at) => (latest === null || (at !== null && at > latest) ? at : latest), null);
}
