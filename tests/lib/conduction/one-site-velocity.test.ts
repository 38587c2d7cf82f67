import { describe, expect, it } from 'vitest';

import { oneSiteVelocity } from '@/lib/conduction/one-site-velocity';

describe('oneSiteVelocity', () => {
  it('takes distance over onset with the error of one mark', () => {
    const result = oneSiteVelocity({ distanceMm: 140, onsetMs: 2.5, distanceErrorMm: 0, markerErrorMs: 0.05 });
    // 56 m/s, and one mark of 0.05 in 2.5 ms is 2 % of it: 1.12 m/s, by hand.
    expect(result).toMatchObject({ kind: 'velocity', velocityMps: 56, conductionTimeMs: 2.5 });
    expect(result).toHaveProperty('standardErrorMps', expect.closeTo(1.12, 6));
  });

  it('is not computable without a distance', () => {
    expect(oneSiteVelocity({ distanceMm: null, onsetMs: 2.5 })).toEqual({ kind: 'not-computable', reason: 'distance-missing' });
  });

  it('asks back 14 cm typed as 14 mm', () => {
    expect(oneSiteVelocity({ distanceMm: 14, onsetMs: 2.5 })).toMatchObject({
      plausibility: { kind: 'ask-back', cause: 'centimetres-typed-as-millimetres' },
    });
  });

  it.each([0, -2, Number.NaN, 101])('refuses an onset of %s ms, distance or not', (onsetMs) => {
    expect(() => oneSiteVelocity({ distanceMm: 140, onsetMs })).toThrow(RangeError);
    expect(() => oneSiteVelocity({ distanceMm: null, onsetMs })).toThrow(RangeError);
  });
});
