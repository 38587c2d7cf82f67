import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { baselineScatter } from '@/lib/change/baseline-scatter';

describe('baselineScatter', () => {
  it('takes the sample standard deviation over the mean from three runs', () => {
    // 9, 10, 11 mV: mean 10, sum of squares 2, divided by n − 1 = 2, standard deviation 1.
    expect(baselineScatter({ amplitudesUv: [9000, 10000, 11000] })).toEqual({
      coefficientOfVariation: 0.1,
      baselineRunCount: 3,
      isAssumed: false,
    });
  });

  it('takes the textbook series 2, 4, 4, 4, 5, 5, 7, 9', () => {
    // Mean 5, sum of squares 32, sample variance 32 / 7; 2.1381 / 5 = 0.4276.
    expect(baselineScatter({ amplitudesUv: [2, 4, 4, 4, 5, 5, 7, 9] }).coefficientOfVariation).toBe(0.4276);
  });

  it.each([[[8000]], [[8000, 8800]]])('assumes 0.08 for the runs %o', (amplitudesUv) => {
    expect(baselineScatter({ amplitudesUv })).toEqual({
      coefficientOfVariation: 0.08,
      baselineRunCount: amplitudesUv.length,
      isAssumed: true,
    });
  });

  it('assumes the figure of the case where one is given', () => {
    expect(baselineScatter({ amplitudesUv: [8000], assumedCoefficientOfVariation: 0.12 }).coefficientOfVariation).toBe(0.12);
  });

  it('does not believe three equal runs', () => {
    expect(baselineScatter({ amplitudesUv: [8000, 8000, 8000] })).toMatchObject({ coefficientOfVariation: 0.03, isAssumed: false });
  });

  it('assumes scatter for runs whose mean is 0', () => {
    expect(baselineScatter({ amplitudesUv: [0, 0, 0] })).toMatchObject({ coefficientOfVariation: 0.08, isAssumed: true });
  });

  it.each([[[]], [[-1, 2, 3]], [[1, Number.NaN, 3]], [[1, 100_001, 3]]])('refuses the runs %o', (amplitudesUv) => {
    expect(() => baselineScatter({ amplitudesUv })).toThrow(RangeError);
  });

  it('does not depend on the gain and does not modify the runs', () => {
    const runs = fc.array(fc.integer({ min: 1000, max: 9000 }), { minLength: 3, maxLength: 9 });
    fc.assert(
      fc.property(runs, (amplitudesUv) => {
        const copy = [...amplitudesUv];
        const doubled = amplitudesUv.map((amplitudeUv) => 2 * amplitudeUv);
        const single = baselineScatter({ amplitudesUv }).coefficientOfVariation;
        expect(baselineScatter({ amplitudesUv: doubled }).coefficientOfVariation).toBeCloseTo(single, 3);
        expect(amplitudesUv).toEqual(copy);
      }),
    );
  });
});
