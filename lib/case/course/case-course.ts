import type { Baseline, CaseState } from '@/lib/case/case-state';
import type { AlertCourse } from '@/lib/case/course/alert-course';
import { alertCourses } from '@/lib/case/course/alert-courses';
import { blindTimes, type BlindTimes } from '@/lib/case/course/blind-times';
import { courseBaselines, type CourseBaseline } from '@/lib/case/course/course-baselines';
import { courseEntries } from '@/lib/case/course/course-entries';
import { courseRuns, type CourseRun } from '@/lib/case/course/course-runs';
import { courseTalk, type CourseTalk } from '@/lib/case/course/course-talk';
import { courseTimes, type CourseTimes } from '@/lib/case/course/course-times';
import { lateMsOf } from '@/lib/case/course/late-after-ms';
import { nerveEnds, type NerveEnds } from '@/lib/case/course/nerve-ends';
import { openingVelocities, segmentEnds, type SegmentEnds } from '@/lib/case/course/segment-ends';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { evolve } from '@/lib/case/evolve';
import type { FeedEntry } from '@/lib/case/feed-entry';
import { initialState } from '@/lib/case/initial-state';
import type { TwoSiteVelocity } from '@/lib/conduction/two-site-velocity';

/** A case as its record tells it, computed from its entries and nothing else. */
export interface CaseCourse {
  /** The case after its last entry, and right after its first baseline; null before one was accepted. */
  readonly final: CaseState;
  readonly opened: CaseState | null;
  readonly entries: readonly CaseEntry[];
  readonly times: CourseTimes;
  readonly alerts: readonly AlertCourse[];
  readonly blind: BlindTimes;
  readonly nerves: readonly NerveEnds[];
  readonly segments: readonly SegmentEnds[];
  readonly runs: readonly CourseRun[];
  readonly baselines: readonly CourseBaseline[];
  readonly talk: readonly CourseTalk[];
  readonly conditions: readonly Extract<CaseEntry, { kind: 'condition.logged' }>[];
  readonly steps: readonly Extract<CaseEntry, { kind: 'step.logged' }>[];
  readonly examinations: readonly Extract<CaseEntry, { kind: 'examination.recorded' }>[];
  readonly late: readonly { readonly seq: number; readonly lateMs: number }[];
}

/**
 * The course of a case, folded from its whole log.
 *
 * Method: each part reads the entries once; the state between them is the bounded one of `evolve`. Nothing is judged
 * anew: what was judged when it happened is copied, so an old case reads as it was seen.
 *
 * @param entries the log from its first entry, oldest first; not modified
 * @returns the course; of a case that is not closed, up to its last entry
 * @throws {UnknownKindError} for a kind or version this program does not know
 * @source product rules: record, judging
 * @accuracy exact; tests/lib/case/course/case-course.test.ts, a case worked by hand
 * @example
 * caseCourse(entries).times.closedAt
 */
export function caseCourse(entries: readonly FeedEntry[]): CaseCourse {
  const known = courseEntries(entries);
  const { final, opened, velocities } = folded(known);
  const runs = courseRuns(known);
  return {
    final,
    opened,
    entries: known,
    times: courseTimes(known),
    alerts: alertCourses(known),
    blind: blindTimes(known),
    nerves: nerveEnds(final, runs),
    segments: segmentEnds(final, velocities),
    runs,
    baselines: courseBaselines(known),
    talk: courseTalk(known),
    conditions: known.filter((entry) => entry.kind === 'condition.logged'),
    steps: known.filter((entry) => entry.kind === 'step.logged'),
    examinations: known.filter((entry) => entry.kind === 'examination.recorded'),
    late: known.flatMap((entry) => {
      const lateMs = lateMsOf(entry);
      return lateMs === null ? [] : [{ seq: entry.seq, lateMs }];
    }),
  };
}

function folded(entries: readonly CaseEntry[]) {
  const velocities = new Map<string, TwoSiteVelocity>();
  let final = initialState('record');
  let opened: CaseState | null = null;
  for (const entry of entries) {
    final = evolve(final, entry);
    if (entry.kind !== 'baseline.accepted') continue;
    const accepted = Object.values(final.openingBaselines).filter((baseline: Baseline) => baseline.seq === entry.seq);
    for (const [key, velocity] of openingVelocities(final, accepted)) if (!velocities.has(key)) velocities.set(key, velocity);
    opened ??= final;
  }
  return { final, opened, velocities };
}
