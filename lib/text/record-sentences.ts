import type { AlertCourse } from '@/lib/case/course/alert-course';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { CourseBaseline } from '@/lib/case/course/course-baselines';
import { clockTime, nonBreakingSpace, percent, signed } from '@/lib/text/format';
import { alertInSentences } from '@/lib/text/record-alert-words';
import { blindRows } from '@/lib/text/record-blind-words';
import { recordNotDone } from '@/lib/text/record-not-done';
import { recordOutcome } from '@/lib/text/record-outcome';
import { familyNames } from '@/lib/text/run-sentence';
import { spanWords } from '@/lib/text/span-words';

/** A part of the summary: its heading and its sentences. */
export interface RecordPart {
  readonly id: 'done' | 'baseline' | 'alerts' | 'outcome' | 'blind' | 'not-done';
  readonly heading: string;
  /** Sentences that belong together, for example those of one alert. */
  readonly paragraphs: readonly (readonly string[])[];
}

/**
 * The summary of a record in sentences, every one computed from the entries.
 *
 * Method: what was done, baseline, alerts, outcome, blind time, what was not done. It holds no advice and no outlook, and
 * it does not interpret: that is the physician's.
 *
 * @param course the course of the case
 * @param timeZone IANA zone of the hospital
 * @returns parts in order; each has at least one paragraph of at least one sentence
 * @source product rule: summary in sentences computed from entries and marked so
 * @accuracy tests/lib/text/record-sentences.test.ts, sentences written by hand
 * @example
 * recordSentences(course, 'Europe/London')[0]?.heading // => 'What was done'
 */
export function recordSentences(course: CaseCourse, timeZone: string): readonly RecordPart[] {
  const { plan } = course.final;
  const time = (at: string) => clockTime(at, timeZone);
  return [
    { id: 'done', heading: 'What was done', paragraphs: [doneSentences(course, time)] },
    { id: 'baseline', heading: 'Baseline', paragraphs: baselineParagraphs(course, time) },
    { id: 'alerts', heading: 'Alerts', paragraphs: [[countSentence(course.alerts)], ...course.alerts.map((alert) => alertInSentences(alert, plan, timeZone))] },
    { id: 'outcome', heading: 'Outcome', paragraphs: orElse(recordOutcome(course), 'No path was run.').map((one) => [one]) },
    { id: 'blind', heading: 'Blind time', paragraphs: [blindSentences(course)] },
    { id: 'not-done', heading: 'What was not done', paragraphs: [orElse(recordNotDone(course), 'Nothing that this record looks for is missing.')] },
  ];
}

function orElse(sentences: readonly string[], otherwise: string): readonly string[] {
  return sentences.length === 0 ? [otherwise] : sentences;
}

function doneSentences({ final, times, runs, steps, blind }: CaseCourse, time: (at: string) => string): readonly string[] {
  const { plan } = final;
  const sites = new Set(runs.map((run) => run.siteId)).size;
  const risks = steps.filter((step) => step.body.isRisk).length;
  const opened = times.openedAt === null ? 'Not opened' : `Opened ${time(times.openedAt)}`;
  const timeout = times.timeoutAt === null ? 'no time-out' : `time-out with patient and side ${time(times.timeoutAt)}`;
  const end = times.closedAt === null ? `Not closed: this is the record up to entry ${final.seq}.` : `Closed ${time(times.closedAt)}.`;
  const monitoring =
    times.monitoringAt === null
      ? 'Not monitored.'
      : `Monitored ${time(times.monitoringAt)} to ${time(times.monitoringEndedAt ?? times.lastEntryAt ?? times.monitoringAt)}, ${spanWords(blind.monitoringMs)}.`;
  return [
    `${plan.procedure}, ${plan.side} side, ${plan.theatre}.`,
    `${opened}, ${timeout}.`,
    monitoring,
    `${counted(runs.length, 'run')} at ${counted(sites, 'site')}, ${counted(steps.length, 'step')} logged, ${risks} of risk.`,
    end,
  ];
}

function baselineParagraphs({ baselines, final }: CaseCourse, time: (at: string) => string): RecordPart['paragraphs'] {
  if (baselines.length === 0) return [['No baseline was accepted.']];
  const limit = final.plan.rules.amplitudeNoticeFallPercent;
  return baselines.map((one) => {
    const loss = one.paths.map((path) => path.smallestLossPercent);
    const tooNoisy = one.paths.filter((path) => path.smallestLossPercent >= limit).length;
    return [
      `${one.isOpening ? 'Opening baseline' : 'Working baseline'} ${time(one.at)}, ${familyNames[one.family]}, ${counted(one.paths.length, 'path')}${acceptance(one, time)}.`,
      `Smallest loss that could be seen: ${range(loss)}.${tooNoisy === 0 ? '' : ` Not monitorable by amplitude: ${counted(tooNoisy, 'path')}.`}`,
      ...(one.setAfterPercent === null ? [] : [`Set after ${signed(one.setAfterPercent, 0)}${nonBreakingSpace}%.`]),
      ...(one.reason === null ? [] : [`Reason given: ${one.reason}.`]),
      ...(one.correctedBySeqs.length === 0 ? [] : ['A run it was made of was corrected later.']),
    ];
  });
}

function range(values: readonly number[]): string {
  const [low, high] = [percent(Math.min(...values)), percent(Math.max(...values))];
  return low === high ? low : `${low} to ${high}`;
}

function acceptance(one: CourseBaseline, time: (at: string) => string): string {
  if (!one.isProvisional) return ', accepted by the physician';
  return one.confirmedAt === null ? ', accepted provisionally' : `, accepted provisionally, by the physician ${time(one.confirmedAt)}`;
}

function countSentence(alerts: readonly AlertCourse[]): string {
  if (alerts.length === 0) return 'No notice and no alert.';
  const count = alerts.filter((alert) => alert.level === 'alert').length;
  return `${counted(count, 'alert')}, ${counted(alerts.length - count, 'notice')}.`;
}

function blindSentences({ blind, final }: CaseCourse): readonly string[] {
  if (blind.monitoringMs === 0) return ['Nothing was monitored.'];
  const { freshnessMinutes } = final.plan.rules;
  const limit = `Freshness limit ${freshnessMinutes}${nonBreakingSpace}min, custom.`;
  if (blind.whole.blindMs === 0) return [`Every required path of every nerve at risk was fresh and comparable during all ${spanWords(blind.monitoringMs)} of monitoring.`, limit];
  const rows = blindRows(blind.whole, blind.monitoringMs).map((row) => `${row.name.charAt(0).toLowerCase()}${row.name.slice(1)} ${spanWords(row.ms)}`);
  const share = percent((100 * blind.whole.blindMs) / blind.monitoringMs);
  return [`Some nerve at risk could not be seen for ${spanWords(blind.whole.blindMs)} of ${spanWords(blind.monitoringMs)} of monitoring (${share}): ${rows.join(', ')}.`, limit];
}

function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}
