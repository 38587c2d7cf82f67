import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { TodayContext } from '@/lib/text/today-context';
import { todayLine, type TodayLine } from '@/lib/text/today-line';
import { todayNeeds } from '@/lib/text/today-need';
import { todayOrder } from '@/lib/text/today-order';
import { unseenLine } from '@/lib/text/unseen-line';
import { clock } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, testAll } from '@/tests/support/ulnar-case';

const blank = unseenLine('case-1', 'Theatre 1');
const line: fc.Arbitrary<TodayLine> = fc
  .record({ need: fc.constantFrom(...todayNeeds), since: fc.constantFrom('', clock('10:00'), clock('10:01')), place: fc.constantFrom('Theatre 1', 'Theatre 2'), caseId: fc.constantFrom('a', 'b', 'c') })
  .map((change) => ({ ...blank, ...change }));

const alert = monitoredUlnar().at('10:31');
alert.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
alert.at('10:31:20').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
const calm = monitoredUlnar().at('10:31');
testAll(calm);

const context: fc.Arbitrary<TodayContext> = fc.record({
  nowMs: fc.integer({ min: Date.parse(clock('10:31:20')), max: Date.parse(clock('11:30')) }),
  timeZone: fc.constant('UTC'),
  isLive: fc.boolean(),
  deskConnected: fc.boolean(),
  deskSince: fc.constantFrom(null, clock('10:00')),
  peopleConnected: fc.constant([]),
  viewer: fc.constantFrom({ personId: 'p', role: 'physician' }, { personId: 'n', role: 'neurophysiologist' }),
});

describe('todayOrder', () => {
  it('is a total order: nobody stands above themselves, two cases stand one way round, and three in a row', () => {
    fc.assert(
      fc.property(line, line, line, (first, second, third) => {
        expect(todayOrder(first, first)).toBe(0);
        expect(Math.sign(todayOrder(first, second)) + Math.sign(todayOrder(second, first))).toBe(0);
        if (first.caseId !== second.caseId) expect(todayOrder(first, second)).not.toBe(0);
        if (todayOrder(first, second) <= 0 && todayOrder(second, third) <= 0) expect(todayOrder(first, third)).toBeLessThanOrEqual(0);
      }),
      { numRuns: 2000 },
    );
  });

  it('never puts an untold alert below a case without one, live or not, whoever looks', () => {
    fc.assert(
      fc.property(context, context, (one, other) => {
        const [needed, calmer] = [todayLine(alert.state, one), { ...todayLine(calm.state, other), caseId: 'another' }];
        expect(todayOrder(needed, calmer)).toBeLessThan(0);
      }),
      { numRuns: 500 },
    );
  });

  it('never puts a case that is not live below a calm one', () => {
    fc.assert(
      fc.property(context, context, (one, other) => {
        const dark = todayLine(calm.state, { ...one, isLive: false });
        const shown = { ...todayLine(calm.state, { ...other, isLive: true, nowMs: Date.parse(clock('10:31:30')) }), caseId: 'another' };
        expect(dark.isCalm).toBe(false);
        expect(todayOrder(dark, shown)).toBeLessThan(0);
      }),
      { numRuns: 500 },
    );
  });

  it.each([
    ['by need', { need: 'alert-told' }, { need: 'notice' }],
    ['by waiting, longest first', { since: clock('10:00') }, { since: clock('10:01') }],
    ['by theatre', { place: 'Theatre 1' }, { place: 'Theatre 2' }],
    ['by id', { caseId: 'a' }, { caseId: 'b' }],
  ] as const)('%s', (_name, higher, lower) => {
    expect(todayOrder({ ...blank, ...higher }, { ...blank, ...lower })).toBeLessThan(0);
  });
});
