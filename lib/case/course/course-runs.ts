import type { PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import { lateMsOf } from '@/lib/case/course/late-after-ms';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { RunBody } from '@/lib/case/run-body';

/** A run as it was logged or corrected, with what was judged of it then. */
export interface RunVersion {
  readonly seq: number;
  readonly at: string;
  readonly by: string;
  /** null where the correction withdrew the run. */
  readonly run: RunBody | null;
  /** Why it was corrected; null for the original. */
  readonly reason: string | null;
  readonly paths: readonly PathJudgement[];
  readonly segments: readonly SegmentJudgement[];
}

/** One run of the case: the original for ever, and its corrections beside it, oldest first. */
export interface CourseRun {
  readonly seq: number;
  readonly at: string;
  readonly lateMs: number | null;
  readonly siteId: string;
  readonly original: RunVersion & { readonly run: RunBody };
  readonly corrections: readonly RunVersion[];
}

/**
 * Every run with its judgement, and each correction beside what it corrects.
 * @param entries readable entries in the order of the log; not modified
 * @returns runs in the order of the log
 * @source product rule: corrections stand beside originals, nothing is removed
 * @accuracy exact; tests/lib/case/course/course-runs.test.ts
 * @example
 * courseRuns(entries)[0]?.corrections.length // => 0
 */
export function courseRuns(entries: readonly CaseEntry[]): readonly CourseRun[] {
  const runs = new Map<number, CourseRun>();
  for (const entry of entries) {
    if (entry.kind === 'run.logged') {
      const original = { seq: entry.seq, at: entry.eventAt, by: entry.author.role, run: entry.body, reason: null, paths: [], segments: [] };
      runs.set(entry.seq, { seq: entry.seq, at: entry.eventAt, lateMs: lateMsOf(entry), siteId: entry.body.siteId, original, corrections: [] });
    }
    if (entry.kind === 'run.corrected') {
      const known = runs.get(entry.body.runSeq);
      const version = { seq: entry.seq, at: entry.eventAt, by: entry.author.role, run: entry.body.run, reason: entry.body.reason, paths: [], segments: [] };
      if (known !== undefined) runs.set(known.seq, { ...known, corrections: [...known.corrections, version] });
    }
    if (entry.kind === 'run.judged') {
      const known = runs.get(entry.body.runSeq);
      if (known !== undefined) runs.set(known.seq, judged(known, entry.body));
    }
  }
  return [...runs.values()];
}

/** The version of a run that counts: the last correction, else the original. @returns a version; its run is null when it was withdrawn @source house rule */
export function countedVersion(run: CourseRun): RunVersion {
  return run.corrections.at(-1) ?? run.original;
}

function judged(run: CourseRun, { paths, segments }: { readonly paths: readonly PathJudgement[]; readonly segments: readonly SegmentJudgement[] }): CourseRun {
  const last = run.corrections.at(-1);
  if (last === undefined) return { ...run, original: { ...run.original, paths, segments } };
  return { ...run, corrections: [...run.corrections.slice(0, -1), { ...last, paths, segments }] };
}
