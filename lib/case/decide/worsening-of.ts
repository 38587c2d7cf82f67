import type { Location } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import type { AbnormalRun } from '@/lib/case/decide/abnormal-of';
import type { AlertEvidence, Worsening } from '@/lib/case/entry-bodies';
import { hasRecovered } from '@/lib/case/has-recovered';
import { channelOfPath } from '@/lib/case/keys';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/**
 * In which ways an open alert got worse since it was last raised.
 *
 * Method: against what it was raised with. A finding that is a notice at most makes no alert worse. A late entry from
 * before the recovery is no return, unless the recovery does not stand with it.
 *
 * @param state the case with the run's judgement
 * @param nerve the nerve
 * @param incident its open alert as it was before the run
 * @param abnormal the run that is past a limit
 * @param evidence the evidence with the run
 * @returns the ways, empty when it is no worse
 * @source product rule: partial to lost, 20 points more (custom), another muscle or segment, return after recovery
 */
export function worseningOf(
  state: CaseState,
  nerve: Nerve,
  incident: Incident,
  abnormal: AbnormalRun,
  evidence: AlertEvidence,
): readonly Worsening[] {
  if (incident.recoveredAt !== null) {
    const isReturn = abnormal.at > incident.recoveredAt || !hasRecovered(state, nerve, incident, 2);
    return abnormal.mayBecomeAlert && isReturn ? ['returned'] : [];
  }
  const ways: Worsening[] = [];
  if (abnormal.finding === 'response-lost' && !incident.isLost) ways.push('lost');
  if (isPointsWorse(state, incident, abnormal)) ways.push('twenty-points');
  const channelIds = incident.pathIds.map(channelOfPath);
  if (abnormal.alertPathIds.some((pathId) => !channelIds.includes(channelOfPath(pathId)))) ways.push('another-muscle');
  if (isFurtherDistal(nerve, incident.location, evidence.location)) ways.push('another-segment');
  return ways;
}

function isPointsWorse(state: CaseState, incident: Incident, abnormal: AbnormalRun): boolean {
  const before = incident.worstPercentOfBaseline;
  const now = abnormal.worstPercentOfBaseline;
  if (before === null || now === null) return false;
  // Rounded, since the binary difference of two tenths can lie a hair below the limit.
  return roundTo(before - now, resolutions.percent) >= state.plan.rules.worseningPercent;
}

/** A located change that now reaches distal to where it ended: a site that was good is not good any more. */
function isFurtherDistal(nerve: Nerve, before: Location, now: Location): boolean {
  if (before.kind !== 'segment') return false;
  if (now.kind === 'outside') return true;
  if (now.kind !== 'segment') return false;
  const indexOf = (siteId: string) => nerve.sites.findIndex((site) => site.id === siteId);
  return indexOf(now.proximalSiteId) >= indexOf(before.distalSiteId);
}
