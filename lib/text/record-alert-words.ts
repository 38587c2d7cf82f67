import type { Location } from '@/lib/alert/judgement';
import type { AlertCourse, PathValue } from '@/lib/case/course/alert-course';
import type { AlertRound } from '@/lib/case/course/alert-round';
import { courseInterval, isInTime, type CourseInterval } from '@/lib/case/course/course-interval';
import { roundIntervals } from '@/lib/case/course/round-intervals';
import type { CasePlan } from '@/lib/case/plan';
import { causeNames, findingNames, outcomeNames } from '@/lib/text/alert-sentence';
import { clockTime, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { nerveTitle } from '@/lib/text/nerve-title';
import { siteNames } from '@/lib/text/site-name';
import { secondsWords } from '@/lib/text/span-words';

/** Where a change lay, as it stands in a record. @returns a part of a sentence @source house rule */
export function placeWords(location: Location, plan: CasePlan): string {
  if (location.kind === 'segment') return `between ${siteNames(plan, location.proximalSiteId, location.distalSiteId)}`;
  return location.kind === 'outside' ? 'not between the tested sites' : 'place not known';
}

/** The lowest amplitude of an alert over its paths. @returns null when none was compared @source house rule */
export function worstOf(alert: AlertCourse): PathValue | null {
  const values = alert.paths.map((path) => path.worst).filter((value) => value !== null);
  return values.reduce<PathValue | null>((worst, value) => (worst === null || (value.percentOfBaseline ?? 100) < (worst.percentOfBaseline ?? 100) ? value : worst), null);
}

/** The latest onset of an alert over its paths. @returns null when none was compared @source house rule */
export function slowestOf(alert: AlertCourse): PathValue | null {
  const values = alert.paths.map((path) => path.slowest).filter((value) => value !== null);
  return values.reduce<PathValue | null>((slowest, value) => (slowest === null || (value.onsetChangeMs ?? 0) > (slowest.onsetChangeMs ?? 0) ? value : slowest), null);
}

/** The raise that the times of an alert are told of: its first alert, else its notice. @returns null never in a real log @source house rule */
export function mainRound(alert: AlertCourse): AlertRound | null {
  return alert.rounds.find((round) => round.kind === 'alert') ?? alert.rounds[0] ?? null;
}

/** An interval in words; out of order where an entry came late. @returns "9 s", "9 s, over the limit of 60 s, custom" @source custom limits */
export function intervalWords(interval: CourseInterval): string {
  if (interval.ms === null) return 'before it was raised here: entered late';
  const over = isInTime(interval) === false && interval.limitMs !== null ? `, over the limit of ${secondsWords(interval.limitMs)}, custom` : '';
  return `${secondsWords(interval.ms)}${over}`;
}

/**
 * One notice or alert in sentences.
 *
 * Method: copies what the log holds, in the order in which it happened. It gives no advice and no outlook; what was not
 * done is said elsewhere.
 *
 * @param plan the plan of the case
 * @param timeZone IANA zone of the hospital
 * @returns sentences with full stops
 * @source common practice for the times of an alert
 * @accuracy tests/lib/text/record-sentences.test.ts
 * @example
 * alertInSentences(alert, plan, 'Europe/London')[0] // => 'Alert, ulnar, first seen 10:41:55: …'
 */
export function alertInSentences(alert: AlertCourse, plan: CasePlan, timeZone: string): readonly string[] {
  const time = (at: string) => clockTime(at, timeZone, { seconds: true });
  return [foundSentence(alert, plan, time), bracketSentence(alert, time), handlingSentence(alert, plan), endSentence(alert, time)].filter((sentence) => sentence !== '');
}

type Time = (at: string) => string;

function foundSentence(alert: AlertCourse, plan: CasePlan, time: Time): string {
  const name = nerveTitle(plan, alert.nerveId).toLowerCase();
  const round = alert.rounds.findLast(({ kind }) => kind !== 'notice') ?? alert.rounds.at(-1);
  const found = round === undefined ? 'change' : findingNames[round.finding];
  const late = alert.lateMs === null ? '' : `, received ${time(alert.receivedAt)}`;
  return `${alert.level === 'alert' ? 'Alert' : 'Notice'}, ${name}, first seen ${time(alert.firstBadAt)}${late}: ${found}${amountWords(alert, round, time)}, ${placeWords(alert.location, plan)}.`;
}

/** How large it was: an amplitude where an amplitude was found, else a time; of a withdrawn alert what it was raised with. */
function amountWords(alert: AlertCourse, round: AlertRound | undefined, time: Time): string {
  const [worst, slowest] = [worstOf(alert), slowestOf(alert)];
  if (alert.end?.kind === 'withdrawn') {
    const now = worst?.percentOfBaseline ?? null;
    const raised = round?.percentOfBaseline ?? null;
    return `${raised === null ? '' : `, raised at ${percent(raised)} of baseline`}${now === null ? '' : `, ${percent(now)} after the correction`}`;
  }
  const isOfTime = round?.finding === 'onset-late' || round?.finding === 'segment-slowed';
  if (isOfTime) return slowest === null || slowest.onsetChangeMs === null ? '' : `, onset ${signed(slowest.onsetChangeMs, 2)}${nonBreakingSpace}ms at ${time(slowest.at)}`;
  return worst === null || worst.percentOfBaseline === null ? '' : `, lowest ${percent(worst.percentOfBaseline)} of baseline at ${time(worst.at)}`;
}

function bracketSentence(alert: AlertCourse, time: Time): string {
  const good = alert.lastGoodAt === null ? 'No good run before it' : `Last good run ${time(alert.lastGoodAt)}`;
  if (alert.steps.length === 0) return `${good}, no step logged between.`;
  return `${good}, then ${alert.steps.map((step) => `${step.since} ${time(step.at)}${step.isEnteredLater ? ' (entered later)' : ''}`).join(', ')}.`;
}

function handlingSentence(alert: AlertCourse, plan: CasePlan): string {
  const round = mainRound(alert);
  if (round === null) return '';
  const seen = courseInterval(alert.firstBadAt, round.raisedAt);
  const { painted, told, readBack, acted, retest } = roundIntervals(round, plan.rules);
  const rows: readonly (readonly [string, CourseInterval | null])[] = [
    ['painted', painted], ['told', told], ['read back', readBack], [`surgeon’s action (${round.acted?.words ?? ''})`, acted], ['tested again', retest],
  ];
  const done = rows.flatMap(([name, interval]) => (interval === null ? [] : [`${name} ${intervalWords(interval)}`]));
  const raised = `Raised ${seen === null || seen.ms === null ? 'late' : secondsWords(seen.ms)} after first seen${confirmation(round)}`;
  return `${raised}.${done.length === 0 ? '' : ` From the raise: ${done.join(', ')}.`}`;
}

function confirmation(round: AlertRound): string {
  if (round.isRepeated === null) return '';
  return round.isRepeated ? ', confirmed by a repeat' : ', not repeated in time';
}

function endSentence(alert: AlertCourse, time: Time): string {
  const back = alert.recoveredAt === null ? '' : `Back inside its limits ${time(alert.recoveredAt)}. `;
  const { end } = alert;
  if (end === null) return `${back}Not ended.`;
  if (end.kind === 'settled') return `Settled ${time(end.at)}: the repeat was inside the limits.`;
  if (end.kind === 'withdrawn') return `${back}Withdrawn ${time(end.at)}: run ${end.runSeq} was corrected.`;
  return `${back}Ended ${time(end.at)}: ${outcomeNames[end.outcome]}, cause ${causeNames[end.cause]}.${end.text === null ? '' : ` ${end.text.replace(/\.$/, '')}.`}`;
}
