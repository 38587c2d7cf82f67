import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { alertCourses } from '@/lib/case/course/alert-courses';
import { courseEntries } from '@/lib/case/course/course-entries';
import { courseInterval, isInTime } from '@/lib/case/course/course-interval';
import { roundIntervals } from '@/lib/case/course/round-intervals';
import { defaultRuleSet } from '@/lib/alert/rule-set';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { randomCase } from '@/tests/lib/case/course/random-case';
import { absent, clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

const of = (script: CaseBuilder) => alertCourses(courseEntries(script.entries));
const ms = (seconds: number) => expect.objectContaining({ ms: seconds * 1000 });

describe('alertCourses', () => {
  it('alertCourses follows an alert from its first bad run to its end, times by hand', () => {
    const alert = of(everyKindCase()).find((one) => one.alertId === 'ulnar-2')!;
    expect(alert).toMatchObject({
      level: 'alert', nerveId: 'ulnar', lastGoodAt: clock('10:30:02'), firstBadAt: clock('10:41:55'), receivedAt: clock('10:41:55'), lateMs: null,
      repeatedAt: clock('10:42:12'), recoveredAt: clock('10:46'),
      end: { kind: 'ended', at: clock('10:46:01'), outcome: 'full', cause: 'surgical', text: 'Lifted too far' },
    });
    expect(alert.steps.map(({ at, since, isRisk, isEnteredLater }) => [at, since, isRisk, isEnteredLater])).toEqual([[clock('10:41:20'), 'nerve lifted', true, false]]);
    expect(alert.rounds.map(({ kind, raisedAt, percentOfBaseline }) => [kind, raisedAt, percentOfBaseline])).toEqual([
      ['notice', clock('10:41:55'), 47],
      ['alert', clock('10:42:12'), 38],
      ['worse', clock('10:44'), 0],
    ]);
    expect(roundIntervals(alert.rounds[1]!, defaultRuleSet)).toEqual({ painted: ms(0), told: ms(9), readBack: ms(13), acted: ms(17), retest: ms(108) });
    expect(roundIntervals(alert.rounds[2]!, defaultRuleSet)).toEqual({ painted: null, told: null, readBack: null, acted: null, retest: null });
    expect(alert.paths).toEqual([
      {
        pathId: 'above-elbow/adm',
        worst: expect.objectContaining({ at: clock('10:44'), percentOfBaseline: 0, isLost: true }),
        slowest: expect.objectContaining({ at: clock('10:42:12'), onsetChangeMs: 1.38 }),
        last: expect.objectContaining({ at: clock('10:46'), percentOfBaseline: 92, isLost: false }),
      },
    ]);
  });

  it('alertCourses keeps notices that settled and alerts that were withdrawn', () => {
    const rows = of(everyKindCase()).map(({ alertId, level, end }) => [alertId, level, end?.kind]);
    expect(rows).toEqual([['ulnar-1', 'notice', 'settled'], ['ulnar-2', 'alert', 'ended'], ['ulnar-3', 'alert', 'withdrawn']]);
    const withdrawn = of(everyKindCase())[2]!;
    expect(withdrawn.rounds.map(({ kind, isRepeated }) => [kind, isRepeated])).toEqual([['notice', null], ['alert', false]]);
    // Typed 2.6 for 8.0 mV: what counts is the corrected run, 93 %.
    expect(withdrawn.paths[0]?.worst?.percentOfBaseline).toBe(93);
  });

  it('alertCourses says when a notice was settled by its repeat', () => {
    expect(of(everyKindCase())[0]).toMatchObject({ firstBadAt: clock('10:36'), repeatedAt: clock('10:36:09') });
  });

  it('alertCourses marks a late first run and a step that was entered after the notice', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:35') });
    script.step('nerve-lifted', { eventAt: clock('10:33') });
    const [alert] = of(script);
    expect(alert).toMatchObject({ firstBadAt: clock('10:35'), receivedAt: clock('10:41'), lateMs: 360_000, end: null });
    expect(alert?.steps).toMatchObject([{ since: 'nerve lifted', isEnteredLater: true }]);
  });

  it('alertCourses tells each raise anew: what was told of the notice is not told of the alert', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(5000).give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'Surgeon', how: 'Aloud', words: 'Ulnar changed' });
    script.wait(5000).run('above-elbow', { adm: absent(20) });
    const rounds = of(script)[0]!.rounds;
    expect(rounds.map(({ kind, told, retestAt }) => [kind, told?.at ?? null, retestAt])).toEqual([
      ['notice', clock('10:41:05'), clock('10:41:10')],
      ['alert', null, null],
    ]);
  });

  it('alertCourses counts as a retest only a run that looks at one of its paths', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(1000).give({ name: 'act-on-alert', alertId: 'ulnar-1', action: 'Traction released' });
    script.wait(1000).run('wrist', { adm: adm('wrist') });
    script.wait(1000).run('above-elbow', { adm: { kind: 'not-read' } });
    expect(of(script)[0]!.rounds.at(-1)!.retestAt).toBeNull();
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.5) });
    expect(of(script)[0]!.rounds.at(-1)!.retestAt).toBe(clock('10:41:06'));
  });

  it('no interval is ever negative, in cases of chance', () => {
    fc.assert(
      fc.property(randomCase, (script) => {
        for (const alert of of(script)) {
          const all = alert.rounds.flatMap((round) => Object.values(roundIntervals(round, defaultRuleSet)));
          const whole = [courseInterval(alert.firstBadAt, alert.receivedAt), courseInterval(alert.firstBadAt, alert.recoveredAt), courseInterval(alert.firstBadAt, alert.end?.at ?? null)];
          const lengths = [...all, ...whole].map((interval) => interval?.ms ?? 0);
          expect(lengths.every((length) => length >= 0)).toBe(true);
          expect(alert.receivedAt >= alert.firstBadAt).toBe(true);
          expect(alert.lastGoodAt === null || alert.lastGoodAt <= alert.firstBadAt).toBe(true);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('courseInterval', () => {
  it.each([
    ['10:41:15', 15_000],
    ['10:41', 0],
    ['10:40:59', 0],
    ['10:40:58.999', null],
  ])('courseInterval from 10:41:00 to %s has %s ms', (to, wanted) => {
    expect(courseInterval(clock('10:41'), clock(to))?.ms).toBe(wanted);
  });

  it('courseInterval is null while a moment is missing', () => {
    expect(courseInterval(null, clock('10:41'))).toBeNull();
    expect(courseInterval(clock('10:41'), null)).toBeNull();
  });

  it('isInTime holds the limit itself and says nothing without one', () => {
    expect(isInTime(courseInterval(clock('10:41'), clock('10:42'), 60_000))).toBe(true);
    expect(isInTime(courseInterval(clock('10:41'), clock('10:42:00.001'), 60_000))).toBe(false);
    expect(isInTime(courseInterval(clock('10:41'), clock('10:42')))).toBeNull();
    expect(isInTime(courseInterval(clock('10:41'), clock('10:30'), 60_000))).toBeNull();
  });
});
