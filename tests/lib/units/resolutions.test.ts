import { describe, expect, it } from 'vitest';

import { resolutions } from '@/lib/units/resolutions';

describe('resolutions', () => {
  it('are those that entries are promised in', () => {
    expect(resolutions).toMatchObject({ timeMs: 0.001, amplitudeUv: 0.01, velocityMps: 0.01, percent: 0.1 });
  });

  it('separate the threshold limit of 0.3 mA into steps', () => {
    expect(0.3 / resolutions.intensityMa).toBeGreaterThanOrEqual(10);
  });
});
