import { describe, expect, it } from 'vitest';

import { nerveStatus } from '@/lib/case/nerve-status';
import { watchedOf } from '@/lib/case/watched-of';
import { absent, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const ulnarOf = (script: CaseBuilder) => script.state.plan.nerves[0]!;
const status = (script: CaseBuilder) => nerveStatus(script.state, ulnarOf(script), script.nowMs);

describe('nerveStatus', () => {
  it('nerveStatus knows nothing of a new case', () => {
    expect(status(openedCase())).toMatchObject({ siteCount: 4, baselineSiteCount: 0, freshSiteCount: 0, newestComparedAt: null, lowest: null, highest: null, watched: null });
  });

  it('nerveStatus counts sites, not channels', () => {
    expect(status(monitoredUlnar(['adm', 'fdi']))).toMatchObject({ siteCount: 4, baselineSiteCount: 4, freshSiteCount: 4, untestedSiteIds: [] });
  });

  it('nerveStatus names the untested sites from proximal to distal', () => {
    const script = monitoredUlnar().wait(1000);
    script.step('nerve-lifted');
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') });
    expect(status(script)).toMatchObject({ freshSiteCount: 1, untestedSiteIds: ['axilla', 'above-elbow', 'wrist'] });
  });

  it('nerveStatus gives lowest and highest with their sites', () => {
    const script = monitoredUlnar().wait(1000);
    script.run('wrist', { adm: adm('wrist', 1.3) });
    script.run('axilla', { adm: adm('axilla', 0.9) });
    expect(status(script)).toMatchObject({ lowest: { percentOfBaseline: 90, siteId: 'axilla' }, highest: { percentOfBaseline: 130, isBeyondNoise: true } });
  });
});

describe('watchedOf', () => {
  it('watchedOf puts what is past a limit before what is watched, then the lowest', () => {
    const script = monitoredUlnar(['adm', 'fdi']).wait(1000);
    script.run('wrist', { adm: adm('wrist', 0.6), fdi: fdiAt('wrist', 0.62) });
    expect(watchedOf(script.state, ulnarOf(script))).toMatchObject({ percentOfBaseline: 60, isPastLimit: false, isLost: false });
    script.run('wrist', { adm: adm('wrist', 0.6), fdi: absent(15) });
    expect(watchedOf(script.state, ulnarOf(script))).toMatchObject({ percentOfBaseline: 0, isPastLimit: true, isLost: true });
  });

  it('watchedOf sees a segment past its limit', () => {
    const script = monitoredUlnar().wait(1000);
    script.run('above-elbow', { adm: adm('above-elbow', 1, 0.45) });
    expect(watchedOf(script.state, ulnarOf(script))).toMatchObject({ percentOfBaseline: null, isPastLimit: true });
  });
});
