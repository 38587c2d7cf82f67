import type { PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import { judgeSegment } from '@/lib/alert/judge-segment';
import type { SegmentEnd } from '@/lib/alert/segment-pair';
import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import { baselineKey, pathIdOf } from '@/lib/case/keys';
import type { RunBody } from '@/lib/case/run-body';
import type { RunToJudge } from '@/lib/case/run-to-judge';
import { amplitudeOf } from '@/lib/response/amplitude-of';

/**
 * The segments a run completes: with the neighbour on either side, for each channel it was read on.
 * @param state the case; not modified
 * @param judged the run with its event time
 * @param paths its judged paths
 * @returns one judgement for each neighbouring pair whose other site was run before; empty when there is none
 * @source house rule
 * @accuracy tests/lib/case/judge-in-case.test.ts
 * @example
 * judgeSegments(state, judged, paths)
 */
export function judgeSegments(state: CaseState, judged: RunToJudge, paths: readonly PathJudgement[]): readonly SegmentJudgement[] {
  const nerve = state.plan.nerves.find((candidate) => candidate.sites.some((site) => site.id === judged.run.siteId));
  if (nerve === undefined) return [];
  const index = nerve.sites.findIndex((site) => site.id === judged.run.siteId);
  return judged.run.readings.flatMap((row) => {
    const own = endOf(state, judged, row.channelId, paths);
    if (own === null) return [];
    return [
      segmentWith(state, nerve, nerve.sites[index - 1], own, row.channelId, 'proximal', judged.at),
      segmentWith(state, nerve, nerve.sites[index + 1], own, row.channelId, 'distal', judged.at),
    ].filter((segment) => segment !== null);
  });
}

function endOf(state: CaseState, judged: RunToJudge, channelId: string, paths: readonly PathJudgement[]): SegmentEnd | null {
  const pathId = pathIdOf(judged.run.siteId, channelId);
  const working = state.baselines[baselineKey(pathId, judged.run.electrodeId, judged.run.family)];
  // A late run held against an older baseline has no partner that is held against the same.
  const isOfWorking = working !== undefined && judged.at > working.at;
  const isComparable = isOfWorking && paths.some((path) => path.pathId === pathId && path.kind === 'compared');
  return segmentEnd(state, judged.run, judged.at, channelId, isComparable);
}

function segmentEnd(state: CaseState, run: RunBody, at: string, channelId: string, isComparable: boolean): SegmentEnd | null {
  const reading = run.readings.find((row) => row.channelId === channelId)?.reading;
  if (reading === undefined || reading.kind === 'not-read' || reading.kind === 'unusable') return null;
  const baseline = state.baselines[baselineKey(pathIdOf(run.siteId, channelId), run.electrodeId, run.family)];
  return {
    siteId: run.siteId,
    at,
    onsetMs: reading.kind === 'measured' ? reading.onsetMs : null,
    amplitudeUv: amplitudeOf(reading),
    isComparable: isComparable && baseline !== undefined,
    baselineOnsetMs: baseline?.onsetMs ?? null,
    baselineAmplitudeUv: baseline?.amplitudeUv ?? null,
    baselineScatter: baseline?.amplitudeScatter ?? state.plan.rules.assumedAmplitudeScatter,
    baselineRunCount: baseline?.runSeqs.length ?? 1,
  };
}

function segmentWith(
  state: CaseState,
  nerve: Nerve,
  neighbour: Site | undefined,
  own: SegmentEnd,
  channelId: string,
  side: 'proximal' | 'distal',
  at: string,
): SegmentJudgement | null {
  const site = nerve.sites.find((candidate) => candidate.id === own.siteId);
  if (neighbour === undefined || site === undefined) return null;
  const partner = partnerEnd(state, neighbour.id, channelId);
  if (partner === null) return null;
  const isVoid = state.distancesVoidSince[nerve.id] !== undefined;
  return judgeSegment({
    nerveId: nerve.id,
    channelId,
    proximal: side === 'proximal' ? partner : own,
    distal: side === 'proximal' ? own : partner,
    distanceMm: isVoid ? null : Math.abs(site.positionMm - neighbour.positionMm),
    spansRiskStep: isSplit(state, nerve.id, [partner.at, at]),
    rules: state.plan.rules,
  });
}

/**
 * A risk step, or the first abnormal run of an open alert, between the two runs: together they are no evidence.
 * The repeat that a notice asks for is held against the partner that the notice was raised with.
 */
function isSplit(state: CaseState, nerveId: string, ends: readonly [string, string]): boolean {
  const [from, to] = ends[0] < ends[1] ? ends : [ends[1], ends[0]];
  if (state.steps.some((step) => step.isRisk && step.at >= from && step.at <= to)) return true;
  const incident = state.incidents[nerveId];
  return incident?.level === 'alert' && incident.firstBadAt > from && incident.firstBadAt <= to;
}

function partnerEnd(state: CaseState, siteId: string, channelId: string): SegmentEnd | null {
  const record = state.paths[pathIdOf(siteId, channelId)];
  const kept = state.runs.find((run) => run.seq === record?.lastSeq);
  if (record === undefined || kept === undefined) return null;
  return segmentEnd(state, kept.run, kept.at, channelId, record.lastNotCompared === null);
}
