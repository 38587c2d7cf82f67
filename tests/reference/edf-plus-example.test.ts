import { describe, expect, it } from 'vitest';

import { amplitudeRatio } from '@/lib/change/amplitude-ratio';
import { twoSiteVelocity } from '@/lib/conduction/two-site-velocity';

/**
 * The motor nerve conduction file that the EDF+ specification prints: right wrist, 0.2 ms, 8.2 mA, 6.5 cm
 * from the recording, 7.2 mV at 3.8 ms; right elbow, 0.2 ms, 15.3 mA, 28.5 cm, 7.2 mV at 7.8 ms, 55.0 m/s.
 */
const wrist = { distanceMm: 65, onsetMs: 3.8, amplitudeUv: 7200 };
const elbow = { distanceMm: 285, onsetMs: 7.8, amplitudeUv: 7200 };

describe('the motor nerve conduction file of the EDF+ specification', () => {
  it('conducts at 55.0 m/s, is long enough and believed', () => {
    const velocity = twoSiteVelocity({
      distanceMm: elbow.distanceMm - wrist.distanceMm,
      proximalOnsetMs: elbow.onsetMs,
      distalOnsetMs: wrist.onsetMs,
    });
    expect(velocity).toMatchObject({ kind: 'velocity', isShort: false, plausibility: 'plausible' });
    expect(velocity).toHaveProperty('velocityMps', expect.closeTo(55, 6));
  });

  it('shows no fall from wrist to elbow', () => {
    const sites = { proximalUv: elbow.amplitudeUv, distalUv: wrist.amplitudeUv };
    const ratio = amplitudeRatio({ baseline: sites, current: sites, coefficientOfVariation: 0.08, baselineRunCount: 1 });
    expect(ratio).toMatchObject({ kind: 'ratio', ratio: 1, changePercent: 0 });
  });
});
