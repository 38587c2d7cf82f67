import type { CaseState, Incident } from '@/lib/case/case-state';
import { isReturnUnproven } from '@/lib/case/is-return-unproven';
import { decimal } from '@/lib/text/format';
import { needsMoreCurrent, percentNow } from '@/lib/text/incident-headline';
import { siteName, siteNames } from '@/lib/text/site-name';

/**
 * The sentence to say aloud to the surgeon about a notice or alert.
 *
 * Method: nerve, muscle, how much, where once located, since which step. States a finding; never says what to do.
 *
 * @returns one or two plain sentences, numbers as they are spoken
 * @source common practice: what changed, how much, when, with which step
 * @accuracy whole percent; tests/lib/text/say-this.test.ts
 * @example
 * sayThis(state, incident) // => 'Ulnar, ADM, at 38 per cent of baseline, between above and below elbow, since nerve lifted.'
 */
export function sayThis(state: CaseState, incident: Incident): string {
  const nerve = state.plan.nerves.find((candidate) => candidate.id === incident.nerveId)?.name ?? incident.nerveId;
  const muscles = [...new Set(incident.pathIds.map((pathId) => channelName(state, pathId)))].join(' and ');
  const parts = [nerve, muscles, amountWords(state, incident), whereWords(state, incident), sinceWords(incident)];
  const said = `${parts.filter((part) => part !== null && part !== '').join(', ')}.`;
  if (incident.level === 'notice') return incident.repeatDueAt === null ? said : `${said} Once, being repeated.`;
  return incident.isRepeated ? said : `${said} Not repeated.`;
}

function channelName(state: CaseState, pathId: string): string {
  const channelId = pathId.slice(pathId.indexOf('/') + 1);
  return state.plan.channels.find((channel) => channel.id === channelId)?.name ?? channelId;
}

function amountWords(state: CaseState, incident: Incident): string {
  const isPast = incident.recoveredAt === null && isReturnUnproven(state, incident);
  const now = isPast ? incident.worstPercentOfBaseline : percentNow(state, incident);
  if (now !== null && now < state.plan.rules.lostBelowPercent) return isPast ? 'was without response' : 'no response';
  const words = stateWords(state, incident, now);
  return isPast ? `was ${words}` : words;
}

function stateWords(state: CaseState, incident: Incident, now: number | null): string {
  if (needsMoreCurrent(state, incident)) return 'needs more current than at baseline';
  if (incident.finding === 'onset-late' || incident.finding === 'segment-slowed') return 'slower than baseline';
  return now === null ? 'changed from baseline' : `at ${decimal(Math.round(now), 0)} per cent of baseline`;
}

function whereWords(state: CaseState, incident: Incident): string | null {
  const { location } = incident;
  if (location.kind === 'segment') return `between ${siteNames(state.plan, location.proximalSiteId, location.distalSiteId)}`;
  const first = incident.pathIds[0];
  return first === undefined ? null : `stimulating at ${siteName(state.plan, first.slice(0, first.indexOf('/')))}`;
}

function sinceWords(incident: Incident): string | null {
  const step = incident.stepsBetween.at(-1);
  return step === undefined ? null : `since ${step}`;
}
