import { describe, expect, it } from 'vitest';

import { judgeInCase } from '@/lib/case/judge-in-case';
import type { RunBody } from '@/lib/case/run-body';
import { absent, clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const judgementOf = (script: CaseBuilder, changes: Partial<RunBody>, reading = adm('above-elbow')) =>
  judgeInCase(script.state, { at: new Date(script.nowMs).toISOString(), run: script.runBody('above-elbow', { adm: reading }, changes) }).paths[0];

describe('judgeInCase, like with like', () => {
  it.each([
    ['electrode-differs', { electrodeId: 'needle' }],
    ['family-differs', { family: 'exposed' }],
    ['pulse-width-differs', { pulseWidthUs: 100 }],
    // Baseline 18 mA supramaximal: 5 % is 0.9 mA, 17.09 mA is lower and not known to be supramaximal.
    ['current-not-supramaximal', { intensityMa: 17.09, isSupramaximal: false }],
    ['current-raised', { intensityMa: 18.91, isSupramaximal: false }],
  ] as const)('judgeInCase does not compare: %s', (reason, changes) => {
    const script = monitoredUlnar().at('10:41');
    expect(judgementOf(script, changes)).toEqual({ kind: 'not-compared', pathId: 'above-elbow/adm', reason });
  });

  it.each([
    ['equal', { intensityMa: 17.1, isSupramaximal: false }],
    ['equal', { intensityMa: 18.9, isSupramaximal: false }],
    ['supramaximal', { intensityMa: 25 }],
    // 1.2 × 15 mA = 18 mA; with 25 mA the factor is 1.67.
    ['supramaximal', { intensityMa: 25, isSupramaximal: false, maximalResponseMa: 15 }],
  ] as const)('judgeInCase compares at a current that is %s', (current, changes) => {
    expect(judgementOf(monitoredUlnar().at('10:41'), changes)).toMatchObject({ kind: 'compared', current });
  });

  it('judgeInCase does not compare below the baseline of a submaximal current', () => {
    const script = openedCase();
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow') }, { purpose: 'baseline', isSupramaximal: false });
    script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Surgeon waits' });
    script.wait(1000);
    expect(judgementOf(script, { isSupramaximal: false, intensityMa: 17 })).toMatchObject({ reason: 'current-lower' });
  });

  it('judgeInCase names what was not looked at, not usable, without a baseline or before the time-out', () => {
    const script = monitoredUlnar().at('10:41');
    expect(judgementOf(script, {}, { kind: 'not-read' })).toMatchObject({ reason: 'not-read' });
    expect(judgementOf(script, {}, { kind: 'unusable', reason: 'cautery' })).toMatchObject({ reason: 'unusable' });
    const [fdi] = judgeInCase(script.state, { at: clock('10:41'), run: script.runBody('above-elbow', { fdi: fdiAt('above-elbow') }) }).paths;
    expect(fdi).toMatchObject({ pathId: 'above-elbow/fdi', reason: 'no-baseline' });
    const early = judgeInCase(script.state, { at: clock('09:59:59.999'), run: script.runBody('above-elbow', { adm: adm('above-elbow') }) }).paths;
    expect(early[0]).toMatchObject({ reason: 'not-timed-out' });
  });

  it('judgeInCase knows a channel that does not see the site', () => {
    const script = monitoredUlnar().at('10:41');
    const { paths } = judgeInCase(script.state, { at: clock('10:41'), run: script.runBody('above-elbow', { apb: adm('above-elbow') }) });
    expect(paths).toEqual([{ kind: 'not-compared', pathId: 'above-elbow/apb', reason: 'path-unknown' }]);
  });

  it('judgeInCase holds no run against a baseline that is newer', () => {
    const script = monitoredUlnar();
    const at = script.state.baselines['above-elbow/adm|surface|through-skin']!.at;
    const run = script.runBody('above-elbow', { adm: adm('above-elbow', 0.4) });
    expect(judgeInCase(script.state, { at, run }).paths[0]).toMatchObject({ reason: 'no-baseline' });
    expect(judgeInCase(script.state, { at: new Date(Date.parse(at) + 1).toISOString(), run }).paths[0]).toMatchObject({ kind: 'compared' });
  });
});

describe('decide, raised current', () => {
  /** No response above elbow at 18 mA, 10:41:00. */
  const lostOnce = () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) });
    return script;
  };
  const raised = { intensityMa: 30, isSupramaximal: false };

  it('decide takes a response that is back at a higher current for a threshold rise', () => {
    const script = lostOnce();
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, raised)).toEqual([]);
    expect(script.state.paths['above-elbow/adm']?.compared?.findings).toEqual([{ kind: 'threshold-rise', priority: 'notice', mayBecomeAlert: false }]);
    expect(script.state.incidents['ulnar']).toMatchObject({ level: 'notice', repeatDueAt: null });
    expect(script.at('10:50').timers()).toEqual([]);
    expect(script.view().lead).toMatchObject({ kind: 'notice', headline: 'Ulnar needs more current' });
  });

  it('decide takes it for a threshold rise whatever is ticked, and settles it at the current it was lost at', () => {
    // Lost at 18 mA ticked supramaximal: 18.9 mA is 5 % more and equal, 19 mA is raised.
    for (const intensityMa of [30, 19]) {
      const script = lostOnce();
      expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, { intensityMa })).toEqual([]);
      expect(script.state.paths['above-elbow/adm']?.compared).toMatchObject({ findings: [{ kind: 'threshold-rise' }] });
      // Once more at the higher current is no answer either.
      expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, { intensityMa })).toEqual([]);
      expect(script.view().lead).toMatchObject({ kind: 'notice', headline: 'Ulnar needs more current' });
      expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') })).toEqual(['notice.settled']);
    }
    expect(lostOnce().wait(5000).run('above-elbow', { adm: adm('above-elbow') }, { intensityMa: 18.9 })).toEqual(['notice.settled']);
  });

  it('decide settles a fall at a higher supramaximal current when it fell at that current', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) }, { intensityMa: 30 });
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, { intensityMa: 30 })).toEqual(['notice.settled']);
  });

  it('decide counts no recovery of an alert at a higher current', () => {
    const script = lostOnce();
    script.wait(5000).run('above-elbow', { adm: absent(18) });
    for (let count = 0; count < 3; count += 1) expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, { intensityMa: 30 })).not.toContain('alert.recovered');
    expect(script.view().lead).toMatchObject({ kind: 'alert', headline: 'Ulnar needs more current' });
  });

  it('decide takes a response that is still absent at a higher current for the confirmation', () => {
    const script = lostOnce();
    expect(script.wait(5000).run('above-elbow', { adm: absent(30) }, raised)).toEqual(['alert.raised']);
    expect(script.state.incidents['ulnar']).toMatchObject({ level: 'alert', isRepeated: true, isLost: true });
  });

  it('decide compares a raised current where nothing is open only when it shows a loss', () => {
    const script = monitoredUlnar().at('10:41');
    expect(script.run('above-elbow', { adm: adm('above-elbow') }, raised)).toEqual([]);
    expect(script.state.paths['above-elbow/adm']?.lastNotCompared).toBe('current-raised');
    expect(script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.4) }, raised)).toEqual(['notice.raised']);
  });

  it('decide keeps an open alert when its path is not compared any more, and the wall says so', () => {
    const script = lostOnce();
    script.wait(5000).run('above-elbow', { adm: absent(18) });
    script.at('10:50').run('above-elbow', { adm: adm('above-elbow') }, { electrodeId: 'needle' });
    expect(script.state.incidents['ulnar']?.level).toBe('alert');
    expect(script.view().lead).toMatchObject({ kind: 'alert', headline: 'No ulnar response' });
    expect(script.view().lead.detail).toContain('Not compared since 10:50, other stimulating electrode');
  });
});
