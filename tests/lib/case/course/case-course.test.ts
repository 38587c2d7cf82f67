import { describe, expect, it } from 'vitest';

import { caseCourse } from '@/lib/case/course/case-course';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { clock } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, openedCase, testAll } from '@/tests/support/ulnar-case';

describe('caseCourse', () => {
  it('caseCourse tells the moments of the case', () => {
    expect(caseCourse(everyKindCase().entries).times).toMatchObject({
      plannedAt: clock('10:00'), openedAt: clock('10:01'), timeoutAt: clock('10:01:01'), monitoringAt: clock('10:30'), monitoringEndedAt: clock('11:10'), closedAt: clock('11:20'),
    });
    expect(caseCourse(monitoredUlnar().entries).times).toMatchObject({ monitoringAt: clock('10:10'), monitoringEndedAt: null, closedAt: null });
  });

  it('caseCourse sets closing against opening, by hand', () => {
    const { nerves, segments } = caseCourse(everyKindCase().entries);
    const adms = nerves[0]!.paths.filter((path) => path.channelId === 'adm');
    // Wrist: 0.99 of 9,400 µV and the same onset. Above elbow: 0.92 and 0.1 ms later. The nerve was transposed after all of them.
    expect(adms.map(({ siteId, percentOfOpening, onsetChangeMs, isAfterLastRiskStep }) => [siteId, percentOfOpening, onsetChangeMs, isAfterLastRiskStep])).toEqual([
      ['axilla', 93, 0, false],
      ['above-elbow', 92, 0.1, false],
      ['below-elbow', 98, 0.01, false],
      ['wrist', 99, 0, false],
    ]);
    const elbow = segments.find((one) => one.channelId === 'adm' && one.proximalSiteId === 'above-elbow')!;
    // 100 mm in 8.31 − 6.46 = 1.85 ms are 54.05 m/s.
    expect(elbow.opening).toMatchObject({ kind: 'velocity', distanceMm: 100 });
    expect(elbow.opening?.kind === 'velocity' && elbow.opening.velocityMps).toBeCloseTo(54.05, 2);
  });

  it('caseCourse keeps the opening baseline when the working one moves', () => {
    const script = monitoredUlnar().at('10:50');
    for (let count = 0; count < 3; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist', 0.5) }, { purpose: 'baseline' });
    script.wait(1000).give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Arm moved' });
    script.wait(1000).run('wrist', { adm: adm('wrist', 0.5) });
    const { nerves, baselines } = caseCourse(script.entries);
    expect(nerves[0]!.paths.find((path) => path.pathId === 'wrist/adm')).toMatchObject({ percentOfOpening: 50 });
    expect(baselines.map(({ isOpening, setAfterPercent }) => [isOpening, setAfterPercent])).toEqual([[true, null], [false, -50]]);
  });

  it('caseCourse gives no percent where the last run is not like the opening baseline', () => {
    const script = monitoredUlnar().at('10:50');
    script.run('wrist', { adm: adm('wrist', 0.5) }, { electrodeId: 'needle' });
    expect(caseCourse(script.entries).nerves[0]!.paths.find((path) => path.pathId === 'wrist/adm')).toMatchObject({ percentOfOpening: null, closing: { notCompared: 'electrode-differs' } });
  });

  it('caseCourse tells the smallest loss that could be seen, and the physician’s acceptance', () => {
    const { baselines } = caseCourse(everyKindCase().entries);
    expect(baselines[0]).toMatchObject({ isOpening: true, isProvisional: true, confirmedAt: baselines[0]!.at, correctedBySeqs: [] });
    // Three equal runs: scatter at its floor of 3 %, 200 · 0.03 · √(4/3) = 6.9 %. One run: 8 % assumed, 200 · 0.08 · √2 = 22.6 %.
    expect(baselines[0]!.paths.map(({ pathId, smallestLossPercent, isScatterAssumed }) => [pathId, smallestLossPercent, isScatterAssumed]).filter(([id]) => id === 'wrist/adm' || id === 'median-wrist/apb')).toEqual([
      ['wrist/adm', 6.9, false],
      ['median-wrist/apb', 22.6, true],
    ]);
  });

  it('caseCourse marks a baseline whose run was corrected', () => {
    const script = monitoredUlnar().at('10:41');
    const runSeq = script.state.runs.find((run) => run.run.siteId === 'wrist')!.seq;
    script.give({ name: 'correct-run', runSeq, run: null, reason: 'Wrong site' });
    expect(caseCourse(script.entries).baselines[0]!.correctedBySeqs).toEqual([script.seq]);
  });

  it('caseCourse sets advice beside its confirmation, and lists examinations and late entries', () => {
    const course = caseCourse(everyKindCase().entries);
    expect(course.talk.map(({ kind, text, confirmed }) => [kind, text, confirmed?.at ?? null])).toEqual([
      ['message', 'Agree, focal at the elbow', null],
      ['advice', 'Test below the elbow too', clock('10:58:04')],
    ]);
    expect(course.examinations).toHaveLength(1);
    expect(course.late).toEqual([]);
  });

  it('caseCourse reads a case without an entry, a planned one and one of 2,000 entries', () => {
    expect(caseCourse([])).toMatchObject({ alerts: [], runs: [], opened: null, times: { plannedAt: null } });
    expect(caseCourse(openedCase().entries)).toMatchObject({ opened: null, blind: { monitoringMs: 0 } });
    const script = monitoredUlnar();
    while (script.entries.length < 2000) testAll(script.wait(20_000));
    const course = caseCourse(script.entries);
    expect(course.runs.length).toBe(script.state.runCount);
  });

  it('caseCourse leaves its entries as they were', () => {
    const { entries } = everyKindCase();
    const before = JSON.stringify(entries);
    caseCourse(entries);
    expect(JSON.stringify(entries)).toBe(before);
  });
});
