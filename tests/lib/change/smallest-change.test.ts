import { describe, expect, it } from 'vitest';

import { smallestChange } from '@/lib/change/smallest-change';

describe('smallestChange', () => {
  it.each([
    // 200 · scatter · √(1 + 1/n), by hand.
    [0.08, 3, 18.5],
    [0.08, 1, 22.6],
    [0.03, 3, 6.9],
    [0.25, 3, 57.7],
    [0, 3, 0],
  ])('with scatter %f over %i runs is a loss of %f %%', (coefficientOfVariation, baselineRunCount, smallestLossPercent) => {
    expect(smallestChange({ coefficientOfVariation, baselineRunCount })).toEqual({ smallestLossPercent });
  });

  it('refuses a scatter outside its limits', () => {
    expect(() => smallestChange({ coefficientOfVariation: -0.01, baselineRunCount: 3 })).toThrow(RangeError);
  });
});
