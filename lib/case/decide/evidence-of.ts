import { judgeVersion, type Location } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import type { AbnormalRun } from '@/lib/case/decide/abnormal-of';
import type { AlertEvidence } from '@/lib/case/entry-bodies';
import { isComingBack } from '@/lib/case/is-coming-back';
import { locateInCase } from '@/lib/case/locate-in-case';

/**
 * The evidence of a notice or alert: paths, worst value, location and onset bracket.
 * @param state the case with the run's judgement
 * @param abnormal the run that is past a limit
 * @param open the id, and the incident it belongs to if one is open
 * @returns evidence; the bracket of an open incident stays, its worst value and paths only grow
 * @source product rule: onset bracket is last good, first bad, every step between
 */
export function evidenceOf(
  state: CaseState,
  nerve: Nerve,
  abnormal: AbnormalRun,
  open: { readonly alertId: string; readonly incident: Incident | null },
): AlertEvidence {
  const { incident } = open;
  const pathIds = [...new Set([...(incident?.pathIds ?? []), ...abnormal.pathIds])];
  const location = locationOf(state, nerve, abnormal, incident);
  const shared = {
    alertId: open.alertId,
    nerveId: nerve.id,
    runSeq: abnormal.runSeq,
    pathIds,
    finding: abnormal.finding,
    worstPercentOfBaseline: abnormal.worstPercentOfBaseline,
    location,
    judgeVersion,
  };
  if (incident !== null) {
    const { lastGoodAt, firstBadAt, stepsBetween } = incident;
    return { ...shared, lastGoodAt, firstBadAt, stepsBetween };
  }
  const lastGoodAt = lastGood(state, abnormal.pathIds);
  const stepsBetween = state.steps
    .filter((step) => step.at <= abnormal.at && (lastGoodAt === null || step.at > lastGoodAt))
    .map((step) => step.since);
  return { ...shared, lastGoodAt, firstBadAt: abnormal.at, stepsBetween };
}

function locationOf(state: CaseState, nerve: Nerve, abnormal: AbnormalRun, incident: Incident | null): Location {
  const unknown: Location = { kind: 'not-known', nextSiteId: null };
  if (incident === null || incident.recoveredAt !== null) return locateInCase(state, nerve, abnormal.runSeq) ?? unknown;
  if (isComingBack(state, incident)) return incident.location;
  return locateInCase(state, nerve, incident.locateFromSeq) ?? incident.location;
}

function lastGood(state: CaseState, pathIds: readonly string[]): string | null {
  const times = pathIds.map((pathId) => state.paths[pathId]?.lastGoodAt ?? null).filter((at) => at !== null);
  return times.length === 0 ? null : times.reduce((latest, at) => (at > latest ? at : latest));
}
