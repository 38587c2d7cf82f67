import { describe, expect, it } from 'vitest';

import type { CaseBuilder } from '@/tests/support/case-builder';
import { measured } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const accept = (reason: string | null = null) => ({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason }) as const;
const key = (pathId: string) => `${pathId}|surface|through-skin`;
const trainOfFour = (count: number) => ({ name: 'log-condition', condition: { kind: 'train-of-four', count, ratio: null }, reportedBy: null }) as const;

function baselineRuns(script: CaseBuilder, amplitudesUv: readonly number[]): void {
  for (const amplitudeUv of amplitudesUv) script.wait(1000).run('wrist', { adm: measured(2.9, amplitudeUv) }, { purpose: 'baseline' });
}

describe('accept-baseline', () => {
  it('accept-baseline takes means and scatter of three runs by hand', () => {
    // 9, 10, 11 mV: mean 10 mV, standard deviation 1 mV, scatter 0.1. Onset (2.88 + 2.9 + 2.92) / 3 = 2.9 ms.
    const script = openedCase();
    [[2.88, 9000], [2.9, 10_000], [2.92, 11_000]].forEach(([onsetMs, amplitudeUv]) => {
      script.wait(1000).run('wrist', { adm: measured(onsetMs!, amplitudeUv!, 6) }, { purpose: 'baseline' });
    });
    script.give(trainOfFour(4));
    script.give(accept());
    expect(script.state.baselines[key('wrist/adm')]).toMatchObject({
      onsetMs: 2.9, amplitudeUv: 10_000, durationMs: 6, amplitudeScatter: 0.1, isScatterAssumed: false, intensityMa: 15, setAfterPercent: null,
    });
  });

  it('accept-baseline assumes the scatter below three runs and says so', () => {
    const script = openedCase();
    baselineRuns(script, [9400, 9400]);
    script.give(trainOfFour(4));
    script.give(accept());
    expect(script.state.baselines[key('wrist/adm')]).toMatchObject({ amplitudeScatter: 0.08, isScatterAssumed: true });
  });

  it.each([
    ['train-of-four unknown', (): void => undefined, 'Train-of-four unknown'],
    ['train-of-four 3', (script: CaseBuilder): void => void script.give(trainOfFour(3)), 'Train-of-four 3 of 4'],
    ['cuff up', (script: CaseBuilder): void => {
      script.give(trainOfFour(4));
      script.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: true, pressureMmHg: 250 }, reportedBy: null });
    }, 'Tourniquet is up'],
  ] as const)('accept-baseline needs a written reason: %s', (_case, prepare, concern) => {
    const script = openedCase();
    baselineRuns(script, [9400]);
    prepare(script);
    expect(script.refused(accept())).toMatchObject({ code: 'reason-needed', message: expect.stringContaining(concern) });
    script.give(accept('Surgeon waits'));
  });

  it.each([
    [17.99, 'refused'],
    [18, 'accepted'],
  ])('accept-baseline takes %f mA over a maximal-response current of 15 mA as supramaximal from 1.2 times: %s', (intensityMa, expected) => {
    const script = openedCase();
    script.wait(1000).run('wrist', { adm: adm('wrist') }, { purpose: 'baseline', intensityMa, isSupramaximal: false, maximalResponseMa: 15 });
    script.give(trainOfFour(4));
    const code = expected === 'refused' ? script.refused(accept()).code : script.give(accept())[0]?.kind;
    expect(code).toBe(expected === 'refused' ? 'reason-needed' : 'baseline.accepted');
  });

  it('accept-baseline takes no run from before the time-out', () => {
    const script = openedCase();
    script.at('10:01').run('wrist', { adm: adm('wrist') }, { purpose: 'baseline' }, { eventAt: '2027-03-14T09:59:59.999Z' });
    expect(script.refused(accept('Surgeon waits')).code).toBe('no-baseline-run');
  });

  it('accept-baseline is provisional without a physician', () => {
    const script = openedCase();
    baselineRuns(script, [9400]);
    expect(script.give(accept('Surgeon waits'))[0]).toMatchObject({ body: { isProvisional: true, isOpening: true } });
    baselineRuns(script, [9400]);
    expect(script.give(accept('Surgeon waits'), { role: 'physician' })[0]).toMatchObject({ body: { isProvisional: false, isOpening: false } });
  });

  it('accept-baseline keeps the opening baseline for ever and carries what was lost before', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(5000).run('wrist', { adm: adm('wrist', 0.38) });
    for (let count = 0; count < 3; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist', 0.38) }, { purpose: 'baseline' });
    script.give(accept());
    // 38.0 % of baseline is −62.0 %.
    expect(script.state.baselines[key('wrist/adm')]).toMatchObject({ amplitudeUv: 3572, setAfterPercent: -62 });
    expect(script.state.openingBaselines[key('wrist/adm')]).toMatchObject({ amplitudeUv: 9400, setAfterPercent: null });
    expect(script.view().footer).toContain('Baseline set after −62\u00a0%');
    expect(script.view().lead.kind).toBe('alert');
    for (let count = 0; count < 3; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist', 0.38) }, { purpose: 'baseline' });
    script.give(accept());
    expect(script.state.baselines[key('wrist/adm')]?.setAfterPercent).toBe(-62);
  });

  it('accept-baseline makes calm be earned again', () => {
    const script = monitoredUlnar();
    expect(script.view().lead.kind).toBe('stable');
    script.wait(1000).run('wrist', { adm: adm('wrist') }, { purpose: 'baseline' });
    script.give(accept());
    expect(script.view().lead).toMatchObject({ kind: 'not-tested', headline: '3 of 4 sites tested since baseline' });
  });

  it('accept-baseline takes only runs like the newest of their site', () => {
    const script = openedCase();
    script.wait(1000).run('wrist', { adm: measured(2.9, 4000) }, { purpose: 'baseline', pulseWidthUs: 100 });
    script.wait(1000).run('wrist', { adm: adm('wrist'), fdi: fdiAt('wrist') }, { purpose: 'baseline' });
    script.give(accept('Surgeon waits'));
    expect(script.state.baselines[key('wrist/adm')]).toMatchObject({ amplitudeUv: 9400, pulseWidthUs: 200, runSeqs: [expect.any(Number)] });
    expect(script.state.baselines[key('wrist/fdi')]).toMatchObject({ amplitudeUv: 10_340 });
  });
});
