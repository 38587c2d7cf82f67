import { describe, expect, it } from 'vitest';

import type { CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

/** Above to below elbow: 1.85 ms at baseline; 0.45 ms more is +24.3 %. Of the onset above elbow, 8.31 ms, it is 5.4 %. */
const slow = adm('above-elbow', 1, 0.45);
const good = adm('above-elbow');
const incidentOf = (script: CaseBuilder) => script.state.incidents['ulnar'];

/** A notice of slowing: above elbow later, the wrist side as it was a few seconds before. */
function slowed(): CaseBuilder {
  const script = monitoredUlnar().at('10:41');
  script.run('below-elbow', { adm: adm('below-elbow') });
  script.wait(1000).run('above-elbow', { adm: slow });
  return script;
}

describe('decide, a slowed segment', () => {
  it('decide raises a notice of a slowed segment from a fresh pair and asks for its distal end', () => {
    const script = slowed();
    expect(incidentOf(script)).toMatchObject({
      level: 'notice', finding: 'segment-slowed', pathIds: ['above-elbow/adm'], badSegments: [{ key: 'adm|above-elbow|below-elbow', measure: 'time' }],
      location: { kind: 'not-known', nextSiteId: 'below-elbow' },
    });
  });

  it('decide makes it an alert by the repeat at the same site, never settles it by that', () => {
    const script = slowed();
    expect(script.wait(5000).run('above-elbow', { adm: slow })).toEqual(['alert.raised']);
  });

  it('decide settles it by a repeat whose pair is inside its limit again', () => {
    const script = slowed();
    expect(script.wait(5000).run('above-elbow', { adm: good })).toEqual(['notice.settled']);
  });

  it('decide does not take a repeat without an onset for the repeat', () => {
    const script = slowed();
    script.wait(5000).run('above-elbow', { adm: { kind: 'measured', onsetMs: null, amplitudeUv: 8900, durationMs: null } });
    expect(incidentOf(script)?.level).toBe('notice');
    expect(script.at('10:42:31').timers()).toEqual(['alert.raised']);
  });

  it('decide names the segment once both of its ends are fresh', () => {
    const script = slowed();
    script.wait(5000).run('above-elbow', { adm: slow });
    expect(script.wait(5000).run('below-elbow', { adm: adm('below-elbow') })).toEqual(['alert.located']);
    expect(incidentOf(script)?.location).toEqual({ kind: 'segment', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow' });
  });

  it('decide shows the recovery of a slowed segment only by a fresh pair', () => {
    const script = slowed();
    script.wait(5000).run('above-elbow', { adm: slow });
    script.wait(5000).run('above-elbow', { adm: good });
    script.wait(5000).run('above-elbow', { adm: good });
    expect(incidentOf(script)?.recoveredAt).toBeNull();
    expect(script.wait(5000).run('below-elbow', { adm: adm('below-elbow') })).toEqual(['alert.recovered']);
  });

  it('decide takes no pair that spans a risk step, at its very time either', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('below-elbow', { adm: adm('below-elbow') });
    script.wait(1000).step('nerve-lifted');
    expect(script.run('above-elbow', { adm: slow })).toEqual([]);
    expect(script.wait(1000).run('above-elbow', { adm: slow })).toEqual([]);
    expect(script.wait(1000).run('below-elbow', { adm: adm('below-elbow') })).toEqual(['notice.raised']);
  });

  it('decide takes no pair whose older run was made at the very time of the risk step', () => {
    const script = monitoredUlnar().at('10:41');
    script.step('nerve-lifted');
    script.run('below-elbow', { adm: adm('below-elbow') });
    expect(script.wait(1000).run('above-elbow', { adm: slow })).toEqual([]);
  });

  it('decide lets a distal run that only completes the pair confirm nothing', () => {
    const script = monitoredUlnar().at('10:41');
    script.step('nerve-lifted');
    script.wait(1000).run('above-elbow', { adm: slow });
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') });
    expect(script.wait(1000).run('below-elbow', { adm: adm('below-elbow') })).not.toContain('alert.raised');
    expect(incidentOf(script)?.level).toBe('notice');
    expect(script.wait(1000).run('above-elbow', { adm: slow })).toEqual(['alert.raised']);
  });

  it('decide lets a ratio that fell reach a notice at most', () => {
    // Above elbow at 78 % while below elbow keeps 100 %: −22 %, and −22 % of the response itself is no watch.
    const script = monitoredUlnar().at('10:41');
    script.run('below-elbow', { adm: adm('below-elbow') });
    expect(script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.78) })).toEqual(['notice.raised']);
    expect(incidentOf(script)).toMatchObject({ finding: 'ratio-fall', repeatDueAt: null });
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.78) })).toEqual([]);
    expect(script.at('10:55').timers()).toEqual([]);
    expect(script.run('above-elbow', { adm: good })).toEqual(['notice.settled']);
  });

  it('decide voids the distances by a transposition and lets no slowing of unknown length become an alert', () => {
    const script = monitoredUlnar().at('10:41');
    script.step('nerve-transposed');
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') });
    script.wait(1000).run('above-elbow', { adm: slow });
    expect(script.state.segments['adm|above-elbow|below-elbow']).toMatchObject({ velocity: { kind: 'not-computable', reason: 'distances-not-measured' } });
    expect(incidentOf(script)).toMatchObject({ level: 'notice', repeatDueAt: null });
    script.wait(1000).run('above-elbow', { adm: slow });
    expect(incidentOf(script)?.level).toBe('notice');
    const positions = [0, 150, 240, 450].map((positionMm, index) => ({ siteId: ['axilla', 'above-elbow', 'below-elbow', 'wrist'][index]!, positionMm }));
    script.give({ name: 'measure-distances', nerveId: 'ulnar', positions, reason: 'Transposed' });
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow') });
    // 90 mm / (8.31 − 6.46) ms = 48.65 m/s.
    expect(script.state.segments['adm|above-elbow|below-elbow']).toMatchObject({ velocity: { kind: 'velocity', velocityMps: 48.65, distanceMm: 90 } });
  });
});
