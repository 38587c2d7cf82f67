import { describe, expect, it } from 'vitest';

import { velocityPlausibility } from '@/lib/conduction/velocity-plausibility';

describe('velocityPlausibility', () => {
  it.each([
    ['exactly the lower limit', 10],
    ['the lower limit at the resolution shown', 9.996],
    ['a usual motor nerve', 55],
    ['exactly the upper limit', 120],
    ['the upper limit at the resolution shown', 120.004],
  ])('believes %s', (_case, velocityMps) => {
    expect(velocityPlausibility(velocityMps)).toBe('plausible');
  });

  it.each([
    [9.99, 'centimetres-typed-as-millimetres'],
    [6.45, 'centimetres-typed-as-millimetres'],
    [1, 'centimetres-typed-as-millimetres'],
    [0.99, 'check-distance-and-latencies'],
    [120.01, 'check-distance-and-latencies'],
    [550, 'check-distance-and-latencies'],
  ])('asks %s m/s back: %s', (velocityMps, cause) => {
    expect(velocityPlausibility(velocityMps)).toEqual({ kind: 'ask-back', cause });
  });

  it.each([0, -5, Number.NaN, Number.POSITIVE_INFINITY])('refuses %s m/s, which no computation here gives', (velocityMps) => {
    expect(() => velocityPlausibility(velocityMps)).toThrow(RangeError);
  });
});
