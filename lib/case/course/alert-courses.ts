import type { AlertCourse, BracketStep, PathValue } from '@/lib/case/course/alert-course';
import type { AlertRound } from '@/lib/case/course/alert-round';
import { pathCourse, pathValues } from '@/lib/case/course/alert-values';
import { lateAfterMs } from '@/lib/case/course/late-after-ms';
import { alertAfter, openedAlert, type AlertEntry, type OpenAlert } from '@/lib/case/course/open-alert';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { pathIdOf } from '@/lib/case/keys';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/**
 * Every notice and alert of a case with its whole course.
 *
 * Method: the log in its order. What people did belongs to the newest raise before it. Worst and last value come from
 * every compared run on its paths while it was open; a corrected run counts with its correction. The onset bracket is
 * that of the evidence, and its steps are all those of that time, also one entered later.
 *
 * @param entries readable entries in the order of the log; not modified
 * @returns courses in the order in which they were first raised
 * @source product rules: handling, onset bracket; common practice for the times of an alert
 * @accuracy exact; tests/lib/case/course/alert-courses.test.ts, a case worked by hand
 * @example
 * alertCourses(entries)[0]?.rounds.length
 */
export function alertCourses(entries: readonly CaseEntry[]): readonly AlertCourse[] {
  const alerts = new Map<string, OpenAlert>();
  const runAts = new Map<number, string>();
  const newest = new Map<string, PathValue>();
  for (const entry of entries) {
    if (entry.kind === 'run.logged') runAts.set(entry.seq, entry.eventAt);
    if (entry.kind === 'run.judged') {
      const values = pathValues(entry.body.runSeq, runAts.get(entry.body.runSeq) ?? entry.eventAt, entry.body.paths);
      for (const [pathId, value] of values) newest.set(pathId, value);
    }
    for (const alert of alerts.values()) if (alert.end === null) alerts.set(alert.alertId, seen(alert, entry, newest));
    if (!isOfAlert(entry)) continue;
    const { alertId } = entry.body;
    const known = alerts.get(alertId);
    const repeatAt = 'runSeq' in entry.body ? (runAts.get(entry.body.runSeq) ?? null) : null;
    if (known !== undefined) alerts.set(alertId, withNewPaths(alertAfter(known, entry, repeatAt), newest));
    else if (entry.kind === 'notice.raised' || entry.kind === 'alert.raised') alerts.set(alertId, withNewPaths(openedAlert(entry), newest));
  }
  const steps = entries.filter((entry) => entry.kind === 'step.logged');
  return [...alerts.values()].map((alert) => closed(alert, steps));
}

function isOfAlert(entry: CaseEntry): entry is AlertEntry {
  return entry.kind.startsWith('alert.') || entry.kind.startsWith('notice.');
}

/** What an open alert takes from a run, its judgement or its correction. */
function seen(alert: OpenAlert, entry: CaseEntry, newest: ReadonlyMap<string, PathValue>): OpenAlert {
  if (entry.kind === 'run.logged') {
    const isTest = entry.body.readings.some(({ channelId, reading }) => reading.kind !== 'not-read' && alert.values.has(pathIdOf(entry.body.siteId, channelId)));
    return isTest ? { ...alert, testedAts: [...alert.testedAts, entry.eventAt] } : alert;
  }
  if (entry.kind === 'run.corrected') {
    const { runSeq } = entry.body;
    return { ...alert, values: new Map([...alert.values].map(([pathId, values]) => [pathId, values.filter((value) => value.runSeq !== runSeq)])) };
  }
  if (entry.kind !== 'run.judged') return alert;
  const grown = [...alert.values].map(([pathId, values]) => {
    const value = newest.get(pathId);
    return [pathId, value !== undefined && value.runSeq === entry.body.runSeq ? [...values, value] : values] as const;
  });
  return { ...alert, values: new Map(grown) };
}

/** A path that the evidence names first now begins with the run that brought it. */
function withNewPaths(alert: OpenAlert, newest: ReadonlyMap<string, PathValue>): OpenAlert {
  const unknown = alert.last.body.pathIds.filter((pathId) => !alert.values.has(pathId));
  if (unknown.length === 0) return alert;
  const begun = unknown.map((pathId) => [pathId, [newest.get(pathId)].filter((value) => value !== undefined)] as const);
  return { ...alert, values: new Map([...alert.values, ...begun]) };
}

function closed(alert: OpenAlert, steps: readonly Extract<CaseEntry, { kind: 'step.logged' }>[]): AlertCourse {
  const { lastGoodAt, firstBadAt } = alert.last.body;
  const { alertId, nerveId, level, location, repeatedAt, recoveredAt, end, entrySeqs } = alert;
  const receivedAt = alert.first.recordedAt;
  const lateMs = msOfMoment(receivedAt) - msOfMoment(firstBadAt);
  return {
    alertId,
    nerveId,
    level,
    rounds: alert.rounds.map((round) => ({ ...round, retestAt: retestAt(round, alert.testedAts) })),
    lastGoodAt,
    firstBadAt,
    receivedAt,
    lateMs: lateMs >= lateAfterMs ? lateMs : null,
    steps: steps.filter((step) => step.eventAt <= firstBadAt && (lastGoodAt === null || step.eventAt > lastGoodAt)).map((step) => bracketStep(step, alert.first.seq)).sort(inTime),
    repeatedAt,
    location,
    paths: [...alert.values].map(([pathId, values]) => pathCourse(pathId, values)),
    recoveredAt,
    end,
    entrySeqs,
  };
}

/** The first test of one of its paths after the surgeon's action, or after telling where no action was logged. */
function retestAt(round: AlertRound, testedAts: readonly string[]): string | null {
  const after = round.acted?.at ?? round.told?.at ?? null;
  if (after === null) return null;
  return testedAts.filter((at) => at > after).sort()[0] ?? null;
}

function bracketStep({ seq, eventAt, body }: Extract<CaseEntry, { kind: 'step.logged' }>, raisedSeq: number): BracketStep {
  return { seq, at: eventAt, since: body.since, isRisk: body.isRisk, isEnteredLater: seq > raisedSeq };
}

function inTime(first: BracketStep, second: BracketStep): number {
  return first.at === second.at ? first.seq - second.seq : first.at < second.at ? -1 : 1;
}
