import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { judgePath, type PathBaseline, type SeenReading } from '@/lib/alert/judge-path';
import { defaultRuleSet } from '@/lib/alert/rule-set';

/** Three equal runs: scatter at its floor of 3 %, error factor √(1 + 1/3) = 1.1547. */
const baseline: PathBaseline = {
  onsetMs: 8, amplitudeUv: 10_000, durationMs: 6, amplitudeScatter: 0.03, isScatterAssumed: false, runCount: 3,
};
const seen = (onsetMs: number | null, amplitudeUv: number | null, durationMs: number | null = null): SeenReading => ({
  kind: 'measured', onsetMs, amplitudeUv, durationMs,
});
const judge = (reading: SeenReading, over: Partial<PathBaseline> = {}) => judgePath(reading, { ...baseline, ...over }, defaultRuleSet);
const kinds = (reading: SeenReading, over: Partial<PathBaseline> = {}) => judge(reading, over).findings.map((finding) => finding.kind);

describe('judgePath at its limits', () => {
  it.each([
    // % of 10,000 µV to 0.1: 70.0 is −30.0 %, 70.1 is −29.9 %.
    ['watches at exactly −30 %', seen(8, 7000), ['amplitude-watch']],
    ['is silent at −29.9 %', seen(8, 7010), []],
    ['still watches at −49.9 %', seen(8, 5010), ['amplitude-watch']],
    ['notices at exactly −50 %', seen(8, 5000), ['amplitude-fall']],
    // 5.0 % is not under 5 %; 4.9 % is.
    ['does not call exactly 5 % lost', seen(8, 500), ['amplitude-fall']],
    ['calls 4.9 % lost', seen(8, 490), ['response-lost']],
    ['calls an absent response lost', { kind: 'absent', highestIntensityMa: 18 } as const, ['response-lost']],
    // +10 % of 8 ms is 0.8 ms.
    ['notices an onset later by exactly 10 %', seen(8.8, 10_000), ['onset-late']],
    ['is silent at +9.9 %', seen(8.792, 10_000), []],
    ['puts −50 % with +10 % together', seen(8.8, 5000), ['amplitude-and-onset']],
    ['keeps −50 % with +9.9 % apart', seen(8.792, 5000), ['amplitude-fall']],
    ['says the later onset before the watch', seen(8.8, 7000), ['onset-late', 'amplitude-watch']],
  ] as const)('judgePath %s', (_promise, reading, expected) => {
    expect(kinds(reading)).toEqual(expected);
  });

  it.each([
    // 10 % of 2 ms is 0.2 ms, under the least 0.3 ms; 0.3 ms is 15 %.
    ['is silent under 0.3 ms although past 10 %', 2.299, []],
    ['notices at exactly 0.3 ms', 2.3, ['onset-late']],
  ] as const)('judgePath %s', (_promise, onsetMs, expected) => {
    expect(kinds(seen(onsetMs, 10_000), { onsetMs: 2 })).toEqual(expected);
  });

  it('judgePath lets noise veto a fall', () => {
    // One baseline run with scatter 0.36: 100 · 0.5 · 0.36 · √2 = 25.5 points; 50 is not more than twice 25.5.
    expect(kinds(seen(8, 5000), { amplitudeScatter: 0.36, runCount: 1 })).toEqual([]);
    // Scatter 0.35: 24.7 points, twice is 49.4: beyond noise.
    expect(kinds(seen(8, 5000), { amplitudeScatter: 0.35, runCount: 1 })).toEqual(['amplitude-fall']);
  });

  it('judgePath lets noise veto a late onset', () => {
    // Marker error 0.5 ms, three runs: 0.577 ms, twice is 1.155 ms: more than 0.8 ms.
    const rules = { ...defaultRuleSet, markerErrorMs: 0.5 };
    expect(judgePath(seen(8.8, 10_000), baseline, rules).findings).toEqual([]);
    expect(judgePath(seen(9.156, 10_000), baseline, rules).findings).toMatchObject([{ kind: 'onset-late' }]);
  });

  it('judgePath never lets noise veto a loss', () => {
    const noisy = { amplitudeScatter: 10, runCount: 1 };
    expect(kinds(seen(8, 490), noisy)).toEqual(['response-lost']);
    expect(kinds({ kind: 'absent', highestIntensityMa: 18 }, noisy)).toEqual(['response-lost']);
  });

  it('judgePath calls an absent response lost also where the baseline has no amplitude', () => {
    expect(kinds({ kind: 'absent', highestIntensityMa: 18 }, { amplitudeUv: null })).toEqual(['response-lost']);
  });

  it('judgePath lets a late onset alone reach a notice at most', () => {
    expect(judge(seen(9, 10_000)).findings).toEqual([{ kind: 'onset-late', priority: 'notice', mayBecomeAlert: false }]);
    expect(judge(seen(8, 7000)).findings).toEqual([{ kind: 'amplitude-watch', priority: 'watch', mayBecomeAlert: false }]);
  });
});

describe('judgePath in numbers', () => {
  it('judgePath computes the invented arm by hand', () => {
    // Above elbow 8.31 ms / 8.9 mV then 9.69 ms / 3.4 mV: +1.38 ms, 1.38 / 8.31 = 16.6 %; 3.4 / 8.9 = 38.2 %, −61.8 %.
    // Error: 100 · 0.382 · 0.03 · 1.1547 = 1.3 points; onset 0.05 · 1.1547 = 0.058 ms.
    const { change, findings } = judge(seen(9.69, 3400), { onsetMs: 8.31, amplitudeUv: 8900 });
    expect(change).toMatchObject({
      percentOfBaseline: 38.2, amplitudeChangePercent: -61.8, amplitudeErrorPercent: 1.3,
      onsetChangeMs: 1.38, onsetChangePercent: 16.6, onsetErrorMs: 0.058,
    });
    expect(findings.map((finding) => finding.kind)).toEqual(['amplitude-and-onset']);
  });

  it('judgePath computes the duration with two marks', () => {
    // 9 ms against 6 ms: +50 %; 0.05 · √2 · 1.1547 = 0.0816 ms, of 6 ms 1.4 %.
    expect(judge(seen(8, 10_000, 9)).change).toMatchObject({ durationChangePercent: 50, durationErrorPercent: 1.4 });
  });

  it('judgePath gives null, never 0, for what was not read', () => {
    expect(judge(seen(null, 10_000)).change).toMatchObject({ onsetChangeMs: null, onsetChangePercent: null, onsetErrorMs: null, durationChangePercent: null });
    expect(judge(seen(8, null)).change).toMatchObject({ percentOfBaseline: null, amplitudeChangePercent: null, amplitudeErrorPercent: null });
  });

  it('judgePath shows improvement as a result without a finding', () => {
    expect(judge(seen(7.5, 17_360))).toMatchObject({ change: { percentOfBaseline: 173.6, amplitudeChangePercent: 73.6 }, findings: [] });
  });

  it('judgePath never gives NaN or Infinity, and a smaller response never less of a finding', () => {
    const amplitude = fc.integer({ min: 1, max: 100_000 });
    const order = ['none', 'amplitude-watch', 'amplitude-fall', 'response-lost'];
    const worst = (amplitudeUv: number, scatter: number) => order.indexOf(kinds(seen(8, amplitudeUv), { amplitudeScatter: scatter })[0] ?? 'none');
    fc.assert(
      fc.property(amplitude, amplitude, fc.double({ min: 0.03, max: 1, noNaN: true }), (first, second, scatter) => {
        const values = Object.values(judge(seen(8, first), { amplitudeScatter: scatter }).change).filter((value) => typeof value === 'number');
        expect(values.every(Number.isFinite)).toBe(true);
        const [small, large] = first < second ? [first, second] : [second, first];
        expect(worst(small, scatter)).toBeGreaterThanOrEqual(worst(large, scatter));
      }),
    );
  });
});
