import type { CaseState } from '@/lib/case/case-state';
import type { NerveStatus } from '@/lib/case/nerve-status';
import { clockTime, durationWords, percent, signed } from '@/lib/text/format';
import { notComparedWords } from '@/lib/text/reason-words';
import type { TheatreKind, TheatreLine } from '@/lib/text/theatre-line';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * What the theatre screen says of a nerve without a notice or alert.
 *
 * Method: the first that applies, from what must not look calm to what may: no baseline, not compared, not
 * monitorable, watch, not tested, improved, stable.
 *
 * @param timeZone IANA zone of the theatre
 * @returns a line; calm only for improved and stable
 * @source product rule: stable must be earned
 * @accuracy tests/lib/text/theatre-view.test.ts
 */
export function nerveStatusLine(state: CaseState, status: NerveStatus, nowMs: number, timeZone: string): TheatreLine {
  const { nerve } = status;
  const line = (kind: TheatreKind, headline: string, detail: string): TheatreLine => ({
    kind,
    priority: kind === 'watch' || kind === 'not-compared' || kind === 'not-monitorable' ? 'low' : null,
    isCalm: kind === 'stable' || kind === 'improved',
    isFlashing: false,
    nerveId: nerve.id,
    headline,
    detail,
  });
  if (status.baselineSiteCount < status.siteCount) {
    return line('no-baseline', `${nerve.name}: no baseline yet`, `Baseline at ${siteCount(status.baselineSiteCount, status)}.`);
  }
  if (status.notCompared !== null && status.notCompared.lastNotCompared !== null) {
    const since = clockTime(status.notCompared.lastAt, timeZone);
    const why = notComparedWords[status.notCompared.lastNotCompared];
    return line('not-compared', `${nerve.name} not compared since ${since}`, `${upper(why)}. ${lastWords(status, timeZone)}`);
  }
  if (status.isNotMonitorable) {
    return line('not-monitorable', `${nerve.name} not monitorable by amplitude`, 'Its baseline scatters as much as the limit.');
  }
  if (status.watched !== null && status.lowest !== null) {
    const detail = `Inside the limit of ${signed(-state.plan.rules.amplitudeNoticeFallPercent, 0)} %, at ${clockTime(status.lowest.at, timeZone)}.`;
    return line('watch', `${nerve.name} at ${percent(status.lowest.percentOfBaseline)} of baseline`, detail);
  }
  if (status.untestedSiteIds.length > 0) return line('not-tested', ...notTestedWords(state, status, nowMs, timeZone));
  const tested = testedWords(status, timeZone);
  if (status.highest !== null && status.highest.isBeyondNoise) {
    return line('improved', `${nerve.name} improved, ${percent(status.highest.percentOfBaseline)} of baseline`, tested);
  }
  return line('stable', 'Stable', tested);
}

function upper(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function siteCount(count: number, status: NerveStatus): string {
  return `${count} of ${status.siteCount} sites`;
}

function lastWords(status: NerveStatus, timeZone: string): string {
  if (status.newestComparedAt === null) return 'Not tested against this baseline.';
  return `Last compared ${clockTime(status.newestComparedAt, timeZone)}.`;
}

function notTestedWords(state: CaseState, status: NerveStatus, nowMs: number, timeZone: string): [string, string] {
  const step = status.lastRiskStep;
  const before = status.newestComparedAt === null ? 'Baseline only.' : `Last test ${clockTime(status.newestComparedAt, timeZone)}.`;
  const isStepNewer = step !== null && (status.oldestComparedAt === null || status.oldestComparedAt <= step.at);
  if (step !== null && isStepNewer) {
    const since = clockTime(step.at, timeZone);
    if (status.freshSiteCount === 0) return [`Not tested since ${step.since}`, `${upper(step.since)} ${since}. ${before}`];
    return [`${siteCount(status.freshSiteCount, status)} tested since ${step.since}`, `${upper(step.since)} ${since}. ${before}`];
  }
  if (status.oldestComparedAt === null || status.newestComparedAt === null) {
    return ['Not tested since baseline', `Baseline at ${siteCount(status.baselineSiteCount, status)}.`];
  }
  if (!status.isEverySiteCompared) return [`${siteCount(status.freshSiteCount, status)} tested since baseline`, before];
  const age = durationWords(nowMs - msOfMoment(status.oldestComparedAt));
  if (status.freshSiteCount === 0) return [`Not tested for ${durationWords(nowMs - msOfMoment(status.newestComparedAt))}`, before];
  const limit = `${state.plan.rules.freshnessMinutes} min`;
  return [`${siteCount(status.freshSiteCount, status)} tested in the last ${limit}`, `Oldest ${age} ago. ${before}`];
}

function testedWords(status: NerveStatus, timeZone: string): string {
  const step = status.lastRiskStep;
  const sites = siteCount(status.freshSiteCount, status);
  const since = step === null ? `${sites} tested` : `${sites} tested since ${step.since}, ${clockTime(step.at, timeZone)}`;
  const lowest = status.lowest;
  if (lowest === null) return `${since}.`;
  return `${since}. Lowest ${percent(lowest.percentOfBaseline)} of baseline, at ${clockTime(lowest.at, timeZone)}.`;
}
