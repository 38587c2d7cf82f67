import type { SegmentJudgement } from '@/lib/alert/judgement';
import type { Nerve } from '@/lib/alert/nerve-plan';
import type { Baseline, CaseState } from '@/lib/case/case-state';
import { pathIdOf, segmentKey } from '@/lib/case/keys';
import { twoSiteVelocity, type TwoSiteVelocity } from '@/lib/conduction/two-site-velocity';

/** One segment at its opening baseline and at its last pair of runs. */
export interface SegmentEnds {
  readonly nerveId: string;
  readonly channelId: string;
  readonly proximalSiteId: string;
  readonly distalSiteId: string;
  /** Computed from the means of the opening baseline; null when one of its ends has no onset there. */
  readonly opening: TwoSiteVelocity | null;
  readonly closing: SegmentJudgement | null;
}

/**
 * The velocity of each segment from the opening baselines of one acceptance.
 * @param opened the case right after the acceptance: its distances are the ones of that time
 * @param baselines baselines of that acceptance; not modified
 * @returns velocities by segment key; a segment with an end without an onset is left out
 * @source common practice (distance over time); errors of the case's own rules
 * @accuracy as twoSiteVelocity; tests/lib/case/course/case-course.test.ts
 */
export function openingVelocities(opened: CaseState, baselines: readonly Baseline[]): ReadonlyMap<string, TwoSiteVelocity> {
  const onsets = new Map(baselines.map((one) => [one.pathId, one.onsetMs]));
  const { distanceErrorMm, markerErrorMs } = opened.plan.rules;
  return new Map(
    pairs(opened).flatMap(({ nerve, channelId, proximal, distal }) => {
      const proximalOnsetMs = onsets.get(pathIdOf(proximal.id, channelId)) ?? null;
      const distalOnsetMs = onsets.get(pathIdOf(distal.id, channelId)) ?? null;
      if (proximalOnsetMs === null || distalOnsetMs === null) return [];
      const distanceMm = opened.distancesVoidSince[nerve.id] === undefined ? distal.positionMm - proximal.positionMm : null;
      const velocity = twoSiteVelocity({ distanceMm, proximalOnsetMs, distalOnsetMs, distanceErrorMm, markerErrorMs });
      return [[segmentKey(channelId, proximal.id, distal.id), velocity] as const];
    }),
  );
}

/**
 * Opening against closing for every segment that was seen at one of both.
 * @param state the case after its last entry
 * @param opening velocities by segment key; not modified
 * @returns segments in the order of the plan
 * @source product rule: velocity is shown with its distance and its error
 */
export function segmentEnds(state: CaseState, opening: ReadonlyMap<string, TwoSiteVelocity>): readonly SegmentEnds[] {
  return pairs(state).flatMap(({ nerve, channelId, proximal, distal }) => {
    const key = segmentKey(channelId, proximal.id, distal.id);
    const [before, closing] = [opening.get(key) ?? null, state.segments[key] ?? null];
    if (before === null && closing === null) return [];
    return [{ nerveId: nerve.id, channelId, proximalSiteId: proximal.id, distalSiteId: distal.id, opening: before, closing }];
  });
}

function pairs(state: CaseState) {
  return state.plan.nerves.flatMap((nerve) => channelsOf(state, nerve).flatMap((channelId) => neighbours(nerve).map((pair) => ({ nerve, channelId, ...pair }))));
}

function channelsOf(state: CaseState, nerve: Nerve): readonly string[] {
  return [...new Set(state.plan.paths.filter((path) => path.nerveId === nerve.id).map((path) => path.channelId))];
}

function neighbours(nerve: Nerve) {
  return nerve.sites.flatMap((proximal, index) => {
    const distal = nerve.sites[index + 1];
    return distal === undefined ? [] : [{ proximal, distal }];
  });
}
