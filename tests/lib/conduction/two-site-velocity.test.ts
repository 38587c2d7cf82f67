import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { twoSiteVelocity } from '@/lib/conduction/two-site-velocity';
import type { Velocity } from '@/lib/conduction/velocity-result';

const velocityOf = (distanceMm: number, proximalOnsetMs: number, distalOnsetMs: number): Velocity => {
  const result = twoSiteVelocity({ distanceMm, proximalOnsetMs, distalOnsetMs });
  if (result.kind !== 'velocity') throw new Error(`Expected a velocity, got ${result.reason}`);
  return result;
};

const distance = fc.double({ min: 1, max: 750, noNaN: true });
const distalOnset = fc.integer({ min: 100, max: 40_000 }).map((steps) => steps / 1000);
const time = fc.integer({ min: 1, max: 40_000 }).map((steps) => steps / 1000);

describe('twoSiteVelocity', () => {
  it('gives velocity, error, distance and time together', () => {
    const result = velocityOf(100, 4, 2);
    expect(result).toMatchObject({ velocityMps: 50, distanceMm: 100, conductionTimeMs: 2, isShort: false, plausibility: 'plausible' });
    // 50 * sqrt(0.02² + 2 * 0.025²), by hand.
    expect(result.standardErrorMps).toBeCloseTo(2.031, 3);
  });

  it.each([
    ['latencies-equal', 100, 4, 4],
    ['latencies-exchanged', 100, 2, 4],
    ['distance-missing', null, 4, 2],
  ] as const)('is not computable: %s', (reason, distanceMm, proximalOnsetMs, distalOnsetMs) => {
    expect(twoSiteVelocity({ distanceMm, proximalOnsetMs, distalOnsetMs })).toEqual({ kind: 'not-computable', reason });
  });

  it('marks a segment short below 80 mm, not at 80 mm', () => {
    expect(velocityOf(79.9, 4, 2.5).isShort).toBe(true);
    expect(velocityOf(80, 4, 2.5).isShort).toBe(false);
  });

  it('asks back 245 mm typed as 24.5 and names the cause', () => {
    expect(velocityOf(24.5, 6.5, 2.7).plausibility).toEqual({ kind: 'ask-back', cause: 'centimetres-typed-as-millimetres' });
  });

  it('uses the errors it is given', () => {
    const exact = twoSiteVelocity({ distanceMm: 100, proximalOnsetMs: 4, distalOnsetMs: 2, distanceErrorMm: 0, markerErrorMs: 0 });
    expect(exact).toMatchObject({ standardErrorMps: 0 });
  });

  it.each([0, -245, 1500.1, Number.POSITIVE_INFINITY])('refuses a distance of %s mm', (distanceMm) => {
    expect(() => twoSiteVelocity({ distanceMm, proximalOnsetMs: 4, distalOnsetMs: 2 })).toThrow(RangeError);
  });

  it('doubles with the distance and rises with it', () => {
    fc.assert(
      fc.property(distance, distalOnset, time, (distanceMm, distalOnsetMs, timeMs) => {
        const single = velocityOf(distanceMm, distalOnsetMs + timeMs, distalOnsetMs);
        const double = velocityOf(2 * distanceMm, distalOnsetMs + timeMs, distalOnsetMs);
        expect(double.velocityMps).toBeCloseTo(2 * single.velocityMps, 6);
        expect(double.velocityMps).toBeGreaterThan(single.velocityMps);
      }),
    );
  });

  it('is unchanged when both onsets shift alike', () => {
    fc.assert(
      fc.property(distance, distalOnset, time, fc.integer({ min: 0, max: 20_000 }), (distanceMm, distalOnsetMs, timeMs, steps) => {
        const shiftMs = steps / 1000;
        const before = velocityOf(distanceMm, distalOnsetMs + timeMs, distalOnsetMs);
        const after = velocityOf(distanceMm, distalOnsetMs + timeMs + shiftMs, distalOnsetMs + shiftMs);
        expect(after.conductionTimeMs).toBe(before.conductionTimeMs);
        expect(after.velocityMps).toBe(before.velocityMps);
      }),
    );
  });

  it('throws nothing but RangeError and holds no NaN or Infinity, whatever numbers come', () => {
    const anyNumber = fc.oneof(fc.double(), fc.double({ min: -10, max: 200, noNaN: true }));
    fc.assert(
      fc.property(fc.option(anyNumber), anyNumber, anyNumber, (distanceMm, proximalOnsetMs, distalOnsetMs) => {
        try {
          const result = twoSiteVelocity({ distanceMm, proximalOnsetMs, distalOnsetMs });
          const numbers = Object.values(result).filter((value) => typeof value === 'number');
          expect(numbers.every(Number.isFinite)).toBe(true);
        } catch (error) {
          expect(error).toBeInstanceOf(RangeError);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
