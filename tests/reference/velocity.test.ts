import { describe, expect, it } from 'vitest';

import { oneSiteVelocity } from '@/lib/conduction/one-site-velocity';
import { twoSiteVelocity } from '@/lib/conduction/two-site-velocity';
import { velocityCases, type VelocityCase } from '@/tests/reference/velocity-cases';

/** Why a computed velocity may differ from the figure of the source, and by how much. */
const tolerances: Readonly<Record<VelocityCase['kind'], { readonly mps: number; readonly reason: string }>> = {
  printed: { mps: 0.05, reason: 'half of the last digit printed' },
  mean: { mps: 0.1, reason: 'a mean of velocities is not the velocity of the means, and the distance is rounded' },
  worked: { mps: 0.0005, reason: 'four decimals worked by hand' },
};

function velocityOf(sample: VelocityCase) {
  const { distanceMm, proximalOnsetMs, distalOnsetMs } = sample;
  return distalOnsetMs === null
    ? oneSiteVelocity({ distanceMm, onsetMs: proximalOnsetMs })
    : twoSiteVelocity({ distanceMm, proximalOnsetMs, distalOnsetMs });
}

describe('velocity against values from outside', () => {
  it.each(velocityCases.map((sample) => [sample.name, sample] as const))('%s', (_name, sample) => {
    const result = velocityOf(sample);
    if (result.kind !== 'velocity') throw new Error(`Expected a velocity, got ${result.reason}`);
    expect(Math.abs(result.velocityMps - sample.expectedMps), sample.source).toBeLessThanOrEqual(tolerances[sample.kind].mps);
  });

  it('drops no sample: 16 cases, each with a velocity, a source and a plausible value', () => {
    expect(velocityCases).toHaveLength(16);
    expect(velocityCases.filter((sample) => velocityOf(sample).kind !== 'velocity')).toEqual([]);
    expect(velocityCases.filter((sample) => sample.source.length < 20)).toEqual([]);
    expect(new Set(velocityCases.map((sample) => sample.name)).size).toBe(16);
  });

  it('would notice an error of one unit in the last digit printed', () => {
    const wrong = velocityCases.filter((sample) => sample.kind === 'printed').map((sample) => {
      const result = velocityOf(sample);
      return result.kind === 'velocity' && Math.abs(result.velocityMps - (sample.expectedMps + 0.2)) > tolerances.printed.mps;
    });
    expect(wrong.every(Boolean)).toBe(true);
  });
});
