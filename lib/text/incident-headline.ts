import type { CaseState, Incident } from '@/lib/case/case-state';
import { isReturnUnproven } from '@/lib/case/is-return-unproven';
import { metresPerSecond, milliseconds, percent } from '@/lib/text/format';
import { insideSentence, nerveTitle } from '@/lib/text/nerve-title';

/** % of baseline that the paths of an incident show now: the lowest newest comparable run. @returns % or null @source house rule */
export function percentNow(state: CaseState, incident: Incident): number | null {
  const percents = incident.badPathIds
    .map((pathId) => state.paths[pathId]?.compared?.change.percentOfBaseline ?? null)
    .filter((value) => value !== null);
  return percents.length === 0 ? incident.worstPercentOfBaseline : Math.min(...percents);
}

/**
 * The one sentence of a notice or alert: which nerve, what changed, how much.
 * @returns "Ulnar at 38 % of baseline", "No ulnar response", "Ulnar slower, 31 m/s"; "Ulnar was at 38 % of baseline" where newer
 *   runs are good and prove no return
 * @source house rule: one number for one fact; amplitude as % of baseline
 * @accuracy whole percent; tests/lib/text/theatre-view.test.ts
 */
export function incidentHeadline(state: CaseState, incident: Incident): string {
  const name = nerveTitle(state.plan, incident.nerveId);
  const now = percentNow(state, incident);
  if (incident.recoveredAt !== null) return now === null ? `${name} back inside its limits` : `${name} back at ${percent(now)} of baseline`;
  if (isReturnUnproven(state, incident)) return pastHeadline(state, incident, name);
  if (now !== null && now < state.plan.rules.lostBelowPercent) return `No ${insideSentence(name)} response`;
  if (needsMoreCurrent(state, incident)) return `${name} needs more current`;
  switch (incident.finding) {
    case 'segment-slowed':
      return slowedHeadline(state, incident, name);
    case 'onset-late':
      return lateHeadline(state, incident, name);
    case 'ratio-fall':
      return `${name} lower proximally`;
    default:
      return now === null ? `${name} changed` : `${name} at ${percent(now)} of baseline`;
  }
}

/** What a late entry showed although newer runs are good: the % of now would deny it. */
function pastHeadline(state: CaseState, incident: Incident, name: string): string {
  const worst = incident.worstPercentOfBaseline;
  if (incident.isLost || (worst !== null && worst < state.plan.rules.lostBelowPercent)) return `${name} response was lost`;
  switch (incident.finding) {
    case 'segment-slowed':
      return `${name} was slower`;
    case 'onset-late':
      return `${name} was later`;
    case 'ratio-fall':
      return `${name} was lower proximally`;
    default:
      return worst === null ? `${name} was changed` : `${name} was at ${percent(worst)} of baseline`;
  }
}

/**
 * Whether a response is back, but only at a higher current: its % of baseline would claim too much.
 * @param state the case
 * @param incident an open notice or alert
 * @returns true while the newest comparable run of one of its paths says so
 * @source product rule: comes back at a higher current is a threshold rise
 */
export function needsMoreCurrent(state: CaseState, incident: Incident): boolean {
  const now = incident.badPathIds.map((pathId) => state.paths[pathId]?.compared ?? null).filter((record) => record !== null);
  return now.some((record) => record.findings.some((finding) => finding.kind === 'threshold-rise'));
}

function slowedHeadline(state: CaseState, incident: Incident, name: string): string {
  const slowed = Object.values(state.segments).find(
    (segment) => segment.nerveId === incident.nerveId && segment.findings.some((finding) => finding.kind === 'segment-slowed'),
  );
  return slowed?.velocity.kind === 'velocity' ? `${name} slower, ${metresPerSecond(slowed.velocity.velocityMps)}` : `${name} slower`;
}

function lateHeadline(state: CaseState, incident: Incident, name: string): string {
  const delays = incident.pathIds
    .map((pathId) => state.paths[pathId]?.compared?.change.onsetChangeMs ?? null)
    .filter((value) => value !== null);
  return delays.length === 0 ? `${name} later` : `${name} later by ${milliseconds(Math.max(...delays))}`;
}
