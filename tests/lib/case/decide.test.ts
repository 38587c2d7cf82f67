import { describe, expect, it } from 'vitest';

import { decide } from '@/lib/case/decide';
import { initialState } from '@/lib/case/initial-state';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { CaseBuilder, clock } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const planCase = { name: 'plan-case', plan: ulnarAtElbow, reference: 'K7-0001', identityCommitment: 'c'.repeat(64) } as const;
const rightPlan = { ...ulnarAtElbow, side: 'right' } as const;

describe('decide, the life of a case', () => {
  it('decide takes nothing before the plan, and one plan', () => {
    const script = new CaseBuilder();
    expect(script.refused({ name: 'send-message', text: 'Early' }).code).toBe('not-planned');
    script.give(planCase);
    expect(script.refused(planCase).code).toBe('already-planned');
  });

  it('decide refuses an inconsistent plan with its sentence', () => {
    const script = new CaseBuilder();
    expect(script.refused({ ...planCase, plan: { ...ulnarAtElbow, closingSiteId: 'knee' } })).toEqual({
      code: 'plan-inconsistent', message: 'Closing site unknown: knee is no site of the plan',
    });
  });

  it('decide revises the plan until the first run, also once the case is open', () => {
    const script = openedCase();
    script.give({ name: 'revise-plan', plan: { ...ulnarAtElbow, theatre: 'Theatre 5' } });
    expect(script.state.plan.theatre).toBe('Theatre 5');
    script.run('wrist', { adm: adm('wrist') });
    expect(script.refused({ name: 'revise-plan', plan: ulnarAtElbow }).message).toContain('1 runs are logged');
  });

  it('decide never lets a revised plan turn the side that the time-out confirmed', () => {
    const script = openedCase();
    expect(script.refused({ name: 'revise-plan', plan: rightPlan })).toMatchObject({ code: 'side-fixed' });
    const before = new CaseBuilder();
    before.give(planCase);
    before.give({ name: 'revise-plan', plan: rightPlan });
    expect(before.refused({ name: 'confirm-timeout', side: 'left', text: null })).toMatchObject({ code: 'side-differs' });
    before.give({ name: 'confirm-timeout', side: 'right', text: null });
    expect(before.refused({ name: 'confirm-timeout', side: 'right', text: null }).code).toBe('timeout-done');
  });

  it('decide opens once, changes phases of an open case only, and asks why it is paused', () => {
    const script = new CaseBuilder();
    script.give(planCase);
    expect(script.refused({ name: 'change-phase', phase: 'baseline', reason: null }).code).toBe('not-open');
    expect(script.refused({ name: 'close-case', text: null }).code).toBe('not-open');
    script.give({ name: 'open-case', clockOffsetMs: null });
    expect(script.refused({ name: 'open-case', clockOffsetMs: null }).code).toBe('already-open');
    expect(script.refused({ name: 'change-phase', phase: 'set-up', reason: null }).code).toBe('same-phase');
    expect(script.refused({ name: 'change-phase', phase: 'paused', reason: null }).code).toBe('reason-needed');
  });

  it('decide shows an alert of a case that nobody opened', () => {
    const script = new CaseBuilder();
    script.give(planCase);
    script.give({ name: 'confirm-timeout', side: 'left', text: null });
    script.wait(1000).run('wrist', { adm: adm('wrist') }, { purpose: 'baseline' });
    script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Surgeon waits' });
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist', 0.2) });
    expect(script.view().lead.kind).toBe('alert');
  });

  it('decide closes no case with an open alert', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist', 0.2) });
    expect(script.refused({ name: 'close-case', text: null })).toMatchObject({ code: 'alert-open' });
    script.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'none', cause: 'undetermined', text: null });
    script.give({ name: 'close-case', text: null });
  });

  it('decide takes a late run of a closed case, raises what it shows, and lets it be ended', () => {
    const script = monitoredUlnar().at('10:41');
    script.give({ name: 'close-case', text: null });
    script.wait(1000).run('wrist', { adm: adm('wrist', 0.2) }, {}, { eventAt: clock('10:40:30') });
    script.wait(1000).run('wrist', { adm: adm('wrist', 0.2) }, {}, { eventAt: clock('10:40:50') });
    expect(script.state.incidents['ulnar']?.level).toBe('alert');
    expect(script.view().lead.kind).toBe('closed');
    script.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'none', cause: 'undetermined', text: null });
    expect(script.refused({ name: 'log-step', stepId: 'closure', label: null }).code).toBe('case-closed');
  });

  it('decide writes nothing but what was asked into a refused state', () => {
    const state = initialState('c');
    const copy = structuredClone(state);
    decide(state, { name: 'send-message', text: 'Early' }, { eventAt: clock('10:00'), nowMs: 0 });
    expect(state).toEqual(copy);
  });
});

describe('decide, steps and distances', () => {
  it('decide refuses a step that the plan does not have, unless it is named by hand', () => {
    const script = openedCase();
    expect(script.refused({ name: 'log-step', stepId: 'reduction', label: 'Reduced' }).message).toContain('The plan has incision, neurolysis');
    expect(script.refused({ name: 'log-step', stepId: 'other', label: null }).code).toBe('step-unknown');
    expect(script.give({ name: 'log-step', stepId: 'other', label: 'Bone removed' })[0]).toMatchObject({ body: { since: 'bone removed', isRisk: true, voidsDistances: false } });
  });

  const positions = (...values: readonly number[]) => ['axilla', 'above-elbow', 'below-elbow', 'wrist'].slice(0, values.length).map((siteId, index) => ({ siteId, positionMm: values[index]! }));
  it.each([
    ['nerve-unknown', 'radial', positions(0, 150, 250, 460)],
    ['sites-missing', 'ulnar', positions(0, 150, 250)],
    ['sites-missing', 'ulnar', [...positions(0, 150, 250), { siteId: 'knee', positionMm: 300 }]],
    ['sites-disordered', 'ulnar', positions(0, 250, 150, 460)],
    // Both round to 150.0 mm.
    ['sites-disordered', 'ulnar', positions(0, 150, 150.04, 460)],
    ['sites-disordered', 'ulnar', positions(0, 150, 150.9, 460)],
  ] as const)('decide refuses distances: %s', (code, nerveId, rows) => {
    expect(openedCase().refused({ name: 'measure-distances', nerveId, positions: rows, reason: null }).code).toBe(code);
  });

  it('decide rounds distances once and makes them count again', () => {
    const script = openedCase();
    script.step('nerve-transposed');
    expect(script.state.distancesVoidSince).toEqual({ ulnar: clock('10:00') });
    script.give({ name: 'measure-distances', nerveId: 'ulnar', positions: positions(0, 150.04, 240.06, 450), reason: null });
    expect(script.state.distancesVoidSince).toEqual({});
    expect(script.state.plan.nerves[0]?.sites.map((site) => site.positionMm)).toEqual([0, 150, 240.1, 450]);
  });
});

describe('decide, rounding', () => {
  it('decide rounds every number of a run once, before it meets a limit', () => {
    const script = monitoredUlnar().at('10:41');
    const run = script.runBody('wrist', { adm: { kind: 'measured', onsetMs: 2.90049, amplitudeUv: 4702.0049, durationMs: 6.00051 } }, { intensityMa: 15.004 });
    const [logged, judged] = script.give({ name: 'log-run', run });
    expect(logged?.body).toMatchObject({ intensityMa: 15, readings: [{ reading: { onsetMs: 2.9, amplitudeUv: 4702, durationMs: 6.001 } }] });
    // 4702 / 9400 = 50.02 %, to 0.1: 50.0, which is at the limit.
    expect(judged?.body).toMatchObject({ paths: [{ change: { percentOfBaseline: 50 }, findings: [{ kind: 'amplitude-fall' }] }] });
  });
});
