import type { Location } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CaseState, Incident } from '@/lib/case/case-state';
import type { AbnormalRun } from '@/lib/case/decide/abnormal-of';
import type { AlertEvidence, Worsening } from '@/lib/case/entry-bodies';

/**
 * In which ways an open alert got worse since it was last raised.
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
  const ways: Worsening[] = [];
  if (abnormal.finding === 'response-lost' && !incident.isLost) ways.push('lost');
  if (isPointsWorse(state, incident, abnormal)) ways.push('twenty-points');
  if (abnormal.pathIds.some((pathId) => !channelsOf(incident.pathIds).includes(channelOf(pathId)))) ways.push('another-muscle');
  if (isFurtherDistal(nerve, incident.location, evidence.location)) ways.push('another-segment');
  if (incident.recoveredAt !== null) ways.push('returned');
  return ways;
}

function isPointsWorse(state: CaseState, incident: Incident, abnormal: AbnormalRun): boolean {
  const before = incident.worstPercentOfBaseline;
  const now = abnormal.worstPercentOfBaseline;
  if (before === null || now === null) return false;
  return before - now >= state.plan.rules.worseningPercent;
}

function channelOf(pathId: string): string {
  return pathId.slice(pathId.indexOf('/') + 1);
}

function channelsOf(pathIds: readonly string[]): readonly string[] {
  return pathIds.map(channelOf);
}

/** A located change that now reaches distal to where it ended: a site that was good is not good any more. */
function isFurtherDistal(nerve: Nerve, before: Location, now: Location): boolean {
  if (before.kind !== 'segment') return false;
  if (now.kind === 'outside') return true;
  if (now.kind !== 'segment') return false;
  const indexOf = (siteId: string) => nerve.sites.findIndex((site) => site.id === siteId);
  return indexOf(now.proximalSiteId) >= indexOf(before.distalSiteId);
}
