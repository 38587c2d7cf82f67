import { describe, expect, it } from 'vitest';

import { measurementErrors } from '@/lib/conduction/measurement-errors';
import { shortSegmentMm } from '@/lib/conduction/short-segment-mm';
import { velocityError } from '@/lib/conduction/velocity-error';
import { velocityResult } from '@/lib/conduction/velocity-result';

describe('velocityResult', () => {
  it('assumes a tape error of 2 mm and a mark error of 0.05 ms where none are given', () => {
    const assumed = velocityResult({ distanceMm: 100, conductionTimeMs: 2, markCount: 2 });
    const given = velocityError({ distanceMm: 100, conductionTimeMs: 2, distanceErrorMm: 2, markerErrorMs: 0.05, markCount: 2 });
    expect(assumed.standardErrorMps).toBe(given);
  });

  it('asks back an impossible velocity and still shows it', () => {
    expect(velocityResult({ distanceMm: 300, conductionTimeMs: 2, markCount: 2 })).toMatchObject({
      velocityMps: 150,
      plausibility: { kind: 'ask-back', cause: 'check-distance-and-latencies' },
    });
  });
});

describe('the assumptions of a velocity', () => {
  it('carry their origin: our own choice', () => {
    expect(measurementErrors).toMatchObject({ distanceErrorMm: 2, markerErrorMs: 0.05, source: 'house' });
    expect(shortSegmentMm).toMatchObject({ value: 80, source: 'house' });
  });
});
