import { describe, expect, it } from 'vitest';

import { absent, measured, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, apb, monitoredUlnar, openedCase, ulnarBaseline, ulnarSites } from '@/tests/support/ulnar-case';

const nbsp = '\u00a0';
const cuff = (isUp: boolean) => ({ name: 'log-condition', condition: { kind: 'tourniquet', isUp, pressureMmHg: null }, reportedBy: null }) as const;
const lead = (script: CaseBuilder) => script.view().lead;
/** Alert above elbow at 38 %, confirmed at 10:41:20. */
function alerted(): CaseBuilder {
  const script = monitoredUlnar().at('10:41');
  script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
  script.at('10:41:20').run('above-elbow', { adm: adm('above-elbow', 0.38) });
  return script;
}

describe('theatreView, states', () => {
  it.each([
    ['set-up', { headline: 'Set-up', detail: 'Since 10:00. Not monitored yet.' }, (): void => undefined],
    ['paused', { headline: 'Paused', detail: 'X-ray, since 10:00. Not monitored.' }, (script: CaseBuilder): void => void script.give({ name: 'change-phase', phase: 'paused', reason: 'X-ray' })],
    ['take-down', { headline: 'Take-down', detail: 'Monitoring ended 10:00. Not monitored.' }, (script: CaseBuilder): void => void script.give({ name: 'change-phase', phase: 'take-down', reason: null })],
    ['no-baseline', { headline: 'Ulnar: no baseline yet', detail: 'Baseline at 0 of 4 sites.' }, (script: CaseBuilder): void => void script.give({ name: 'change-phase', phase: 'monitoring', reason: null })],
    ['closed', { headline: 'Case closed 10:00', detail: 'Not monitored.' }, (script: CaseBuilder): void => void script.give({ name: 'close-case', text: null })],
  ] as const)('theatreView: %s', (kind, words, prepare) => {
    const script = openedCase();
    prepare(script);
    expect(lead(script)).toMatchObject({ kind, isCalm: false, isFlashing: false, ...words });
  });

  it('theatreView says that a required path is not compared, since when and why', () => {
    const script = monitoredUlnar().at('10:32');
    script.run('wrist', { adm: { kind: 'unusable', reason: 'cautery' } });
    expect(lead(script)).toMatchObject({ kind: 'not-compared', priority: 'low', headline: 'Ulnar not compared since 10:32', detail: 'Trace unusable. Last compared 10:30.' });
  });

  it('theatreView says not compared also at the very time of a comparable run', () => {
    const script = monitoredUlnar();
    script.run('wrist', { adm: adm('wrist') });
    script.run('wrist', { adm: { kind: 'unusable', reason: 'cautery' } });
    expect(lead(script).kind).toBe('not-compared');
  });

  it('theatreView says not monitorable where the newest baseline scatters as much as the limit', () => {
    const script = openedCase();
    script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    // 2, 9, 16 mV: mean 9, standard deviation 7, scatter 0.78; 2 · 78 · √(4/3) = 180 %, past the limit of 50 %.
    const accept = { name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Surgeon waits' } as const;
    for (const amplitudeUv of [2000, 9000, 16_000]) {
      for (const site of ulnarSites) script.wait(100).run(site, { adm: measured(ulnarBaseline[site].onsetMs, amplitudeUv) }, { purpose: 'baseline' });
    }
    script.give(accept);
    expect(lead(script)).toMatchObject({ kind: 'not-monitorable', headline: 'Ulnar not monitorable by amplitude' });
    for (const site of ulnarSites) {
      for (let count = 0; count < 3; count += 1) script.wait(100).run(site, { adm: adm(site) }, { purpose: 'baseline' });
    }
    script.give(accept);
    expect(lead(script).kind).toBe('not-tested');
  });

  it('theatreView is never calm with the cuff up and says for how long', () => {
    const script = monitoredUlnar();
    script.give(cuff(true));
    script.wait(90_000);
    expect(lead(script)).toMatchObject({ kind: 'tourniquet-up', isCalm: false, headline: `Tourniquet up 1${nbsp}min` });
    expect(script.view().footer).toContain(`Tourniquet up 1${nbsp}min`);
    script.give(cuff(false));
    expect(lead(script).kind).toBe('stable');
  });

  it('theatreView leads with an open alert whatever the phase', () => {
    const script = alerted();
    for (const phase of ['paused', 'take-down', 'set-up'] as const) {
      script.give({ name: 'change-phase', phase, reason: 'X-ray' });
      expect(lead(script)).toMatchObject({ kind: 'alert', priority: 'high' });
      expect(script.view().others.map((line) => line.kind)).toContain(phase);
    }
  });

  it('theatreView asks for nothing in take-down: only what is still open stands beside it', () => {
    const script = monitoredUlnar().at('10:41');
    for (const site of ulnarSites) script.run(site, { adm: absent(20) });
    script.run('median-wrist', { apb: absent(20) });
    script.give(cuff(true));
    const end = (alertId: string) => script.give({ name: 'end-alert', alertId, outcome: 'none', cause: 'undetermined', text: null });
    script.at('10:50').give({ name: 'change-phase', phase: 'take-down', reason: null });
    const kinds = () => [lead(script), ...script.view().others].map((line) => line.kind);
    expect(kinds()).toEqual(['alert', 'notice', 'take-down']);
    for (const { alertId } of Object.values(script.state.incidents)) end(alertId);
    expect(lead(script)).toMatchObject({ kind: 'take-down', isCalm: false, headline: 'Take-down', detail: 'Monitoring ended 10:50. Not monitored.' });
    expect(kinds()).toEqual(['take-down']);
    // Monitoring that goes on judges again, and says so.
    script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    expect(lead(script).kind).toBe('cannot-be-judged');
  });

  it('theatreView says that nothing can be judged when the control is lost too, high after 60 s without a train-of-four', () => {
    const script = monitoredUlnar().at('10:41');
    for (const site of ulnarSites) script.run(site, { adm: absent(20) });
    script.run('median-wrist', { apb: absent(20) });
    const line = () => [lead(script), ...script.view().others].find((one) => one.kind === 'cannot-be-judged');
    expect(line()).toMatchObject({ priority: 'medium', headline: 'Muscle responses cannot be judged', detail: 'Control lost too. Train-of-four needed.' });
    script.at('10:41:50').run('median-wrist', { apb: absent(20) });
    script.at('10:42:00.001');
    expect(line()?.priority).toBe('high');
    script.give({ name: 'log-condition', condition: { kind: 'train-of-four', count: 0, ratio: null }, reportedBy: null });
    expect(line()).toMatchObject({ priority: 'medium', detail: 'Control lost too since 10:41.' });
    script.run('median-wrist', { apb: apb() });
    expect(line()).toBeUndefined();
  });
});
