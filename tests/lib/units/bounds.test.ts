import { describe, expect, it } from 'vitest';

import { assertWithin } from '@/lib/units/assert-within';
import { bounds, type Bound } from '@/lib/units/bounds';

/** Written by hand from the field list of the product, so that a limit cannot move unseen. */
const expected: Readonly<Record<keyof typeof bounds, readonly [number, number]>> = {
  onsetMs: [0.1, 100],
  conductionTimeMs: [0.001, 100],
  peakMs: [0.1, 200],
  durationMs: [0.1, 100],
  amplitudeUv: [0, 100_000],
  areaMvMs: [0, 1_000],
  noiseUv: [0, 10_000],
  distanceMm: [1, 1_500],
  positionMm: [0, 1_500],
  intensityMa: [0, 100],
  pulseWidthUs: [10, 2_000],
  stimulusRateHz: [0.1, 100],
  temperatureC: [15, 45],
  trainOfFourCount: [0, 4],
  trainOfFourRatio: [0, 1.5],
  cuffPressureMmHg: [0, 600],
  meanPressureMmHg: [10, 250],
  distanceErrorMm: [0, 50],
  markerErrorMs: [0, 5],
  coefficientOfVariation: [0, 10],
  runCount: [1, 1_000],
};

const rows = Object.entries(expected).map(([field, [min, max]]) => ({ field, min, max }));
const boundOf = (field: string): Bound => {
  const bound = Object.entries(bounds).find(([name]) => name === field)?.[1];
  if (!bound) throw new Error(`No bound named ${field}`);
  return bound;
};

describe('bounds', () => {
  it('holds exactly the fields of the table', () => {
    expect(Object.keys(bounds).sort()).toEqual(Object.keys(expected).sort());
  });

  it.each(rows)('$field allows $min and $max and nothing beyond', ({ field, min, max }) => {
    const bound = boundOf(field);
    const step = 0.0001;
    expect(() => assertWithin(min, bound, field)).not.toThrow();
    expect(() => assertWithin(max, bound, field)).not.toThrow();
    expect(() => assertWithin(min - step, bound, field)).toThrow(RangeError);
    expect(() => assertWithin(max + step, bound, field)).toThrow(RangeError);
  });

  it.each(rows)('$field gives its reason in a sentence', ({ field }) => {
    expect(boundOf(field).reason).toMatch(/^[A-Z].{20,}[^.]$/);
  });
});
