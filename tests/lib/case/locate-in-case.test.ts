import { describe, expect, it } from 'vitest';

import { clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar } from '@/tests/support/ulnar-case';

const locationOf = (script: CaseBuilder) => script.state.incidents['ulnar']?.location;

/** All sites good at 10:40, then above elbow at 38 % at 10:41:00. Every other site is stale from there. */
function changed(channels: readonly string[] = ['adm']): CaseBuilder {
  const script = monitoredUlnar(channels).at('10:41');
  script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
  return script;
}

describe('locateInCase', () => {
  it('locateInCase does not know from a stale distal site and names the next site to test', () => {
    // Unknown from above elbow (150 mm) to wrist (460 mm): the middle is 305 mm, below elbow (250 mm) is nearest.
    expect(locationOf(changed())).toEqual({ kind: 'not-known', nextSiteId: 'below-elbow' });
  });

  it('locateInCase asks for the wrist where below elbow is past a limit too', () => {
    const script = changed();
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow', 0.4) });
    expect(locationOf(script)).toEqual({ kind: 'not-known', nextSiteId: 'wrist' });
  });

  it('locateInCase gives the segment from fresh runs', () => {
    const script = changed();
    expect(script.wait(1000).run('below-elbow', { adm: adm('below-elbow') })).toEqual(['alert.located']);
    expect(locationOf(script)).toEqual({ kind: 'segment', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow' });
  });

  it('locateInCase halves the stretch: a good wrist leaves below elbow to test', () => {
    const script = changed();
    script.wait(1000).run('wrist', { adm: adm('wrist') });
    expect(locationOf(script)).toEqual({ kind: 'not-known', nextSiteId: 'below-elbow' });
  });

  it('locateInCase places the change outside where the most distal site is past a limit too', () => {
    const script = changed();
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow', 0.4) });
    script.wait(1000).run('wrist', { adm: adm('wrist', 0.4) });
    expect(locationOf(script)).toEqual({ kind: 'outside' });
  });

  it('locateInCase does not know where a proximal site is good and a distal one is not: the distal one is to be repeated', () => {
    const script = changed();
    script.wait(1000).run('axilla', { adm: adm('axilla') });
    expect(locationOf(script)).toEqual({ kind: 'not-known', nextSiteId: 'above-elbow' });
  });

  it('locateInCase takes no evidence from a late entry made before the first abnormal run', () => {
    const script = changed();
    script.wait(60_000).run('below-elbow', { adm: adm('below-elbow') }, {}, { eventAt: clock('10:40:59.999') });
    expect(locationOf(script)).toEqual({ kind: 'not-known', nextSiteId: 'below-elbow' });
  });

  it('locateInCase takes no evidence from a run that is not compared or whose amplitude was not read', () => {
    const script = changed();
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') }, { pulseWidthUs: 500 });
    script.wait(1000).run('below-elbow', { adm: { kind: 'measured', onsetMs: 6.46, amplitudeUv: null, durationMs: null } });
    expect(locationOf(script)).toEqual({ kind: 'not-known', nextSiteId: 'below-elbow' });
  });

  it('locateInCase calls a site abnormal when one of its muscles is', () => {
    const script = changed(['adm', 'fdi']);
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow'), fdi: fdiAt('below-elbow', 0.4) });
    script.wait(1000).run('wrist', { adm: adm('wrist'), fdi: fdiAt('wrist') });
    expect(locationOf(script)).toEqual({ kind: 'segment', proximalSiteId: 'below-elbow', distalSiteId: 'wrist' });
  });

  it('locateInCase keeps what was found while a path comes back', () => {
    const script = changed();
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') });
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow') });
    expect(locationOf(script)).toEqual({ kind: 'segment', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow' });
  });

  it('locateInCase finds no place within a nerve that has one site', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('median-wrist', { apb: { kind: 'absent', highestIntensityMa: 15 } });
    expect(script.state.incidents['median']?.location).toEqual({ kind: 'outside' });
  });
});
