import { describe, expect, it } from 'vitest';

import { absent, clock, type CaseBuilder, type Readings } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar } from '@/tests/support/ulnar-case';

const incidentOf = (script: CaseBuilder) => script.state.incidents['ulnar'];
const lastRunSeq = (script: CaseBuilder) => script.state.runs.at(-1)!.seq;
/** Corrects a run to these readings, or withdraws it; gives the kinds committed after the correction and its judgement. */
function correct(script: CaseBuilder, runSeq: number, siteId: string, readings: Readings | null) {
  const run = readings === null ? null : script.runBody(siteId, readings);
  const drafts = script.give({ name: 'correct-run', runSeq, run, reason: 'Typed wrong' });
  return drafts.map((draft) => draft.kind).filter((kind) => kind !== 'run.corrected' && kind !== 'run.judged');
}

describe('decide, corrections', () => {
  it('decide withdraws a notice whose only run was corrected, and the wall says so for 60 s', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    expect(correct(script.at('10:41:10'), lastRunSeq(script), 'above-elbow', { adm: adm('above-elbow') })).toEqual(['alert.withdrawn']);
    expect(incidentOf(script)).toBeUndefined();
    expect(script.view(script.nowMs + 59_999).lead).toMatchObject({ kind: 'withdrawn', isCalm: false, detail: 'Entry corrected.' });
    expect(script.view(script.nowMs + 60_000).lead.kind).not.toBe('withdrawn');
  });

  it('decide withdraws an alert only when every abnormal run is gone', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    const first = lastRunSeq(script);
    script.at('10:41:20').run('above-elbow', { adm: adm('above-elbow', 0.38) });
    const second = lastRunSeq(script);
    expect(correct(script, first, 'above-elbow', null)).toEqual([]);
    expect(incidentOf(script)).toMatchObject({ level: 'alert', badSeqs: [second] });
    expect(correct(script, second, 'above-elbow', null)).toEqual(['alert.withdrawn']);
  });

  it('decide keeps an alert whose run was corrected to a value that is still past the limit', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    expect(correct(script, lastRunSeq(script), 'above-elbow', { adm: adm('above-elbow', 0.4) })).toEqual([]);
    expect(incidentOf(script)).toMatchObject({ level: 'notice' });
  });

  it('decide raises a change that the typing had hidden, with the time of its run', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow') });
    const hidden = lastRunSeq(script);
    expect(correct(script.at('10:43'), hidden, 'above-elbow', { adm: adm('above-elbow', 0.38) })).toEqual(['notice.raised']);
    expect(incidentOf(script)).toMatchObject({ firstBadAt: clock('10:41'), receivedAt: clock('10:43'), repeatDueAt: clock('10:42:30') });
    expect(script.timers()).toEqual(['alert.raised']);
  });

  it('decide keeps what the typing had hidden open until its path is tested again, although a later run is good', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow') });
    const hidden = lastRunSeq(script);
    script.wait(5000).run('above-elbow', { adm: adm('above-elbow') });
    expect(correct(script.at('10:43'), hidden, 'above-elbow', { adm: adm('above-elbow', 0.38) })).toEqual(['notice.raised']);
    expect(script.wait(600_000).timers()).toEqual([]);
    expect(script.run('above-elbow', { adm: adm('above-elbow') })).toEqual(['notice.settled']);
  });

  it.each([
    ['to a loss', 0.38, ['alert.worsened'], null],
    ['to a value inside the limit and not inside its margin', 0.52, [], null],
    ['to another good value', 0.9, ['alert.recovered'], clock('10:41:25')],
  ] as const)('decide judges a recovery again when its run is corrected: %s', (_case, share, kinds, recoveredAt) => {
    const script = monitoredUlnar().at('10:41');
    for (const good of [0.38, 0.38, 1, 1]) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', good) });
    expect(incidentOf(script)?.recoveredAt).toBe(clock('10:41:20'));
    expect(correct(script.wait(5000), lastRunSeq(script), 'above-elbow', { adm: adm('above-elbow', share) })).toEqual(kinds);
    expect(incidentOf(script)).toMatchObject({ level: 'alert', recoveredAt });
    if (share === 0.38) expect(script.entries.at(-1)?.body).toMatchObject({ worsening: ['returned'] });
  });

  it('decide takes a recovery back when one of its two runs is withdrawn', () => {
    const script = monitoredUlnar().at('10:41');
    for (const good of [0.38, 0.38, 1, 1]) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', good) });
    correct(script.wait(5000), lastRunSeq(script), 'above-elbow', null);
    expect(script.view().lead).toMatchObject({ kind: 'alert', priority: 'high' });
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') })).toEqual(['alert.recovered']);
  });

  it.each([
    ['is withdrawn', null],
    ['cannot be compared as corrected', { adm: { kind: 'unusable', reason: 'cautery' } }],
  ] as const)('decide raises a loss again whose good repeat %s', (_case, readings) => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) });
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow') })).toEqual(['notice.settled']);
    expect(correct(script.at('10:46'), lastRunSeq(script), 'above-elbow', readings)).toEqual(['notice.raised']);
    expect(incidentOf(script)).toMatchObject({ alertId: 'ulnar-2', firstBadAt: clock('10:41'), isLost: true });
    expect(script.view().lead.detail).toContain('From 10:41, received 10:46');
    expect(script.timers()).toEqual(['alert.raised']);
  });

  it('decide raises what a correction shows elsewhere although it withdraws the notice', () => {
    // Below elbow typed lost; corrected, its onset leaves the stretch above it 1.2 ms slower: 1.85 to 3.05 ms is +65 %.
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 1, 0.2) });
    script.wait(1000).run('below-elbow', { adm: absent(18) });
    expect(correct(script, lastRunSeq(script), 'below-elbow', { adm: adm('below-elbow', 1, -1) })).toEqual(['alert.withdrawn', 'notice.raised']);
    expect(incidentOf(script)).toMatchObject({ alertId: 'ulnar-2', finding: 'segment-slowed' });
  });

  it('decide takes a withdrawn run out of path and segments: no value of it stays on the wall', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('below-elbow', { adm: adm('below-elbow') });
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 1, 2) });
    const wrong = lastRunSeq(script);
    const key = 'adm|above-elbow|below-elbow';
    expect(script.state.segments[key]).toMatchObject({ velocity: { kind: 'velocity', velocityMps: 25.97 } });
    correct(script, wrong, 'above-elbow', null);
    expect(script.state.segments[key]).toBeUndefined();
    expect(script.state.paths['above-elbow/adm']).toMatchObject({ compared: { at: clock('10:30:02') }, lastAt: clock('10:30:02') });
    expect(JSON.stringify(script.state.paths)).not.toContain(`"seq":${wrong}`);
  });

  it('decide forgets a path whose only run is withdrawn', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { fdi: fdiAt('above-elbow') });
    correct(script, lastRunSeq(script), 'above-elbow', null);
    expect(script.state.paths['above-elbow/fdi']).toBeUndefined();
  });

  it('decide corrects the run before the newest in its place', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow') });
    const older = lastRunSeq(script);
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow') });
    correct(script, older, 'above-elbow', { adm: adm('above-elbow', 0.9) });
    expect(script.state.paths['above-elbow/adm']).toMatchObject({ compared: { change: { percentOfBaseline: 100 } }, previous: { change: { percentOfBaseline: 90 } } });
  });

  it('decide marks a baseline whose run was corrected and holds that run against no baseline', () => {
    const script = monitoredUlnar();
    const key = 'above-elbow/adm|surface|through-skin';
    const used = script.state.baselines[key]!.runSeqs[2]!;
    expect(correct(script, used, 'above-elbow', { adm: adm('above-elbow', 0.3) })).toEqual([]);
    expect(script.state.baselines[key]).toMatchObject({ isMarkedByCorrection: true, amplitudeUv: 8900 });
    expect(script.state.openingBaselines[key]?.isMarkedByCorrection).toBe(true);
    expect(incidentOf(script)).toBeUndefined();
  });

  it.each([
    ['run-unknown', 1, 'above-elbow', { adm: adm('above-elbow') }],
    ['site-differs', null, 'wrist', { adm: adm('wrist') }],
    ['channel-unknown', null, 'above-elbow', { edb: adm('above-elbow') }],
    ['amplitude-zero', null, 'above-elbow', { adm: { kind: 'measured', onsetMs: 8, amplitudeUv: 0.004, durationMs: null } }],
  ] as const)('decide refuses a correction: %s', (code, runSeq, siteId, readings) => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow') });
    const run = script.runBody(siteId, readings);
    expect(script.refused({ name: 'correct-run', runSeq: runSeq ?? lastRunSeq(script), run, reason: 'Typed wrong' }).code).toBe(code);
  });
});

describe('decide, a run that is no measurement', () => {
  it('decide refuses an amplitude of 0 and asks for no response', () => {
    const script = monitoredUlnar().at('10:41');
    const zero = { kind: 'measured', onsetMs: 8, amplitudeUv: 0, durationMs: null } as const;
    const { code, message } = script.refused({ name: 'log-run', run: script.runBody('above-elbow', { adm: zero }) });
    expect({ code, message }).toEqual({ code: 'amplitude-zero', message: 'Amplitude 0 on adm: log "no response" with the highest current tried' });
    expect(script.run('above-elbow', { adm: absent(18) })).toEqual(['notice.raised']);
  });

  it.each([
    ['site-unknown', { siteId: 'knee' }],
    ['electrode-unknown', { electrodeId: 'hook' }],
    ['channel-unknown', { readings: [{ channelId: 'edb', reading: { kind: 'not-read' } }] }],
  ] as const)('decide refuses what the plan does not have: %s', (code, changes) => {
    const script = monitoredUlnar().at('10:41');
    const refusal = script.refused({ name: 'log-run', run: { ...script.runBody('wrist', { adm: adm('wrist') }), ...changes } });
    expect(refusal.code).toBe(code);
    expect(refusal.message).toContain('The plan has');
  });

  it('decide never refuses a run for the state of the case', () => {
    const script = monitoredUlnar().at('10:41');
    for (const phase of ['paused', 'take-down', 'set-up', 'baseline'] as const) {
      script.give({ name: 'change-phase', phase, reason: 'X-ray' });
      expect(script.wait(1000).run('wrist', { adm: adm('wrist') })).toEqual([]);
    }
    script.give({ name: 'close-case', text: null });
    expect(script.refused({ name: 'send-message', text: 'Late' }).code).toBe('case-closed');
    expect(script.wait(1000).run('wrist', { adm: adm('wrist') }, {}, { eventAt: clock('10:40:59') })).toEqual([]);
    expect(script.state.status).toBe('closed');
  });
});
