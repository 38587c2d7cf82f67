import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { judgeSegment } from '@/lib/alert/judge-segment';
import type { SegmentEnd, SegmentPairInput } from '@/lib/alert/segment-pair';
import { defaultRuleSet } from '@/lib/alert/rule-set';

const end = (siteId: string, onsetMs: number | null, amplitudeUv: number | null, over: Partial<SegmentEnd> = {}): SegmentEnd => ({
  siteId, at: '2027-03-14T10:42:00.000Z', onsetMs, amplitudeUv, isComparable: true,
  baselineOnsetMs: null, baselineAmplitudeUv: null, baselineScatter: 0.03, baselineRunCount: 3, ...over,
});
/** Baseline 8.00 to 6.00 ms over 100 mm: 2 ms, 50 m/s; both amplitudes 10 mV. */
const pair = (proximalMs: number | null, over: Partial<SegmentPairInput> = {}, amplitudesUv: readonly [number, number] = [10_000, 10_000]): SegmentPairInput => ({
  nerveId: 'ulnar', channelId: 'adm', distanceMm: 100, spansRiskStep: false, rules: defaultRuleSet,
  proximal: end('above-elbow', proximalMs, amplitudesUv[0], { baselineOnsetMs: 8, baselineAmplitudeUv: 10_000 }),
  distal: end('below-elbow', 6, amplitudesUv[1], { baselineOnsetMs: 6, baselineAmplitudeUv: 10_000 }),
  ...over,
});
const kinds = (input: SegmentPairInput) => judgeSegment(input).findings.map((finding) => finding.kind);

describe('judgeSegment', () => {
  it('judgeSegment computes the invented arm by hand', () => {
    // 9.69 − 6.47 = 3.22 ms; 100 / 3.22 = 31.06 m/s. Error: 31.06 · √((2/100)² + (0.0707/3.22)²)
    // = 31.06 · √(0.0004 + 0.000482) = 31.06 · 0.02970 = 0.92 m/s. Baseline 1.84 ms: +1.38 ms, +75 %.
    // Ratio 3.4 / 9.0 = 0.3778 of 8.9 / 9.2 = 0.9674: 39.1 %, −60.9 %.
    const judged = judgeSegment({
      ...pair(null),
      proximal: end('above-elbow', 9.69, 3400, { baselineOnsetMs: 8.31, baselineAmplitudeUv: 8900 }),
      distal: end('below-elbow', 6.47, 9000, { baselineOnsetMs: 6.47, baselineAmplitudeUv: 9200 }),
    });
    expect(judged.velocity).toEqual({
      kind: 'velocity', velocityMps: 31.06, standardErrorMps: 0.92, distanceMm: 100, isShort: false, isImplausible: false,
    });
    expect(judged).toMatchObject({ conductionTimeMs: 3.22, timeChangeMs: 1.38, timeChangePercent: 75, ratioChangePercent: -60.9 });
    expect(judged.findings.map((finding) => finding.kind)).toEqual(['segment-slowed', 'ratio-fall']);
  });

  it.each([
    // 2 ms + 20 % is 2.4 ms, which is also +0.4 ms: proximal onset 8.4.
    ['notices at exactly +20 % and +0.4 ms', pair(8.4), ['segment-slowed']],
    ['is silent 0.002 ms sooner', pair(8.398), []],
    // Ratio 0.8 is −20 %, 0.801 is −19.9 %; error 100 · 0.8 · 0.03 · √2 · 1.1547 = 3.9 points.
    ['notices a ratio of exactly −20 %', pair(8, {}, [8000, 10_000]), ['ratio-fall']],
    ['is silent at −19.9 %', pair(8, {}, [8010, 10_000]), []],
    ['cancels what weakens both', pair(8, {}, [4000, 4000]), []],
    ['lets a ratio pass that fell only because the distal response grew', pair(8, {}, [10_000, 14_000]), []],
    ['finds the ratio at a lost proximal response', pair(null, {}, [0, 10_000]), ['ratio-fall']],
    ['has nothing to say of two lost responses', pair(null, {}, [0, 0]), []],
  ] as const)('judgeSegment %s', (_promise, input, expected) => {
    expect(kinds(input)).toEqual(expected);
  });

  it('judgeSegment asks 0.4 ms at least, although the percentage is past its limit', () => {
    // Baseline 1 ms: +0.399 ms is +39.9 %.
    const over = { distal: end('below-elbow', 7, 10_000, { baselineOnsetMs: 7, baselineAmplitudeUv: 10_000 }) };
    expect(kinds(pair(8.399, over))).toEqual([]);
    expect(kinds(pair(8.4, over))).toEqual(['segment-slowed']);
  });

  it('judgeSegment lets noise veto a slowing', () => {
    // Marker error 0.2 ms: 0.2 · √2 · 1.1547 = 0.327 ms, twice is 0.653 ms.
    const rules = { ...defaultRuleSet, markerErrorMs: 0.2 };
    expect(kinds(pair(8.65, { rules }))).toEqual([]);
    expect(kinds(pair(8.655, { rules }))).toEqual(['segment-slowed']);
  });

  it.each([
    [79.9, true, false],
    [80, false, true],
  ])('judgeSegment at %f mm: short %s, may become an alert %s', (distanceMm, isShort, mayBecomeAlert) => {
    const judged = judgeSegment(pair(9, { distanceMm }));
    expect(judged.velocity).toMatchObject({ isShort });
    expect(judged.findings).toEqual([{ kind: 'segment-slowed', priority: 'notice', mayBecomeAlert }]);
  });

  it('judgeSegment never lets a segment of unknown length become an alert', () => {
    const judged = judgeSegment(pair(9, { distanceMm: null }));
    expect(judged.velocity).toEqual({ kind: 'not-computable', reason: 'distances-not-measured' });
    expect(judged.findings).toEqual([{ kind: 'segment-slowed', priority: 'notice', mayBecomeAlert: false }]);
  });

  it('judgeSegment lets a ratio reach a notice at most', () => {
    expect(judgeSegment(pair(8, {}, [2000, 10_000])).findings).toEqual([{ kind: 'ratio-fall', priority: 'notice', mayBecomeAlert: false }]);
  });

  it('judgeSegment takes no evidence from a pair that spans a risk step', () => {
    const judged = judgeSegment(pair(9, { spansRiskStep: true }, [2000, 10_000]));
    expect(judged).toMatchObject({ velocity: { kind: 'not-computable', reason: 'spans-risk-step' }, timeChangeMs: null, ratioChangePercent: null, findings: [] });
  });

  it('judgeSegment takes a velocity but no change from a run that is not comparable', () => {
    const judged = judgeSegment(pair(9, { distal: end('below-elbow', 6, 10_000, { isComparable: false, baselineOnsetMs: 6, baselineAmplitudeUv: 10_000 }) }));
    expect(judged).toMatchObject({ velocity: { kind: 'velocity', velocityMps: 33.33 }, timeChangeMs: null, findings: [] });
  });

  it.each([
    ['no-response', pair(null, {}, [0, 10_000])],
    ['onset-not-read', pair(null)],
    ['latencies-exchanged', pair(5.9)],
    ['latencies-equal', pair(6)],
  ] as const)('judgeSegment has no velocity: %s', (reason, input) => {
    expect(judgeSegment(input)).toMatchObject({ velocity: { kind: 'not-computable', reason }, timeChangeMs: null });
  });

  it('judgeSegment asks back an implausible velocity and never refuses it', () => {
    // 100 mm typed as 10 mm: 10 / 2 = 5 m/s.
    expect(judgeSegment(pair(8, { distanceMm: 10 })).velocity).toMatchObject({ velocityMps: 5, isImplausible: true });
  });

  it('judgeSegment never throws and never gives NaN or Infinity inside the bounds of a run', () => {
    const onset = fc.option(fc.integer({ min: 100, max: 100_000 }).map((us) => us / 1000));
    const amplitude = fc.option(fc.integer({ min: 0, max: 10_000_000 }).map((hundredths) => hundredths / 100));
    const some = fc.integer({ min: 1, max: 10_000_000 }).map((hundredths) => hundredths / 100);
    const distance = fc.option(fc.integer({ min: 1, max: 1500 }));
    fc.assert(
      fc.property(onset, onset, amplitude, amplitude, onset, onset, some, some, distance, (first, second, firstUv, secondUv, baseFirst, baseSecond, baseFirstUv, baseSecondUv, distanceMm) => {
        const judged = judgeSegment({
          ...pair(null),
          distanceMm,
          proximal: end('a', first, firstUv, { baselineOnsetMs: baseFirst, baselineAmplitudeUv: baseFirstUv }),
          distal: end('b', second, secondUv, { baselineOnsetMs: baseSecond, baselineAmplitudeUv: baseSecondUv }),
        });
        expect(JSON.parse(JSON.stringify(judged))).toEqual(judged);
      }),
      { examples: [[8, 6, 100_000, 0.01, 8, 6, 0.01, 100_000, 100]] },
    );
  });
});
