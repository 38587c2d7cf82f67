import { describe, expect, it } from 'vitest';

import { isSince } from '@/lib/case/is-since';
import { absent, clock } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, testAll } from '@/tests/support/ulnar-case';

describe('isSince', () => {
  const mark = { at: clock('10:41'), seq: 30 };
  it.each([
    ['the same run', { at: clock('10:41'), seq: 30 }, true],
    ['a later number at the same time', { at: clock('10:41'), seq: 31 }, true],
    ['an earlier number at the same time', { at: clock('10:41'), seq: 29 }, false],
    ['a later time with an earlier number', { at: clock('10:41:01'), seq: 29 }, true],
    ['an earlier time with a later number', { at: clock('10:40:59.999'), seq: 99 }, false],
  ] as const)('isSince: %s', (_case, run, expected) => expect(isSince(run, mark)).toBe(expected));
});

describe('decide, late entries', () => {
  it('decide raises what a late entry shows although a newer run of the path is good, and settles it by that', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow') });
    expect(script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:22:30') })).toEqual(['notice.raised', 'notice.settled']);
    // The good runs that are known came after it: no last good is claimed.
    const raised = script.entries.find((entry) => entry.kind === 'notice.raised');
    expect(raised?.body).toMatchObject({ firstBadAt: clock('10:22:30'), lastGoodAt: null });
  });

  it('decide says from when a hidden change is and when it was received, also once it is confirmed', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:32') });
    expect(script.view().lead.detail).toContain('From 10:32, received 10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:32:30') });
    expect(script.view().lead).toMatchObject({ kind: 'alert' });
    expect(script.view().lead.detail).toContain('From 10:32, received 10:41');
  });

  it('decide does not call an alert late that was received in time and confirmed after minutes', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.at('10:46').run('above-elbow', { adm: adm('above-elbow', 0.38) });
    expect(script.view().lead.detail).not.toContain('received');
  });

  it('decide moves the onset bracket back to a late abnormal run', () => {
    const script = monitoredUlnar();
    script.at('10:39').run('above-elbow', { adm: adm('above-elbow') });
    script.at('10:41').run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.at('10:42').run('above-elbow', { adm: adm('above-elbow', 0.4) }, {}, { eventAt: clock('10:40') });
    expect(script.state.incidents['ulnar']).toMatchObject({ level: 'alert', firstBadAt: clock('10:40'), lastGoodAt: clock('10:39') });
  });

  it('decide does not take a bad run from before the recovery for a return', () => {
    const script = monitoredUlnar().at('10:41');
    for (const share of [0.38, 0.38, 1, 1]) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', share) });
    expect(script.state.incidents['ulnar']?.recoveredAt).toBe(clock('10:41:20'));
    expect(script.wait(60_000).run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:41:12') })).not.toContain('alert.worsened');
  });

  it('decide puts a late good run where it belongs and does not count it twice', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(5000).run('above-elbow', { adm: adm('above-elbow') }, {}, { eventAt: clock('10:40:50') });
    script.wait(5000).run('above-elbow', { adm: adm('above-elbow') });
    expect(script.state.incidents['ulnar']?.recoveredAt).toBeNull();
  });

  it('evolve keeps the newest condition by its own time', () => {
    const script = monitoredUlnar().at('10:41');
    script.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: null });
    const late = { kind: 'tourniquet', isUp: true, pressureMmHg: 250 } as const;
    script.wait(1000).give({ name: 'log-condition', condition: late, reportedBy: null }, { eventAt: clock('10:20') });
    expect(script.state.conditions['tourniquet']?.condition).toMatchObject({ isUp: false });
  });

  it('theatreView asks for tests after a risk step whose entry came late', () => {
    const script = monitoredUlnar().at('10:41');
    testAll(script);
    expect(script.view().lead.kind).toBe('stable');
    script.step('nerve-lifted', { eventAt: clock('10:41:02.500') });
    expect(script.view().lead).toMatchObject({ kind: 'not-tested', headline: '2 of 4 sites tested since nerve lifted' });
  });
});
