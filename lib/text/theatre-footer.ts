import type { CaseState } from '@/lib/case/case-state';
import { nerveStatus } from '@/lib/case/nerve-status';
import { clockTime, durationWords, nonBreakingSpace, signed } from '@/lib/text/format';
import { siteName } from '@/lib/text/site-name';
import { momentOfMs } from '@/lib/units/moment-of-ms';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * Short facts under the theatre picture: what is next, what else could explain a change, what was told.
 * @param timeZone IANA zone of the theatre
 * @returns at most six short sentences without a full stop, the most needed first
 * @source product rule: explanations carry their evidence and age; an old value is said with its time
 * @accuracy tests/lib/text/theatre-view.test.ts
 */
export function theatreFooter(state: CaseState, nowMs: number, timeZone: string): readonly string[] {
  return [
    ...baselineFacts(state, nowMs),
    ...distanceFacts(state),
    ...toldFacts(state, timeZone),
    ...nextFacts(state, nowMs, timeZone),
    ...cuffFacts(state, nowMs),
    ...trainFacts(state, timeZone),
  ].slice(0, 6);
}

function atRisk(state: CaseState) {
  return state.plan.nerves.filter((nerve) => nerve.role === 'at-risk');
}

function baselineFacts(state: CaseState, nowMs: number): readonly string[] {
  return atRisk(state)
    .map((nerve) => nerveStatus(state, nerve, nowMs).setAfterPercent)
    .filter((value) => value !== null)
    .map((value) => `Baseline set after ${signed(value, 0)}${nonBreakingSpace}%`);
}

function distanceFacts(state: CaseState): readonly string[] {
  return Object.keys(state.distancesVoidSince).length === 0 ? [] : ['Distances to be measured again'];
}

function toldFacts(state: CaseState, timeZone: string): readonly string[] {
  return Object.values(state.incidents)
    .filter((incident) => incident.toldAt !== null)
    .map((incident) => `Told ${clockTime(incident.toldAt ?? '', timeZone)}`);
}

function nextFacts(state: CaseState, nowMs: number, timeZone: string): readonly string[] {
  if (state.status !== 'open' || state.phase !== 'monitoring') return [];
  const facts = atRisk(state).flatMap((nerve) => {
    const status = nerveStatus(state, nerve, nowMs);
    const next = locatingSite(state, nerve.id, status.untestedSiteIds) ?? status.untestedSiteIds[0];
    if (next !== undefined) return [`First to test: ${siteName(state.plan, next)}`];
    if (status.oldestComparedAt === null) return [];
    const until = momentOfMs(msOfMoment(status.oldestComparedAt) + state.plan.rules.freshnessMinutes * 60_000);
    return [`Next test by ${clockTime(until, timeZone)}`];
  });
  // Two nerves tested in the same minute say the same.
  return [...new Set(facts)];
}

/** The untested site that would locate an open change: what the headline asks for, the footer asks for too. */
function locatingSite(state: CaseState, nerveId: string, untested: readonly string[]): string | undefined {
  const location = state.incidents[nerveId]?.location;
  return location?.kind === 'not-known' ? untested.find((siteId) => siteId === location.nextSiteId) : undefined;
}

function cuffFacts(state: CaseState, nowMs: number): readonly string[] {
  const kept = state.conditions['tourniquet'];
  if (kept?.condition.kind !== 'tourniquet') return [];
  return [`Tourniquet ${kept.condition.isUp ? 'up' : 'down'} ${durationWords(nowMs - msOfMoment(kept.at))}`];
}

function trainFacts(state: CaseState, timeZone: string): readonly string[] {
  const kept = state.conditions['train-of-four'];
  if (kept?.condition.kind !== 'train-of-four') return ['Train-of-four not measured'];
  const when = clockTime(kept.at, timeZone);
  const first = Object.values(state.incidents)[0]?.firstBadAt;
  const isBefore = first !== undefined && kept.at < first;
  return [`Train-of-four ${kept.condition.count} of 4 at ${when}${isBefore ? ', before the change' : ''}`];
}
