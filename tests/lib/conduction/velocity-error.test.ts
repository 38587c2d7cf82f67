import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { velocityError, type VelocityErrorInput } from '@/lib/conduction/velocity-error';

const usual: VelocityErrorInput = { distanceMm: 100, conductionTimeMs: 2, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 2 };

describe('velocityError', () => {
  it('is the distance share alone when marks are exact', () => {
    expect(velocityError({ ...usual, markerErrorMs: 0 })).toBeCloseTo(1, 12);
  });

  it('is the time share alone when the tape is exact', () => {
    expect(velocityError({ ...usual, distanceErrorMm: 0, markCount: 1 })).toBeCloseTo(1.25, 12);
  });

  it('is 0 for an exact measurement', () => {
    expect(velocityError({ ...usual, distanceErrorMm: 0, markerErrorMs: 0 })).toBe(0);
  });

  it('grows in proportion for a faster nerve with the same marks', () => {
    const share = (timeMs: number) => velocityError({ ...usual, conductionTimeMs: timeMs }) / (usual.distanceMm / timeMs);
    expect(share(1.5)).toBeGreaterThan(share(2));
  });

  it('doubles when both errors double', () => {
    const error = fc.double({ min: 0, max: 2.5, noNaN: true });
    fc.assert(
      fc.property(error, error, (distanceErrorMm, markerErrorMs) => {
        const single = velocityError({ ...usual, distanceErrorMm, markerErrorMs });
        const double = velocityError({ ...usual, distanceErrorMm: 2 * distanceErrorMm, markerErrorMs: 2 * markerErrorMs });
        expect(double).toBeCloseTo(2 * single, 9);
      }),
    );
  });

  it.each([
    { distanceMm: 0 },
    { conductionTimeMs: 0 },
    { conductionTimeMs: -1 },
    { distanceErrorMm: -1 },
    { markerErrorMs: Number.NaN },
  ])('refuses %o', (wrong) => {
    expect(() => velocityError({ ...usual, ...wrong })).toThrow(RangeError);
  });
});
