import type { PathJudgement } from '@/lib/alert/judgement';
import type { PathCourse, PathValue } from '@/lib/case/course/alert-course';

/**
 * The compared paths of one judgement as values of an alert.
 * @param runSeq number of the run
 * @param at RFC 3339, when the run was made
 * @param paths what was judged of it; not modified
 * @returns values by path; a path that was not compared has none
 * @source house rule
 */
export function pathValues(runSeq: number, at: string, paths: readonly PathJudgement[]): ReadonlyMap<string, PathValue> {
  const compared = paths.filter((path) => path.kind === 'compared');
  return new Map(
    compared.map(({ pathId, change, findings }) => {
      const isLost = findings.some((finding) => finding.kind === 'response-lost');
      return [pathId, { runSeq, at, percentOfBaseline: change.percentOfBaseline, onsetChangeMs: change.onsetChangeMs, isLost }];
    }),
  );
}

/**
 * Lowest, slowest and last of what a path showed.
 * @param pathId the path
 * @param values its compared runs while the alert was open; not modified
 * @returns the lowest amplitude, the latest onset, and the last by event time
 * @source product rule: worst value and last value
 * @accuracy exact; tests/lib/case/course/alert-courses.test.ts
 */
export function pathCourse(pathId: string, values: readonly PathValue[]): PathCourse {
  const worst = extreme(values, (value) => value.percentOfBaseline);
  const slowest = extreme(values, (value) => (value.onsetChangeMs === null ? null : -value.onsetChangeMs));
  const last = values.reduce<PathValue | null>((found, value) => (found === null || value.at >= found.at ? value : found), null);
  return { pathId, worst, slowest, last };
}

/** The value with the lowest measure, the first of equal ones. */
function extreme(values: readonly PathValue[], measure: (value: PathValue) => number | null): PathValue | null {
  return values.reduce<PathValue | null>((found, value) => {
    const own = measure(value);
    if (own === null) return found;
    return found === null || own < (measure(found) ?? own) ? value : found;
  }, null);
}
