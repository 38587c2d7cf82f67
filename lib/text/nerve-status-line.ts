import type { CaseState } from '@/lib/case/case-state';
import type { NerveStatus } from '@/lib/case/nerve-status';
import type { Watched } from '@/lib/case/watched-of';
import { fitHeadline } from '@/lib/text/fit-headline';
import { clockTime, durationWords, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { insideSentence } from '@/lib/text/nerve-title';
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
  if (status.watched !== null) return line('watch', ...watchWords(state, nerve.name, status.watched, timeZone));
  if (status.untestedSiteIds.length > 0) {
    const { since, short, detail } = notTestedWords(state, status, nowMs, timeZone);
    const isAlone = state.plan.nerves.filter((candidate) => candidate.role === 'at-risk').length === 1;
    // With several nerves each statement names its nerve.
    const headlines = isAlone ? [since, short] : [`${nerve.name}: ${lower(since)}`, `${nerve.name}: ${lower(short)}`];
    return line('not-tested', fitHeadline(headlines), detail);
  }
  const tested = testedWords(status, timeZone);
  if (status.highest !== null && status.highest.isBeyondNoise) {
    return line('improved', `${nerve.name} improved, ${percent(status.highest.percentOfBaseline)} of baseline`, tested);
  }
  return line('stable', 'Stable', tested);
}

function upper(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function lower(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

function watchWords(state: CaseState, name: string, watched: Watched, timeZone: string): [string, string] {
  const at = clockTime(watched.at, timeZone);
  const share = watched.percentOfBaseline;
  const headline = watched.isLost ? `No ${insideSentence(name)} response` : share === null ? `${name} slower than baseline` : `${name} at ${percent(share)} of baseline`;
  if (watched.isPastLimit) return [headline, `Past its limit at ${at}.`];
  return [headline, `Inside the limit of ${signed(-state.plan.rules.amplitudeNoticeFallPercent, 0)}${nonBreakingSpace}%, at ${at}.`];
}

function siteCount(count: number, status: NerveStatus): string {
  return `${count} of ${status.siteCount} sites`;
}

function lastWords(status: NerveStatus, timeZone: string): string {
  if (status.newestComparedAt === null) return 'Not tested against this baseline.';
  return `Last compared ${clockTime(status.newestComparedAt, timeZone)}.`;
}

/** What was not tested since when, the same without since, and the rest of it. */
interface NotTestedWords {
  readonly since: string;
  readonly short: string;
  readonly detail: string;
}

function notTestedWords(state: CaseState, status: NerveStatus, nowMs: number, timeZone: string): NotTestedWords {
  const step = status.lastRiskStep;
  const before = status.newestComparedAt === null ? 'Baseline only.' : `Last test ${clockTime(status.newestComparedAt, timeZone)}.`;
  const isNone = status.freshSiteCount === 0;
  const tested = isNone ? 'Not tested' : `${siteCount(status.freshSiteCount, status)} tested`;
  const isStepNewer = step !== null && (status.oldestComparedAt === null || status.oldestComparedAt <= step.at);
  if (isStepNewer) {
    return { since: `${tested} since ${step.since}`, short: tested, detail: `${upper(step.since)} ${clockTime(step.at, timeZone)}. ${before}` };
  }
  if (status.oldestComparedAt === null || status.newestComparedAt === null) {
    return { since: `${tested} since baseline`, short: tested, detail: `Baseline at ${siteCount(status.baselineSiteCount, status)}.` };
  }
  if (!status.isEverySiteCompared) return { since: `${tested} since baseline`, short: tested, detail: before };
  if (isNone) return { since: `${tested} for ${durationWords(nowMs - msOfMoment(status.newestComparedAt))}`, short: tested, detail: before };
  const age = durationWords(nowMs - msOfMoment(status.oldestComparedAt));
  return { since: `${tested} in the last ${state.plan.rules.freshnessMinutes}${nonBreakingSpace}min`, short: tested, detail: `Oldest ${age} ago. ${before}` };
}

function testedWords(status: NerveStatus, timeZone: string): string {
  const step = status.lastRiskStep;
  const sites = siteCount(status.freshSiteCount, status);
  const since = step === null ? `${sites} tested` : `${sites} tested since ${step.since}, ${clockTime(step.at, timeZone)}`;
  const lowest = status.lowest;
  if (lowest === null) return `${since}.`;
  return `${since}. Lowest ${percent(lowest.percentOfBaseline)} of baseline, at ${clockTime(lowest.at, timeZone)}.`;
}
