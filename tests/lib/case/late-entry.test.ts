import { describe, expect, it } from 'vitest';

import { isSince } from '@/lib/case/is-since';
import { sayThis } from '@/lib/text/say-this';
import { absent, clock, measured } from '@/tests/support/case-builder';
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
  it('decide raises what a late entry shows although a newer run of the path is good, and keeps it until the next test', () => {
    const script = monitoredUlnar().at('10:41');
    testAll(script);
    expect(script.view().lead.kind).toBe('stable');
    expect(script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:32') })).toEqual(['notice.raised']);
    // The good run of 10:41 came after it, so it is no last good; that of 10:30:02 is not held any more.
    expect(script.entries.at(-1)?.body).toMatchObject({ firstBadAt: clock('10:32'), lastGoodAt: null });
    expect(script.view().lead).toMatchObject({ kind: 'notice', priority: 'medium', headline: 'Ulnar response was lost' });
    expect(script.view().lead.detail).toContain('From 10:32, received 10:41');
    // A test elsewhere on the nerve answers nothing, and time alone neither settles nor calls it "not repeated".
    expect(script.wait(1000).run('wrist', { adm: adm('wrist') })).toEqual([]);
    expect(script.wait(120_000).timers()).toEqual([]);
    expect(script.refused({ name: 'miss-repeat', alertId: 'ulnar-1' }).code).toBe('repeat-not-due');
    expect(script.run('above-elbow', { adm: adm('above-elbow') })).toEqual(['notice.settled']);
  });

  it.each([
    ['a loss', absent(18), 'Ulnar response was lost', 'Ulnar, ADM, was without response, stimulating at above elbow. Once, being repeated.'],
    ['a fall', adm('above-elbow', 0.38), 'Ulnar was at 38\u00a0% of baseline', 'Ulnar, ADM, was at 38 per cent of baseline, stimulating at above elbow. Once, being repeated.'],
    // 8.31 to 9.81 ms is +18 %; with below elbow at 6.46 ms of 10:41 the stretch takes 3.35 in place of 1.85 ms.
    ['a slowed stretch', adm('above-elbow', 1, 1.5), 'Ulnar was slower', 'Ulnar, ADM, was slower than baseline, stimulating at above elbow. Once, being repeated.'],
    // 8.31 to 9.21 ms is +10.8 %; the stretch is not computed without the onset of its other end.
    ['a late onset alone', adm('axilla', 1, 1.2), 'Ulnar was later', 'Ulnar, ADM, was slower than baseline, stimulating at axilla.'],
  ] as const)('incidentHeadline and sayThis say in the past what newer runs do not show any more: %s', (_case, reading, headline, said) => {
    const script = monitoredUlnar().at('10:41');
    testAll(script);
    if (headline === 'Ulnar was later') script.wait(1000).run('above-elbow', { adm: measured(null, 8900) });
    script.run(headline === 'Ulnar was later' ? 'axilla' : 'above-elbow', { adm: reading }, {}, { eventAt: clock('10:32') });
    expect(script.view().lead.headline).toBe(headline);
    expect(sayThis(script.state, script.state.incidents['ulnar']!)).toBe(said);
  });

  it('decide makes an alert of two late entries that newer good runs had hidden, and only a person ends it', () => {
    const script = monitoredUlnar().at('10:41');
    testAll(script);
    script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:32') });
    expect(script.run('axilla', { adm: absent(18) }, {}, { eventAt: clock('10:32:20') })).toEqual(['alert.raised']);
    expect(script.view().lead).toMatchObject({ kind: 'alert', priority: 'high', isFlashing: true, headline: 'Ulnar response was lost' });
    expect(script.view().lead.detail).toContain('From 10:32, received 10:41');
    expect(script.wait(1000).run('wrist', { adm: adm('wrist') })).toEqual([]);
    for (const site of ['above-elbow', 'axilla', 'above-elbow', 'axilla'] as const) script.wait(1000).run(site, { adm: adm(site) });
    expect(script.view().lead.kind).toBe('recovered');
    expect(script.wait(3_600_000).timers()).toEqual([]);
    expect(script.state.incidents['ulnar']?.level).toBe('alert');
  });

  it.each([
    ['on the same path', 'above-elbow', 0],
    ['on another path of the nerve', 'axilla', 0],
    ['unless a good run of the path lies between', 'above-elbow', 1],
  ] as const)('decide confirms a late loss by a known one whose notice was settled since, %s', (_case, site, goodBetween) => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    for (let count = 0; count < goodBetween; count += 1) script.wait(5000).run('above-elbow', { adm: adm('above-elbow') });
    script.at('10:41:40').run('above-elbow', { adm: adm('above-elbow') });
    script.run('axilla', { adm: adm('axilla') });
    expect(script.state.incidents).toEqual({});
    const kinds = script.at('10:46').run(site, { adm: adm(site, 0.3) }, {}, { eventAt: clock('10:41:20') });
    expect(kinds).toEqual(goodBetween === 1 ? ['notice.raised'] : ['notice.raised', 'alert.raised']);
    if (goodBetween === 1) return;
    expect(script.state.incidents['ulnar']).toMatchObject({
      level: 'alert', isRepeated: true, firstBadAt: clock('10:41'), worstPercentOfBaseline: 30, lastGoodAt: null,
    });
    expect(script.view().lead).toMatchObject({ priority: 'high', headline: 'Ulnar was at 30\u00a0% of baseline' });
    expect(script.view().lead.detail).toContain('From 10:41, received 10:46');
  });

  it('decide raises a late loss from before a risk step that the newer runs came after', () => {
    const script = monitoredUlnar().at('10:35');
    script.step('nerve-lifted');
    testAll(script.at('10:41'));
    expect(script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:32') })).toEqual(['notice.raised']);
    expect(script.view().lead.kind).toBe('notice');
    expect(script.state.incidents['ulnar']?.stepsBetween).toEqual([]);
  });

  it('decide calls a late loss "not repeated" at once where nothing newer of its path is known', () => {
    const script = monitoredUlnar().at('10:41');
    expect(script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:32') })).toEqual(['notice.raised']);
    expect(script.timers()).toEqual(['alert.raised']);
    expect(script.view().lead.detail).toContain('Not repeated');
  });

  it('decide settles a late loss by a late repeat, as it would have been in time', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:32') });
    expect(script.run('above-elbow', { adm: adm('above-elbow') }, {}, { eventAt: clock('10:32:20') })).toEqual(['notice.settled']);
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

  it('decide takes the recovery back when a late loss lies between its two runs', () => {
    const script = monitoredUlnar().at('10:41');
    for (const share of [0.38, 0.38, 1, 1]) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', share) });
    expect(script.wait(5000).run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:41:17') })).toEqual(['alert.worsened']);
    expect(script.entries.at(-1)?.body).toMatchObject({ worsening: ['returned'] });
    expect(script.view().lead).toMatchObject({ kind: 'alert', headline: 'Ulnar response was lost' });
  });

  it('decide says the earlier onset that a late entry shows of an alert that is open, and keeps told', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(5000).run('above-elbow', { adm: absent(18) });
    script.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'Surgeon', how: 'Aloud', words: 'No ulnar response' });
    expect(script.at('10:45').run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:33') })).toEqual(['alert.raised']);
    expect(script.view().lead.detail).toContain('Last good 10:30, first seen 10:33. From 10:33, received 10:45');
    expect(script.state.incidents['ulnar']).toMatchObject({ isLost: true, toldAt: clock('10:41:10'), paintedAt: null });
  });

  it('decide keeps the bracket of an open alert when a late entry is older than its last good run', () => {
    const script = monitoredUlnar().at('10:39');
    testAll(script);
    for (let count = 0; count < 2; count += 1) script.at('10:41').wait(5000 * count).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    expect(script.at('10:45').run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:33') })).toEqual([]);
    expect(script.state.incidents['ulnar']).toMatchObject({ firstBadAt: clock('10:41'), lastGoodAt: clock('10:39:02') });
  });

  it('evolve puts a late step into the onset bracket of an open change, and no step from outside it', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(30_000).step('nerve-lifted', { eventAt: clock('10:40') });
    script.step('retractor-placed', { eventAt: clock('10:29') });
    script.step('cautery-near-nerve');
    expect(script.state.incidents['ulnar']?.stepsBetween).toEqual(['nerve lifted']);
    expect(script.view().lead.detail).toContain('after nerve lifted');
  });

  it('evolve keeps distances void that were measured before the step, however late they come', () => {
    const script = monitoredUlnar().at('10:40');
    script.step('nerve-transposed');
    const positions = script.plan.nerves.find((nerve) => nerve.id === 'ulnar')!.sites.map(({ id, positionMm }) => ({ siteId: id, positionMm }));
    const measure = { name: 'measure-distances', nerveId: 'ulnar', positions, reason: null } as const;
    script.at('10:42').give(measure, { eventAt: clock('10:39:59.999') });
    expect(script.state.distancesVoidSince).toEqual({ ulnar: clock('10:40') });
    script.give(measure, { eventAt: clock('10:40:01') });
    expect(script.state.distancesVoidSince).toEqual({});
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
