import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { blindTimes, type BlindTimes } from '@/lib/case/course/blind-times';
import { courseEntries, inEventOrder } from '@/lib/case/course/course-entries';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { oracleCause } from '@/tests/lib/case/course/blind-oracle';
import { blindScript } from '@/tests/lib/case/course/record-script';
import { randomCase } from '@/tests/lib/case/course/random-case';
import { clock, type CaseBuilder } from '@/tests/support/case-builder';
import { monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const of = (script: CaseBuilder) => blindTimes(courseEntries(script.entries));
const causeAt = (times: BlindTimes, nerveId: string, ms: number) => times.nerves.find((one) => one.nerveId === nerveId)?.time.intervals.find((one) => one.fromMs <= ms && ms < one.toMs)?.cause ?? null;

/** Every step of the monitoring time against the oracle; what differs, with its time. */
function differences(script: CaseBuilder, stepMs: number): readonly string[] {
  const entries = courseEntries(script.entries);
  const times = blindTimes(entries);
  return times.monitored.flatMap(({ fromMs, toMs }) =>
    Array.from({ length: Math.ceil((toMs - fromMs) / stepMs) }, (_, index) => fromMs + index * stepMs).flatMap((ms) => {
      const [told, wanted] = [causeAt(times, 'ulnar', ms), oracleCause(entries, 'ulnar', ms)];
      return told === wanted ? [] : [`${new Date(ms).toISOString()}: ${told}, oracle ${wanted}`];
    }),
  );
}

describe('blindTimes', () => {
  it('blindTimes tells each cause with its time, worked by hand', () => {
    const { whole, monitoringMs } = of(blindScript());
    const at = (fromMs: number) => new Date(fromMs).toISOString().slice(11, 19);
    const rows = whole.intervals.map(({ fromMs, toMs, cause }) => `${at(fromMs)} to ${at(toMs)} ${cause}`);
    expect(rows).toEqual([
      // Baseline accepted and monitoring begun at 10:10:00, the first full test ends at 10:30:04.
      '10:10:00 to 10:30:04 not-tested-in-time',
      // The axilla of 10:30:01 grows older than five minutes.
      '10:35:01 to 10:40:00 not-tested-in-time',
      '10:40:00 to 10:42:04 not-tested-since-step',
      '10:44:00 to 10:45:00 paused',
      '10:46:00 to 10:46:30 not-compared',
      // The axilla of 10:42:01.
      '10:47:01 to 10:50:00 not-tested-in-time',
      '10:50:00 to 10:51:00 other-phase',
      '10:51:00 to 10:52:04 not-tested-in-time',
      // The last path of all, the control, is lost at 10:52:05; the first one is back at 10:54:01.
      '10:52:05 to 10:54:01 cannot-be-judged',
      // The run of 10:57 entered at 10:59 keeps the wrist fresh; the axilla of 10:54:01 does not last.
      '10:59:01 to 11:05:00 not-tested-in-time',
    ]);
    expect(monitoringMs).toBe(55 * 60_000);
    expect(whole.msByCause['paused']).toBe(60_000);
    expect(whole.msByCause['not-tested-since-step']).toBe(124_000);
  });

  it('blindTimes agrees with the oracle second by second', () => {
    expect(differences(blindScript(), 1000)).toEqual([]);
    expect(differences(everyKindCase(), 1000)).toEqual([]);
  });

  it('the control: an oracle of another case finds differences', () => {
    const entries = courseEntries(everyKindCase().entries);
    const times = of(blindScript());
    expect(causeAt(times, 'ulnar', Date.parse(clock('10:44:30')))).not.toBe(oracleCause(entries, 'ulnar', Date.parse(clock('10:44:30'))));
  });

  it('blindTimes is blind for want of a baseline from the first second of monitoring', () => {
    const script = openedCase().at('10:05');
    script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    script.at('10:15').give({ name: 'change-phase', phase: 'take-down', reason: null });
    expect(of(script).whole.msByCause).toEqual({ 'no-baseline': 600_000 });
  });

  it('blindTimes of a case that was never monitored is nothing', () => {
    expect(of(openedCase())).toMatchObject({ monitoringMs: 0, monitored: [], nerves: [] });
  });

  it('blindTimes holds a run that came late to its own time', () => {
    const script = monitoredUlnar();
    script.at('10:50').give({ name: 'change-phase', phase: 'take-down', reason: null });
    const before = of(script).whole.blindMs;
    script.run('axilla', { adm: { kind: 'measured', onsetMs: 10.77, amplitudeUv: 8600, durationMs: null } }, {}, { eventAt: clock('10:34') });
    // The axilla is fresh until 10:39:00 instead of 10:35:01, but above elbow of 10:30:02 is not: one second is won.
    expect(before - of(script).whole.blindMs).toBe(1000);
  });

  it('blindTimes never exceeds the monitoring time, overlaps nothing, and agrees with the oracle in cases of chance', () => {
    fc.assert(
      fc.property(randomCase, (script) => {
        const times = of(script);
        for (const { time } of [{ time: times.whole }, ...times.nerves]) {
          expect(time.blindMs).toBeLessThanOrEqual(times.monitoringMs);
          expect(time.intervals.every(({ fromMs, toMs }) => toMs > fromMs)).toBe(true);
          expect(time.intervals.every(({ fromMs }, index) => index === 0 || fromMs >= time.intervals[index - 1]!.toMs)).toBe(true);
        }
        expect(differences(script, 7000)).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });
});

describe('inEventOrder', () => {
  it('inEventOrder puts the plan first and a late entry at its own time', () => {
    const script = blindScript();
    const kinds = inEventOrder(courseEntries(script.entries));
    expect(kinds[0]?.kind).toBe('case.planned');
    expect(kinds.map((entry) => entry.eventAt).slice(1)).toEqual(kinds.map((entry) => entry.eventAt).slice(1).sort());
  });
});
