import type { NotComparedReason } from '@/lib/alert/judgement';
import type { Nerve, Path } from '@/lib/alert/nerve-plan';
import type { Baseline, CaseState } from '@/lib/case/case-state';
import { countedVersion, type CourseRun } from '@/lib/case/course/course-runs';
import { baselineKey } from '@/lib/case/keys';
import { amplitudeOf } from '@/lib/response/amplitude-of';
import type { Reading } from '@/lib/response/reading';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/** One path at its opening baseline and at its last run. */
export interface PathEnds {
  readonly pathId: string;
  readonly siteId: string;
  readonly channelId: string;
  readonly isRequired: boolean;
  /** The opening baseline that the last run can be set against, else the first of the path; null when none was accepted. */
  readonly opening: Baseline | null;
  readonly closing: { readonly seq: number; readonly at: string; readonly reading: Reading; readonly notCompared: NotComparedReason | null } | null;
  /** Closing amplitude in % of the opening baseline; null where the two are not like with like, or one was not read. */
  readonly percentOfOpening: number | null;
  readonly onsetChangeMs: number | null;
  /** False where the path was not tested any more after the last risk step. */
  readonly isAfterLastRiskStep: boolean;
}

/** One nerve, opening against closing. */
export interface NerveEnds {
  readonly nerve: Nerve;
  readonly paths: readonly PathEnds[];
}

/**
 * Opening against closing for every path that has a baseline or was run.
 *
 * Method: the opening baseline is the first accepted one and never moves. The last run of a path that says anything
 * stands as its closing; where that run was not compared, the percent stays empty and the reason stands beside it.
 *
 * @param state the case after its last entry
 * @param runs its runs with their corrections; not modified
 * @returns nerves in the order of the plan
 * @source product rule: opening baseline is kept for ever; like with like
 * @accuracy percent to 0.1, onset to 0.001 ms; tests/lib/case/course/case-course.test.ts
 * @example
 * nerveEnds(state, runs)[0]?.paths[0]?.percentOfOpening // => 92
 */
export function nerveEnds(state: CaseState, runs: readonly CourseRun[]): readonly NerveEnds[] {
  const bySeq = new Map(runs.map((run) => [run.seq, run]));
  const lastRiskAt = state.steps.filter((step) => step.isRisk).reduce((latest, step) => (step.at > latest ? step.at : latest), '');
  return state.plan.nerves.map((nerve) => ({
    nerve,
    paths: state.plan.paths
      .filter((path) => path.nerveId === nerve.id)
      .map((path) => pathEnds(state, path, bySeq, lastRiskAt))
      .filter((ends) => ends.opening !== null || ends.closing !== null),
  }));
}

function pathEnds(state: CaseState, path: Path, bySeq: ReadonlyMap<number, CourseRun>, lastRiskAt: string): PathEnds {
  const record = state.paths[path.id];
  const run = record === undefined ? undefined : bySeq.get(record.lastSeq);
  const version = run === undefined ? undefined : countedVersion(run).run;
  const ofPath = Object.values(state.openingBaselines).filter((baseline) => baseline.pathId === path.id);
  const like = version === undefined || version === null ? undefined : state.openingBaselines[baselineKey(path.id, version.electrodeId, version.family)];
  const opening = like ?? ofPath.reduce<Baseline | null>((first, one) => (first === null || one.seq < first.seq ? one : first), null);
  const closing =
    record === undefined ? null : { seq: record.lastSeq, at: record.lastAt, reading: record.lastReading, notCompared: record.lastNotCompared };
  const isLike = like !== undefined && closing !== null && closing.notCompared === null && closing.at > like.at;
  return {
    pathId: path.id,
    siteId: path.siteId,
    channelId: path.channelId,
    isRequired: path.isRequired,
    opening,
    closing,
    percentOfOpening: isLike ? percentOf(closing.reading, like) : null,
    onsetChangeMs: isLike ? onsetChangeOf(closing.reading, like) : null,
    isAfterLastRiskStep: closing !== null && closing.at > lastRiskAt,
  };
}

function percentOf(reading: Reading, opening: Baseline): number | null {
  const amplitudeUv = amplitudeOf(reading);
  if (amplitudeUv === null || opening.amplitudeUv === null || opening.amplitudeUv === 0) return null;
  return roundTo((100 * amplitudeUv) / opening.amplitudeUv, resolutions.percent);
}

function onsetChangeOf(reading: Reading, opening: Baseline): number | null {
  if (reading.kind !== 'measured' || reading.onsetMs === null || opening.onsetMs === null) return null;
  return roundTo(reading.onsetMs - opening.onsetMs, resolutions.timeMs);
}
