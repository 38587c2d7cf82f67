import { describe, expect, it } from 'vitest';

import { isBeyondNoise } from '@/lib/change/is-beyond-noise';

describe('isBeyondNoise', () => {
  it.each([
    [-18.5, 9.2, true],
    [-18.4, 9.2, false],
    [18.5, 9.2, true],
    [0, 0, false],
    [0.1, 0, true],
  ])('a change of %f with an error of %f: %s', (change, standardError, expected) => {
    expect(isBeyondNoise({ change, standardError })).toBe(expected);
  });

  it.each([
    [Number.NaN, 1],
    [1, Number.POSITIVE_INFINITY],
    [1, -0.1],
  ])('refuses a change of %s with an error of %s', (change, standardError) => {
    expect(() => isBeyondNoise({ change, standardError })).toThrow(RangeError);
  });
});
