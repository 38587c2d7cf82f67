import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { amplitudeRatio } from '@/lib/change/amplitude-ratio';

const scatter = { coefficientOfVariation: 0.05, baselineRunCount: 1 };
const baseline = { proximalUv: 8000, distalUv: 10_000 };

describe('amplitudeRatio', () => {
  it('sets the ratio against its own baseline', () => {
    // 0.6 of 0.8 is 75 %; 100 · 0.75 · 0.05 · √2 · √2 = 7.5 points.
    expect(amplitudeRatio({ baseline, current: { proximalUv: 3000, distalUv: 5000 }, ...scatter })).toEqual({
      kind: 'ratio',
      ratio: 0.6,
      baselineRatio: 0.8,
      changePercent: -25,
      standardErrorPercent: 7.5,
    });
  });

  it('reaches the limit of −20 % exactly', () => {
    expect(amplitudeRatio({ baseline, current: { proximalUv: 6400, distalUv: 10_000 }, ...scatter })).toMatchObject({ changePercent: -20 });
  });

  it('cancels what weakens the whole muscle', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 5, noNaN: true }), (share) => {
        const current = { proximalUv: 8000 * share, distalUv: 10_000 * share };
        expect(amplitudeRatio({ baseline, current, ...scatter })).toMatchObject({ changePercent: 0 });
      }),
    );
  });

  it.each([
    ['distal-absent', baseline, { proximalUv: 3000, distalUv: 0 }],
    ['baseline-absent', { proximalUv: 8000, distalUv: 0 }, baseline],
    ['baseline-absent', { proximalUv: 0, distalUv: 8000 }, baseline],
  ] as const)('is not computable: %s', (reason, before, current) => {
    expect(amplitudeRatio({ baseline: before, current, ...scatter })).toEqual({ kind: 'not-computable', reason });
  });

  it('gives −100 % when only the proximal response is gone', () => {
    expect(amplitudeRatio({ baseline, current: { proximalUv: 0, distalUv: 9000 }, ...scatter })).toMatchObject({ changePercent: -100 });
  });

  it('refuses an amplitude outside its limits', () => {
    expect(() => amplitudeRatio({ baseline, current: { proximalUv: -1, distalUv: 9000 }, ...scatter })).toThrow(RangeError);
  });
});
