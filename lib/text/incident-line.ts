import type { CaseState, Incident } from '@/lib/case/case-state';
import { clockTime } from '@/lib/text/format';
import { incidentHeadline } from '@/lib/text/incident-headline';
import { notComparedWords } from '@/lib/text/reason-words';
import { siteName, siteNames } from '@/lib/text/site-name';
import type { TheatreLine } from '@/lib/text/theatre-line';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** An entry that arrives later than this after its time says so on the wall. House rule. */
const lateAfterMs = 180_000;

/**
 * What the theatre screen says of an open notice or alert.
 * @param timeZone IANA zone of the theatre
 * @returns a line: high for an alert, medium for a notice, low once recovered; flashing until told
 * @source product rule: what changed, where once located, last good and first seen, after which step
 * @accuracy tests/lib/text/theatre-view.test.ts
 */
export function incidentLine(state: CaseState, incident: Incident, timeZone: string): TheatreLine {
  const isAlert = incident.level === 'alert';
  const isBack = incident.recoveredAt !== null;
  return {
    kind: isBack ? 'recovered' : incident.level,
    priority: isBack ? 'low' : isAlert ? 'high' : 'medium',
    isCalm: false,
    isFlashing: isAlert && !isBack && incident.toldAt === null,
    nerveId: incident.nerveId,
    headline: incidentHeadline(state, incident),
    detail: sentences([
      ...(isBack ? ['Alert open until the desk ends it'] : [locationWords(state, incident), requestWords(incident)]),
      bracketWords(incident, timeZone),
      notComparedSince(state, incident, timeZone),
      lateWords(incident, timeZone),
    ]),
  };
}

function sentences(parts: readonly (string | null)[]): string {
  const said = parts.filter((part) => part !== null);
  return said.length === 0 ? '' : `${said.join('. ')}.`;
}

/** Where the change lies. @returns words without a full stop @source product rule: segment, outside, or not known yet */
export function locationWords(state: CaseState, incident: Incident): string {
  const { location } = incident;
  switch (location.kind) {
    case 'segment':
      return `Between ${siteNames(state.plan, location.proximalSiteId, location.distalSiteId)}`;
    case 'outside':
      return 'Not between the tested sites';
    case 'not-known':
      return location.nextSiteId === null ? 'Where not known yet' : `Where not known yet, test ${siteName(state.plan, location.nextSiteId)} next`;
  }
}

function requestWords(incident: Incident): string | null {
  if (incident.level === 'notice') return incident.repeatDueAt === null ? null : 'Repeat at the same current';
  return incident.isRepeated ? null : 'Not repeated';
}

function bracketWords(incident: Incident, timeZone: string): string {
  const good = incident.lastGoodAt === null ? null : `Last good ${clockTime(incident.lastGoodAt, timeZone)}`;
  const first = `first seen ${clockTime(incident.firstBadAt, timeZone)}`;
  const step = incident.stepsBetween.at(-1);
  const after = step === undefined ? '' : `, after ${step}`;
  return good === null ? `First${first.slice('first'.length)}${after}` : `${good}, ${first}${after}`;
}

function notComparedSince(state: CaseState, incident: Incident, timeZone: string): string | null {
  const record = incident.pathIds
    .map((pathId) => state.paths[pathId])
    .find((path) => path !== undefined && path.lastNotCompared !== null);
  if (record === undefined || record.lastNotCompared === null) return null;
  return `Not compared since ${clockTime(record.lastAt, timeZone)}, ${notComparedWords[record.lastNotCompared]}`;
}

function lateWords(incident: Incident, timeZone: string): string | null {
  if (msOfMoment(incident.receivedAt) - msOfMoment(incident.firstBadAt) < lateAfterMs) return null;
  return `From ${clockTime(incident.firstBadAt, timeZone)}, received ${clockTime(incident.receivedAt, timeZone)}`;
}
