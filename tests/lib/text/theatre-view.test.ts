import { describe, expect, it } from 'vitest';

import { templates } from '@/lib/reference/templates/templates';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { headlineLength } from '@/lib/text/fit-headline';
import { absent, measured, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar, openedCase, testAll, ulnarBaseline, ulnarSites } from '@/tests/support/ulnar-case';

const nbsp = '\u00a0';
const lead = (script: CaseBuilder) => script.view().lead;
/** Alert above elbow at 38 %, confirmed at 10:41:20. */
function alerted(): CaseBuilder {
  const script = monitoredUlnar().at('10:41');
  script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
  script.at('10:41:20').run('above-elbow', { adm: adm('above-elbow', 0.38) });
  return script;
}

describe('theatreView, calm', () => {
  it('theatreView is stable with every site tested, and says when', () => {
    expect(lead(monitoredUlnar())).toMatchObject({ kind: 'stable', isCalm: true, headline: 'Stable', detail: `4 of 4 sites tested. Lowest 100${nbsp}% of baseline, at 10:30.` });
  });

  it('theatreView stays calm for exactly the freshness limit of 5 min, not 1 ms more', () => {
    const script = monitoredUlnar();
    const oldestMs = Date.parse(script.state.paths['axilla/adm']!.compared!.at);
    expect(script.view(oldestMs + 300_000).lead.kind).toBe('stable');
    expect(script.view(oldestMs + 300_001).lead).toMatchObject({ kind: 'not-tested', headline: `3 of 4 sites tested in the last 5${nbsp}min` });
  });

  it('theatreView takes calm back with a risk step, at its very time, and gives it back site by site', () => {
    const script = monitoredUlnar().wait(1000);
    script.step('nerve-lifted');
    script.run('axilla', { adm: adm('axilla') });
    expect(lead(script)).toMatchObject({ kind: 'not-tested', headline: 'Not tested since nerve lifted', detail: 'Nerve lifted 10:30. Last test 10:30.' });
    testAll(script);
    expect(lead(script)).toMatchObject({ kind: 'stable', detail: `4 of 4 sites tested since nerve lifted, 10:30. Lowest 100${nbsp}% of baseline, at 10:30.` });
  });

  it('theatreView takes no calm back with a step that cannot harm', () => {
    const script = monitoredUlnar().wait(1000);
    script.step('incision');
    expect(lead(script).kind).toBe('stable');
  });

  it('theatreView takes calm back with another step that is named by hand', () => {
    const script = monitoredUlnar().wait(1000);
    script.give({ name: 'log-step', stepId: 'other', label: 'Bone removed' });
    expect(lead(script)).toMatchObject({ headline: 'Not tested since bone removed' });
  });

  it('theatreView says improved only beyond noise', () => {
    // Scatter 3 % at 107 %: 2 · 3.7 = 7.4 points, more than 7; at 108 %: 7.5 points, less than 8.
    const script = monitoredUlnar().wait(1000);
    script.run('wrist', { adm: adm('wrist', 1.07) });
    expect(lead(script).kind).toBe('stable');
    script.wait(1000).run('wrist', { adm: adm('wrist', 1.08) });
    expect(lead(script)).toMatchObject({ kind: 'improved', isCalm: true, headline: `Ulnar improved, 108${nbsp}% of baseline` });
  });

  it('theatreView earns nothing from a run whose amplitude nobody read', () => {
    const script = monitoredUlnar().wait(1000);
    script.step('nerve-lifted');
    script.wait(1000);
    for (const site of ulnarSites) script.run(site, { adm: measured(ulnarBaseline[site].onsetMs, null) });
    expect(lead(script)).toMatchObject({ isCalm: false, kind: 'not-tested' });
  });

  it('theatreView lets a channel that nobody looked at neither earn nor spoil calm', () => {
    const script = monitoredUlnar(['adm', 'fdi']).wait(1000);
    script.run('above-elbow', { adm: { kind: 'not-read' }, fdi: fdiAt('above-elbow') });
    expect(lead(script).kind).toBe('stable');
    script.step('nerve-lifted');
    script.wait(1000);
    for (const site of ulnarSites) script.run(site, { adm: { kind: 'not-read' }, fdi: fdiAt(site) });
    expect(lead(script)).toMatchObject({ kind: 'not-tested', headline: 'Not tested since nerve lifted' });
  });

  it('theatreView is not calm by a run dated ahead of the clock', () => {
    const script = monitoredUlnar();
    expect(script.view(Date.parse(script.state.paths['wrist/adm']!.compared!.at) - 5001).lead.isCalm).toBe(false);
  });

  it('theatreView watches a muscle that is not required too', () => {
    const script = monitoredUlnar(['adm', 'fdi']).wait(1000);
    script.run('wrist', { adm: adm('wrist'), fdi: fdiAt('wrist', 0.65) });
    expect(lead(script)).toMatchObject({ kind: 'watch', isCalm: false, headline: `Ulnar at 65${nbsp}% of baseline`, detail: `Inside the limit of −50${nbsp}%, at 10:30.` });
  });

  it('theatreView does not call a nerve calm whose alert a person ended while it was past its limit', () => {
    const script = alerted();
    script.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'none', cause: 'surgical', text: null });
    testAll(script.wait(1000), ['adm'], 1);
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.give({ name: 'end-alert', alertId: 'ulnar-2', outcome: 'none', cause: 'surgical', text: null });
    expect(lead(script)).toMatchObject({ kind: 'watch', isCalm: false, headline: `Ulnar at 38${nbsp}% of baseline`, detail: 'Past its limit at 10:41.' });
  });
});

describe('theatreView, notice and alert', () => {
  it('theatreView says what changed, where once located, last good and first seen, after which step', () => {
    const script = monitoredUlnar();
    script.at('10:39:02').run('above-elbow', { adm: adm('above-elbow') });
    script.at('10:41:20').step('nerve-lifted');
    script.at('10:41:55').run('above-elbow', { adm: adm('above-elbow', 0.47, 1.33) });
    expect(lead(script)).toMatchObject({
      kind: 'notice', priority: 'medium', isFlashing: false, headline: `Ulnar at 47${nbsp}% of baseline`,
      detail: 'Where not known yet, test below elbow next. Repeat at the same current. Last good 10:39, first seen 10:41, after nerve lifted.',
    });
    script.at('10:42:12').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
    script.at('10:42:49').run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01) });
    expect(lead(script)).toMatchObject({
      kind: 'alert', priority: 'high', isFlashing: true, headline: `Ulnar at 38${nbsp}% of baseline`,
      detail: 'Between above and below elbow. Last good 10:39, first seen 10:41, after nerve lifted.',
    });
  });

  it('theatreView stops flashing once told and says when', () => {
    const script = alerted();
    script.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'Surgeon', how: 'Aloud', words: 'Ulnar at 38 per cent' });
    expect(lead(script)).toMatchObject({ kind: 'alert', isFlashing: false });
    expect(script.view().footer).toContain('Told 10:41');
  });

  it('theatreView says that an alert was not repeated', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.at('10:42:30').timers();
    expect(lead(script).detail).toContain('Not repeated');
  });

  it('theatreView says recovered without calm, and what is to be tested on', () => {
    const script = alerted();
    for (let count = 0; count < 2; count += 1) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.96) });
    expect(lead(script)).toMatchObject({ kind: 'recovered', priority: 'low', isCalm: false, isFlashing: false, headline: `Ulnar back at 96${nbsp}% of baseline` });
    script.wait(1000).step('nerve-lifted');
    expect(script.view().others.map((line) => line.headline)).toContain('Not tested since nerve lifted');
  });

  it.each([
    ['No ulnar response', (script: CaseBuilder): void => void script.run('wrist', { adm: absent(20) })],
    [`Ulnar later by 0.40${nbsp}ms`, (script: CaseBuilder): void => void script.run('wrist', { adm: adm('wrist', 1, 0.4) })],
    ['No control response', (script: CaseBuilder): void => void script.run('median-wrist', { apb: absent(20) })],
    // 100 mm / (1.85 + 0.45) ms = 43.5 m/s.
    [`Ulnar slower, 43${nbsp}m/s`, (script: CaseBuilder): void => void script.run('above-elbow', { adm: adm('above-elbow', 1, 0.45) })],
    ['Ulnar lower proximally', (script: CaseBuilder): void => void script.run('above-elbow', { adm: adm('above-elbow', 0.75) })],
  ] as const)('theatreView headline: %s', (headline, prepare) => {
    const script = monitoredUlnar().wait(1000);
    prepare(script);
    expect(lead(script)).toMatchObject({ kind: 'notice', headline });
  });

  it('theatreView gives the train-of-four with its time and whether it is older than the change', () => {
    const script = alerted();
    expect(script.view().footer).toContain('Train-of-four 4 of 4 at 10:10, before the change');
  });
});

describe('theatreView, several nerves', () => {
  const sciatic = templates.find((plan) => plan.templateId === 'sciatic-at-hip')!;
  const site = (id: string) => ({ [id.startsWith('tibial') || id === 'popliteal-fossa' ? 'gm' : 'ta']: measured(10, 5000) });
  const sites = sciatic.nerves.filter((nerve) => nerve.role === 'at-risk').flatMap((nerve) => nerve.sites.map((one) => one.id));
  function begun(): CaseBuilder {
    const script = openedCase(sciatic);
    script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    for (const id of sites) script.wait(100).run(id, site(id), { purpose: 'baseline' });
    script.give({ name: 'accept-baseline', family: 'exposed', electrodeId: 'direct-bipolar', reason: 'Surgeon waits' });
    return script;
  }

  it('theatreView is calm only when every nerve at risk earned it, and names the one that did not', () => {
    const script = begun();
    for (const id of sites.slice(0, 3)) script.wait(100).run(id, site(id));
    expect(lead(script)).toMatchObject({ kind: 'not-tested', isCalm: false, headline: 'Tibial: not tested since baseline' });
    for (const id of sites.slice(3)) script.wait(100).run(id, site(id));
    expect(lead(script)).toMatchObject({ kind: 'stable', isCalm: true });
    script.step('retractor-posterior');
    const headlines = [lead(script), ...script.view().others].map((line) => line.headline);
    expect(headlines).toEqual(['Common fibular: not tested', 'Tibial: not tested since posterior retractor']);
  });

  it('theatreView leads with the alert of one nerve and keeps the state of the other, by its name', () => {
    const script = begun();
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('fibular-head', { ta: absent(25) });
    expect(lead(script)).toMatchObject({ kind: 'alert', headline: 'No common fibular response' });
    expect(script.view().others.map((line) => line.headline)).toContain('Tibial: not tested since baseline');
  });

  it('theatreView keeps every headline of the templates within what a wall shows', () => {
    for (const plan of templates) {
      const script = openedCase(plan);
      script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
      const runs = plan.paths.map((path) => [path.siteId, { [path.channelId]: measured(10, 5000) }] as const);
      for (const [siteId, readings] of runs) script.wait(100).run(siteId, readings, { purpose: 'baseline' });
      script.give({ name: 'accept-baseline', family: plan.defaultFamily, electrodeId: plan.electrodes[0]!.id, reason: 'Surgeon waits' });
      const headlines: string[] = [];
      const look = () => headlines.push(lead(script).headline, ...script.view().others.map((line) => line.headline));
      for (const step of plan.steps) {
        const other = script.fork();
        other.step(step.id);
        headlines.push(lead(other).headline);
        other.wait(100).run(runs[0]![0], runs[0]![1]);
        headlines.push(lead(other).headline, ...other.view().others.map((line) => line.headline));
      }
      for (const [siteId, readings] of runs) {
        for (const reading of [absent(20), measured(10, 1000), measured(12, 5000), measured(10, 5500), { kind: 'unusable', reason: 'cautery' } as const]) {
          script.wait(1000).run(siteId, { [Object.keys(readings)[0]!]: reading });
          look();
        }
      }
      expect(headlines.filter((headline) => headline.length > headlineLength)).toEqual([]);
    }
  });
});

describe('theatreView, another plan', () => {
  it('theatreView takes a case with one nerve and one site', () => {
    const one = { ...ulnarAtElbow.nerves[0]!, sites: ulnarAtElbow.nerves[0]!.sites.slice(3) };
    const plan = { ...ulnarAtElbow, nerves: [one], channels: ulnarAtElbow.channels.slice(0, 1), paths: ulnarAtElbow.paths.filter((path) => path.id === 'wrist/adm'), closingSiteId: 'wrist' };
    const script = openedCase(plan);
    script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    script.wait(100).run('wrist', { adm: adm('wrist') }, { purpose: 'baseline' });
    script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Surgeon waits' });
    script.wait(100).run('wrist', { adm: adm('wrist') });
    expect(lead(script)).toMatchObject({ kind: 'stable', detail: `1 of 1 sites tested. Lowest 100${nbsp}% of baseline, at 10:00.` });
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('wrist', { adm: absent(20) });
    expect(lead(script)).toMatchObject({ kind: 'alert', detail: 'Not between the tested sites. Last good 10:00, first seen 10:00.' });
  });
});
