import { describe, expect, it } from 'vitest';

import { velocityError } from '@/lib/conduction/velocity-error';
import { normalDraws, spread } from '@/tests/reference/normal-draws';

/** First-order law worked by hand at 50 m/s; tape and mark errors as one standard deviation each. */
const usualErrors: readonly (readonly [number, number])[] = [
  [20, 10.16], [40, 5.08], [60, 3.39], [100, 2.03], [200, 1.02], [250, 0.81],
];
/** The same in percent for older equipment: 5 mm and 0.1 ms. */
const olderErrorsPercent: readonly (readonly [number, number])[] = [
  [20, 43.3], [40, 21.7], [60, 14.4], [100, 8.7], [200, 4.3], [250, 3.5],
];
/** Worst case at 55 m/s with 2 mm and 0.1 ms off together, worked by hand to whole m/s. */
const worstCases: readonly (readonly [number, number, number])[] = [
  [20, 39, 83], [40, 46, 67], [60, 49, 63], [80, 50, 61], [100, 51, 59], [120, 52, 59], [200, 53, 57],
];

describe('velocityError against the first-order law', () => {
  it.each(usualErrors)('at %i mm and 50 m/s is %f m/s', (distanceMm, expectedMps) => {
    const error = velocityError({ distanceMm, conductionTimeMs: distanceMm / 50, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 2 });
    expect(Math.abs(error - expectedMps)).toBeLessThanOrEqual(0.0051);
  });

  it.each(olderErrorsPercent)('at %i mm with older equipment is %f %%', (distanceMm, expectedPercent) => {
    const error = velocityError({ distanceMm, conductionTimeMs: distanceMm / 50, distanceErrorMm: 5, markerErrorMs: 0.1, markCount: 2 });
    expect(Math.abs(error * 2 - expectedPercent)).toBeLessThanOrEqual(0.051);
  });

  it.each(worstCases)('at %i mm stays below half of the worst case of %i to %i m/s', (distanceMm, slowestMps, fastestMps) => {
    const error = velocityError({ distanceMm, conductionTimeMs: distanceMm / 55, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 2 });
    expect(error).toBeLessThan((fastestMps - slowestMps + 1) / 2);
    expect(error).toBeGreaterThan((fastestMps - slowestMps - 1) / 8);
  });
});

describe('velocityError against random draws', () => {
  const draw = normalDraws(20);
  const velocities = Array.from({ length: 200_000 }, () => {
    const distanceMm = 100 + 2 * draw();
    return distanceMm / (4 + 0.05 * draw() - (2 + 0.05 * draw()));
  });
  const { mean, deviation } = spread(velocities);
  const error = velocityError({ distanceMm: 100, conductionTimeMs: 2, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 2 });

  it('lies within 2 % of their standard deviation', () => {
    expect(Math.abs(error / deviation - 1)).toBeLessThan(0.02);
  });

  it('finds the positive bias of a quotient: mean 50.07, deviation 2.04', () => {
    expect(mean).toBeCloseTo(50.07, 1);
    expect(mean).toBeGreaterThan(50.03);
    expect(Math.abs(deviation - 2.04)).toBeLessThan(0.02);
  });

  it('would notice a single mark counted instead of two', () => {
    const wrong = velocityError({ distanceMm: 100, conductionTimeMs: 2, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 1 });
    expect(Math.abs(wrong / deviation - 1)).toBeGreaterThan(0.02);
  });
});
