import type { NotComparedReason, PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import { judgePath } from '@/lib/alert/judge-path';
import { comparability, type RunConditions } from '@/lib/change/comparability';
import { isEqualCurrent } from '@/lib/change/stimulus-current';
import type { Baseline, CaseState, Incident } from '@/lib/case/case-state';
import { judgeSegments } from '@/lib/case/judge-segments';
import { baselineOfTime } from '@/lib/case/baseline-of-time';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { pathIdOf } from '@/lib/case/keys';
import type { RunBody } from '@/lib/case/run-body';
import type { RunToJudge } from '@/lib/case/run-to-judge';
import type { ChannelReading } from '@/lib/response/reading';

/**
 * One run of a case, judged: every path it touches and every segment it completes.
 *
 * Method: like with like first, then the limits. A raised current is compared only where it shows a loss, or where
 * it answers an open notice: back at a higher current is a threshold rise, also where both are ticked supramaximal. The newest run of a neighbouring site
 * completes a segment.
 *
 * @param state the case before or just after the run was logged
 * @param judged the run with its event time
 * @returns one judgement for each reading, compared or not compared with its reason, and the segments
 * @source product rule: like with like; limits custom
 * @accuracy tests/lib/case/judge-in-case.test.ts
 * @example
 * judgeInCase(state, { at, run }).paths.length === run.readings.length
 */
export function judgeInCase(
  state: CaseState,
  judged: RunToJudge,
): { readonly paths: readonly PathJudgement[]; readonly segments: readonly SegmentJudgement[] } {
  const paths = judged.run.readings.map((row) => judgeReading(state, judged, row));
  return { paths, segments: judgeSegments(state, judged, paths) };
}

function judgeReading(state: CaseState, judged: RunToJudge, row: ChannelReading): PathJudgement {
  const { run } = judged;
  const pathId = pathIdOf(run.siteId, row.channelId);
  const notCompared = (reason: NotComparedReason): PathJudgement => ({ kind: 'not-compared', pathId, reason });
  if (!state.plan.paths.some((path) => path.id === pathId)) return notCompared('path-unknown');
  if (state.timeoutAt === null || judged.at < state.timeoutAt) return notCompared('not-timed-out');
  if (row.reading.kind === 'not-read') return notCompared('not-read');
  if (row.reading.kind === 'unusable') return notCompared('unusable');
  const baseline = baselineOfTime(state, judged, pathId);
  if (baseline === null) return notCompared(missingBaselineReason(state, pathId, run));
  const likeness = comparability(conditionsOf(state, run, row.channelId), baselineConditions(state, baseline, row.channelId));
  if (likeness.kind === 'not-compared') return notCompared(likeness.reason);
  const seen = judgePath(row.reading, pathBaseline(baseline), state.plan.rules);
  const isRaised = likeness.kind === 'raised' || (likeness.current === 'supramaximal' && isRaisedRepeat(state, judged, pathId));
  if (!isRaised) return { kind: 'compared', pathId, current: likeness.current, ...seen };
  if (isAbnormal(seen.findings)) return { kind: 'compared', pathId, current: 'raised', ...seen };
  if (incidentOf(state, pathId, judged.at) === undefined) return notCompared('current-raised');
  const finding = { kind: 'threshold-rise', priority: 'notice', mayBecomeAlert: false } as const;
  return { kind: 'compared', pathId, current: 'raised', change: seen.change, findings: [finding] };
}

/** A response that failed at a current ticked supramaximal and is back above it needs more current, whatever is ticked now. */
function isRaisedRepeat(state: CaseState, { at, run }: RunToJudge, pathId: string): boolean {
  const incident = incidentOf(state, pathId, at);
  return state.runs.some(
    (bad) =>
      incident?.badSeqs.includes(bad.seq) === true && bad.run.siteId === run.siteId && run.intensityMa > bad.run.intensityMa && !isEqualCurrent(run, bad.run),
  );
}

function incidentOf(state: CaseState, pathId: string, at: string): Incident | undefined {
  return Object.values(state.incidents).find((incident) => incident.pathIds.includes(pathId) && at >= incident.firstBadAt);
}

function missingBaselineReason(state: CaseState, pathId: string, run: RunBody): NotComparedReason {
  const ofPath = Object.values(state.baselines).filter((baseline) => baseline.pathId === pathId);
  if (ofPath.length === 0) return 'no-baseline';
  if (ofPath.some((baseline) => baseline.family === run.family && baseline.electrodeId === run.electrodeId)) return 'no-baseline';
  return ofPath.some((baseline) => baseline.family === run.family) ? 'electrode-differs' : 'family-differs';
}

function conventionOf(state: CaseState, channelId: string): string {
  return state.plan.channels.find((channel) => channel.id === channelId)?.convention ?? 'unknown';
}

function conditionsOf(state: CaseState, run: RunBody, channelId: string): RunConditions {
  return {
    electrode: run.electrodeId,
    family: run.family,
    pulseWidthUs: run.pulseWidthUs,
    convention: conventionOf(state, channelId),
    intensityMa: run.intensityMa,
    isSupramaximal: run.isSupramaximal,
    maximalResponseMa: run.maximalResponseMa,
  };
}

function baselineConditions(state: CaseState, baseline: Baseline, channelId: string): RunConditions {
  return {
    electrode: baseline.electrodeId,
    family: baseline.family,
    pulseWidthUs: baseline.pulseWidthUs,
    convention: conventionOf(state, channelId),
    intensityMa: baseline.intensityMa,
    isSupramaximal: baseline.isSupramaximal,
    maximalResponseMa: baseline.maximalResponseMa,
  };
}

function pathBaseline(baseline: Baseline) {
  return {
    onsetMs: baseline.onsetMs,
    amplitudeUv: baseline.amplitudeUv,
    durationMs: baseline.durationMs,
    amplitudeScatter: baseline.amplitudeScatter,
    isScatterAssumed: baseline.isScatterAssumed,
    runCount: baseline.runSeqs.length,
  };
}
