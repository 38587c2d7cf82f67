import { describe, expect, it } from 'vitest';

import { errorFactor } from '@/lib/change/error-factor';

describe('errorFactor', () => {
  // √2, √1.5, √(4/3), √1.25 from a table of roots.
  it.each([[1, 1.4142], [2, 1.2247], [3, 1.1547], [4, 1.118]])('of %i runs is %f', (baselineRunCount, expected) => {
    expect(errorFactor(baselineRunCount)).toBeCloseTo(expected, 4);
  });

  it.each([0, -1, 2.5, 1001, Number.NaN])('refuses %s runs', (baselineRunCount) => {
    expect(() => errorFactor(baselineRunCount)).toThrow(RangeError);
  });
});
