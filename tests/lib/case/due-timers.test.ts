import { describe, expect, it } from 'vitest';

import { dueTimers } from '@/lib/case/due-timers';
import type { Incident } from '@/lib/case/case-state';
import { absent, clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

const incidentOf = (script: CaseBuilder): Incident => {
  const incident = script.state.incidents['ulnar'];
  if (incident === undefined) throw new Error('Expected an open notice or alert');
  return incident;
};

describe('dueTimers', () => {
  const script = monitoredUlnar().at('10:41');
  script.run('wrist', { adm: absent(15) });
  const dueMs = script.nowMs + 30_000;

  it('dueTimers gives nothing 1 ms before and the miss-repeat from the millisecond on', () => {
    expect(dueTimers(script.state, dueMs - 1)).toEqual([]);
    const timer = { commandId: `repeat/ulnar-1/${script.state.incidents['ulnar']!.firstSeq}`, command: { name: 'miss-repeat', alertId: 'ulnar-1' } };
    expect(dueTimers(script.state, dueMs)).toMatchObject([timer]);
    expect(dueTimers(script.state, dueMs + 3_600_000)).toMatchObject([timer]);
  });

  it('dueTimers gives nothing of a closed case', () => {
    expect(dueTimers({ ...script.state, status: 'closed' }, dueMs)).toEqual([]);
  });
});

describe('dueTimers and miss-repeat', () => {
  it.each([
    ['a fall after 90 s', adm('above-elbow', 0.38), '10:42:29.999', '10:42:30'],
    ['a loss after 30 s', absent(18), '10:41:29.999', '10:41:30'],
  ] as const)('dueTimers makes a notice that was not repeated an alert: %s', (_case, reading, before, due) => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: reading });
    expect(script.at(before).timers()).toEqual([]);
    expect(script.at(due).timers()).toEqual(['alert.raised']);
    expect(incidentOf(script)).toMatchObject({ level: 'alert', isRepeated: false });
    expect(script.wait(1000).timers()).toEqual([]);
  });

  it('miss-repeat is refused a second time and before it is due', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) });
    expect(script.refused({ name: 'miss-repeat', alertId: 'ulnar-1' }).code).toBe('repeat-not-due');
    script.at('10:41:30').give({ name: 'miss-repeat', alertId: 'ulnar-1' });
    expect(script.refused({ name: 'miss-repeat', alertId: 'ulnar-1' }).code).toBe('repeat-not-due');
  });

  it('dueTimers names a timer by its fact, the same in every process', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) });
    const firstSeq = incidentOf(script).firstSeq;
    script.at('10:41:30').timers();
    expect(script.entries.at(-1)?.commandId).toBe(`repeat/ulnar-1/${firstSeq}`);
  });

  it('dueTimers is not disarmed by a run made before the first abnormal one', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) });
    script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, {}, { eventAt: clock('10:40:50') });
    expect(script.at('10:41:30').timers()).toEqual(['alert.raised']);
  });

  it('dueTimers runs on while monitoring is paused and the repeat could not be compared', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(1000).run('above-elbow', { adm: { kind: 'unusable', reason: 'cautery' } });
    script.give({ name: 'change-phase', phase: 'paused', reason: 'X-ray' });
    expect(script.at('10:42:30').timers()).toEqual(['alert.raised']);
    expect(script.view().lead.kind).toBe('alert');
  });

  it('decide confirms an alert that was not repeated in time, once', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.at('10:42:30').timers();
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) })).toEqual(['alert.raised']);
    expect(incidentOf(script).isRepeated).toBe(true);
    expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) })).toEqual([]);
  });
});
