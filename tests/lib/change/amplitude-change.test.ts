import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { amplitudeChange } from '@/lib/change/amplitude-change';

const scatter = { coefficientOfVariation: 0.08, baselineRunCount: 3 };
const amplitude = fc.double({ min: 1, max: 50_000, noNaN: true });

describe('amplitudeChange', () => {
  it.each([
    ['a loss', 8000, 3000, 37.5, -62.5],
    ['a small muscle', 320, 121, 37.8, -62.2],
    ['no change', 7200, 7200, 100, 0],
    ['a rise, which is a result', 1000, 1736, 173.6, 73.6],
    ['nothing left', 8000, 0, 0, -100],
    ['a limit that binary noise would miss', 6, 3, 50, -50],
  ])('gives percent of baseline and signed change for %s', (_case, baselineUv, currentUv, percentOfBaseline, changePercent) => {
    expect(amplitudeChange({ baselineUv, currentUv, ...scatter })).toMatchObject({ kind: 'change', percentOfBaseline, changePercent });
  });

  it.each([
    // 100 · ratio · scatter · √(1 + 1/n), by hand.
    [8000, 8000, 0.08, 3, 9.2],
    [8000, 4000, 0.08, 3, 4.6],
    [8000, 4000, 0.08, 1, 5.7],
    [8000, 0, 0.08, 3, 0],
    [8000, 8000, 0.03, 3, 3.5],
  ])('of %f to %f µV with scatter %f over %i runs errs by %f points', (baselineUv, currentUv, coefficientOfVariation, baselineRunCount, expected) => {
    const change = amplitudeChange({ baselineUv, currentUv, coefficientOfVariation, baselineRunCount });
    expect(change).toHaveProperty('standardErrorPercent', expected);
  });

  it('is not computable without a baseline response', () => {
    const absent = { kind: 'not-computable', reason: 'baseline-absent' };
    expect(amplitudeChange({ baselineUv: 0, currentUv: 3000, ...scatter })).toEqual(absent);
    expect(amplitudeChange({ baselineUv: 0.004, currentUv: 3000, ...scatter })).toEqual(absent);
    expect(amplitudeChange({ baselineUv: 0.005, currentUv: 3000, ...scatter }).kind).toBe('change');
  });

  it.each([
    { baselineUv: -1 },
    { currentUv: Number.NaN },
    { currentUv: 100_001 },
    { coefficientOfVariation: -0.1 },
    { baselineRunCount: 0 },
  ])('refuses %o', (wrong) => {
    expect(() => amplitudeChange({ baselineUv: 8000, currentUv: 8000, ...scatter, ...wrong })).toThrow(RangeError);
  });

  it('does not depend on the gain, and percent and change are one number', () => {
    fc.assert(
      fc.property(amplitude, amplitude, (baselineUv, currentUv) => {
        const single = amplitudeChange({ baselineUv, currentUv, ...scatter });
        const double = amplitudeChange({ baselineUv: 2 * baselineUv, currentUv: 2 * currentUv, ...scatter });
        expect(double).toEqual(single);
        if (single.kind !== 'change') throw new Error('Expected a change');
        expect(single.changePercent).toBeCloseTo(single.percentOfBaseline - 100, 6);
      }),
    );
  });
});
