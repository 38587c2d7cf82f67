import type { Finding, PathChange } from '@/lib/alert/judgement';
import type { RuleSet } from '@/lib/alert/rule-set';
import { worstFirst } from '@/lib/alert/worst-finding';
import { amplitudeChange } from '@/lib/change/amplitude-change';
import { durationChange } from '@/lib/change/duration-change';
import { isBeyondNoise } from '@/lib/change/is-beyond-noise';
import { latencyChange } from '@/lib/change/latency-change';
import type { Reading } from '@/lib/response/reading';

/** What a response is compared with: the means of an accepted baseline and their scatter. */
export interface PathBaseline {
  readonly onsetMs: number | null;
  readonly amplitudeUv: number | null;
  readonly durationMs: number | null;
  readonly amplitudeScatter: number;
  readonly isScatterAssumed: boolean;
  readonly runCount: number;
}

/** A response that was looked for: measured or absent. */
export type SeenReading = Extract<Reading, { kind: 'measured' | 'absent' }>;

/**
 * The change of one path against its baseline, with the findings it reaches.
 *
 * Method: amplitude as % of the baseline mean, error from the scatter of the baseline runs; onset and duration by
 * difference, error from the marker. A limit counts only when the change is beyond noise (more than twice its
 * standard error), except a lost response, which noise never vetoes. What else could explain a change is not
 * looked at here.
 *
 * @param reading measured or absent
 * @param baseline accepted baseline of the same path, electrode and family
 * @param rules limits of the case
 * @returns change with null where it is not computable, and findings, worst first, empty when none
 * @source limits: custom, see `defaultRuleSet`; error: first-order propagation
 * @accuracy percent to 0.1, times to 0.001 ms; tests/lib/alert/judge-path.test.ts
 * @example
 * judgePath({ kind: 'absent', highestIntensityMa: 18 }, baseline, rules).findings[0]?.kind // => 'response-lost'
 */
export function judgePath(
  reading: SeenReading,
  baseline: PathBaseline,
  rules: RuleSet,
): { readonly change: PathChange; readonly findings: readonly Finding[] } {
  const change = pathChange(reading, baseline, rules);
  const isLost = reading.kind === 'absent' || (change.percentOfBaseline !== null && change.percentOfBaseline < rules.lostBelowPercent);
  return { change, findings: isLost ? [lost] : findingsOf(change, rules) };
}

const lost: Finding = { kind: 'response-lost', priority: 'notice', mayBecomeAlert: true };

function pathChange(reading: SeenReading, baseline: PathBaseline, rules: RuleSet): PathChange {
  const isMeasured = reading.kind === 'measured';
  const currentUv = isMeasured ? reading.amplitudeUv : 0;
  const amplitude =
    currentUv === null || baseline.amplitudeUv === null
      ? null
      : amplitudeChange({
          baselineUv: baseline.amplitudeUv,
          currentUv,
          coefficientOfVariation: baseline.amplitudeScatter,
          baselineRunCount: baseline.runCount,
        });
  const shared = { baselineRunCount: baseline.runCount, markerErrorMs: rules.markerErrorMs };
  const onset =
    isMeasured && reading.onsetMs !== null && baseline.onsetMs !== null
      ? latencyChange({ baselineMs: baseline.onsetMs, currentMs: reading.onsetMs, ...shared })
      : null;
  const duration =
    isMeasured && reading.durationMs !== null && baseline.durationMs !== null
      ? durationChange({ baselineMs: baseline.durationMs, currentMs: reading.durationMs, ...shared })
      : null;
  const known = amplitude?.kind === 'change' ? amplitude : null;
  return {
    percentOfBaseline: known?.percentOfBaseline ?? null,
    amplitudeChangePercent: known?.changePercent ?? null,
    amplitudeErrorPercent: known?.standardErrorPercent ?? null,
    isScatterAssumed: baseline.isScatterAssumed,
    onsetChangeMs: onset?.changeMs ?? null,
    onsetChangePercent: onset?.changePercent ?? null,
    onsetErrorMs: onset?.standardErrorMs ?? null,
    durationChangePercent: duration?.changePercent ?? null,
    durationErrorPercent: duration?.standardErrorPercent ?? null,
  };
}

function findingsOf(change: PathChange, rules: RuleSet): readonly Finding[] {
  const { amplitudeChangePercent, amplitudeErrorPercent } = change;
  const isOnsetLate = hasLateOnset(change, rules);
  const findings: Finding[] = [];
  if (amplitudeChangePercent !== null && amplitudeErrorPercent !== null) {
    const isBeyond = isBeyondNoise({ change: amplitudeChangePercent, standardError: amplitudeErrorPercent });
    if (isBeyond && amplitudeChangePercent <= -rules.amplitudeNoticeFallPercent) {
      const kind = isOnsetLate ? 'amplitude-and-onset' : 'amplitude-fall';
      findings.push({ kind, priority: 'notice', mayBecomeAlert: true });
    } else if (isBeyond && amplitudeChangePercent <= -rules.amplitudeWatchFallPercent) {
      findings.push({ kind: 'amplitude-watch', priority: 'watch', mayBecomeAlert: false });
    }
  }
  if (isOnsetLate && findings[0]?.kind !== 'amplitude-and-onset') {
    findings.push({ kind: 'onset-late', priority: 'notice', mayBecomeAlert: false });
  }
  return worstFirst(findings);
}

function hasLateOnset(change: PathChange, rules: RuleSet): boolean {
  const { onsetChangeMs, onsetChangePercent, onsetErrorMs } = change;
  if (onsetChangeMs === null || onsetChangePercent === null || onsetErrorMs === null) return false;
  return (
    onsetChangePercent >= rules.onsetNoticeRisePercent &&
    onsetChangeMs >= rules.onsetNoticeRiseMs &&
    isBeyondNoise({ change: onsetChangeMs, standardError: onsetErrorMs })
  );
}
