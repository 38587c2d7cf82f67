import type { BaselineValues, CaseEntry } from '@/lib/case/entry-bodies';
import type { BaselineFamily } from '@/lib/case/plan';
import { smallestChange } from '@/lib/change/smallest-change';

/** One path of a baseline with the smallest loss that could be seen against it, in percent. */
export interface BaselinePath extends BaselineValues {
  readonly smallestLossPercent: number;
}

/** An accepted baseline. */
export interface CourseBaseline {
  readonly seq: number;
  readonly at: string;
  readonly byRole: string;
  readonly isOpening: boolean;
  readonly family: BaselineFamily;
  readonly electrodeId: string;
  readonly isProvisional: boolean;
  /** When the physician accepted what the desk had accepted provisionally. */
  readonly confirmedAt: string | null;
  /** Amplitude change in percent that was open when it was set; null when nothing was lost. */
  readonly setAfterPercent: number | null;
  readonly reason: string | null;
  /** Numbers of later corrections of runs it was made of. */
  readonly correctedBySeqs: readonly number[];
  readonly paths: readonly BaselinePath[];
}

/**
 * Every accepted baseline with what became of it.
 * @param entries readable entries in the order of the log; not modified
 * @returns baselines in the order of the log
 * @source product rules: provisional until a physician accepts; "set after" stays for the rest of the case
 * @accuracy exact; tests/lib/case/course/case-course.test.ts
 * @example
 * courseBaselines(entries)[0]?.isOpening // => true
 */
export function courseBaselines(entries: readonly CaseEntry[]): readonly CourseBaseline[] {
  const baselines: CourseBaseline[] = [];
  for (const entry of entries) {
    if (entry.kind === 'baseline.accepted') baselines.push(baselineOf(entry));
    if (entry.kind === 'baseline.confirmed') replace(baselines, (one) => one.seq === entry.body.baselineSeq, (one) => ({ ...one, confirmedAt: one.confirmedAt ?? entry.eventAt }));
    if (entry.kind === 'run.corrected') {
      const { runSeq } = entry.body;
      const used = (one: CourseBaseline) => one.paths.some((path) => path.runSeqs.includes(runSeq));
      replace(baselines, used, (one) => ({ ...one, correctedBySeqs: [...one.correctedBySeqs, entry.seq] }));
    }
  }
  return baselines;
}

function baselineOf({ seq, eventAt, author, body }: CaseEntry & { kind: 'baseline.accepted' }): CourseBaseline {
  const { isOpening, family, electrodeId, isProvisional, setAfterPercent, reason, values } = body;
  const paths = values.map((value) => ({
    ...value,
    ...smallestChange({ coefficientOfVariation: value.amplitudeScatter, baselineRunCount: value.runSeqs.length }),
  }));
  return { seq, at: eventAt, byRole: author.role, isOpening, family, electrodeId, isProvisional, confirmedAt: null, setAfterPercent, reason, correctedBySeqs: [], paths };
}

function replace(baselines: CourseBaseline[], isMeant: (one: CourseBaseline) => boolean, change: (one: CourseBaseline) => CourseBaseline): void {
  baselines.forEach((one, index) => {
    if (isMeant(one)) baselines[index] = change(one);
  });
}
