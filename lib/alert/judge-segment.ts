import type { Finding, NoVelocityReason, SegmentJudgement } from '@/lib/alert/judgement';
import type { RuleSet } from '@/lib/alert/rule-set';
import type { SegmentPairInput } from '@/lib/alert/segment-pair';
import { hasFallen, ratioChangeOf } from '@/lib/alert/ratio-fall';
import { isBeyondNoise } from '@/lib/change/is-beyond-noise';
import { segmentTimeChange } from '@/lib/change/segment-time-change';
import { shortSegmentMm } from '@/lib/conduction/short-segment-mm';
import { twoSiteVelocity } from '@/lib/conduction/two-site-velocity';
import { resolutions } from '@/lib/units/resolutions';
import { roundTo } from '@/lib/units/round-to';

/**
 * Velocity of a segment, and its conduction time and amplitude ratio against their own baseline.
 *
 * Method: from the newest run of either site. A pair that spans a risk step is no evidence: it gives neither a
 * velocity nor a finding. A conduction time past its limit may become an alert only on segments that are not
 * short and whose length is known; the ratio reaches a notice at most. A distance error common to baseline and now cancels in the time.
 *
 * @param input both ends, the distance in mm and the limits
 * @returns velocity in m/s with its standard error, or the reason why there is none; changes are null when not computable
 * @source limits: custom; ratio −20 %: published laryngeal-nerve series of 1,108 patients
 * @accuracy velocity to 0.01 m/s, percent to 0.1; tests/lib/alert/judge-segment.test.ts
 * @example
 * judgeSegment(input).velocity.kind // => 'velocity'
 */
export function judgeSegment(input: SegmentPairInput): SegmentJudgement {
  const { proximal, distal } = input;
  const isEvidence = !input.spansRiskStep && proximal.isComparable && distal.isComparable;
  const time = isEvidence ? timeChangeOf(input) : null;
  const ratio = isEvidence ? ratioChangeOf(input) : null;
  const velocity = velocityOf(input);
  const findings: Finding[] = [];
  if (time !== null && isSlowed(time, input.rules)) {
    // A segment whose length is void or unknown may be a short one.
    const isLong = input.distanceMm !== null && input.distanceMm >= shortSegmentMm.value;
    findings.push({ kind: 'segment-slowed', priority: 'notice', mayBecomeAlert: isLong });
  }
  const isRatioLow = ratio !== null && ratio.changePercent <= -input.rules.amplitudeRatioFallPercent && isBeyondNoise(ratio);
  if (isRatioLow && hasFallen(proximal)) {
    findings.push({ kind: 'ratio-fall', priority: 'notice', mayBecomeAlert: false });
  }
  const bothOnsets = proximal.onsetMs !== null && distal.onsetMs !== null;
  return {
    nerveId: input.nerveId,
    channelId: input.channelId,
    proximalSiteId: proximal.siteId,
    distalSiteId: distal.siteId,
    proximalAt: proximal.at,
    distalAt: distal.at,
    velocity,
    conductionTimeMs: bothOnsets ? roundTo(proximal.onsetMs - distal.onsetMs, resolutions.timeMs) : null,
    timeChangeMs: time?.changeMs ?? null,
    timeChangePercent: time?.changePercent ?? null,
    ratioChangePercent: ratio?.changePercent ?? null,
    findings,
  };
}

function velocityOf(input: SegmentPairInput): SegmentJudgement['velocity'] {
  const { proximal, distal, rules } = input;
  if (input.spansRiskStep) return noVelocity('spans-risk-step');
  if (proximal.amplitudeUv === 0 || distal.amplitudeUv === 0) return noVelocity('no-response');
  if (proximal.onsetMs === null || distal.onsetMs === null) return noVelocity('onset-not-read');
  const result = twoSiteVelocity({
    distanceMm: input.distanceMm,
    proximalOnsetMs: proximal.onsetMs,
    distalOnsetMs: distal.onsetMs,
    distanceErrorMm: rules.distanceErrorMm,
    markerErrorMs: rules.markerErrorMs,
  });
  if (result.kind === 'not-computable') {
    return noVelocity(result.reason === 'distance-missing' ? 'distances-not-measured' : result.reason);
  }
  return {
    kind: 'velocity',
    velocityMps: roundTo(result.velocityMps, resolutions.velocityMps),
    standardErrorMps: roundTo(result.standardErrorMps, resolutions.velocityMps),
    distanceMm: result.distanceMm,
    isShort: result.isShort,
    isImplausible: result.plausibility !== 'plausible',
  };
}

function noVelocity(reason: NoVelocityReason): SegmentJudgement['velocity'] {
  return { kind: 'not-computable', reason };
}

function timeChangeOf({ proximal, distal, rules }: SegmentPairInput) {
  if (proximal.onsetMs === null || distal.onsetMs === null) return null;
  if (proximal.baselineOnsetMs === null || distal.baselineOnsetMs === null) return null;
  const change = segmentTimeChange({
    baseline: { proximalOnsetMs: proximal.baselineOnsetMs, distalOnsetMs: distal.baselineOnsetMs },
    current: { proximalOnsetMs: proximal.onsetMs, distalOnsetMs: distal.onsetMs },
    baselineRunCount: Math.min(proximal.baselineRunCount, distal.baselineRunCount),
    markerErrorMs: rules.markerErrorMs,
  });
  return change.kind === 'change' ? change : null;
}

function isSlowed(
  time: { changeMs: number; changePercent: number; standardErrorMs: number },
  rules: RuleSet,
): boolean {
  return (
    time.changePercent >= rules.segmentTimeRisePercent &&
    time.changeMs >= rules.segmentTimeRiseMs &&
    isBeyondNoise({ change: time.changeMs, standardError: time.standardErrorMs })
  );
}
