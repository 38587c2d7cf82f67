import { describe, expect, it } from 'vitest';

import { amplitudeChange } from '@/lib/change/amplitude-change';
import { amplitudeRatio } from '@/lib/change/amplitude-ratio';
import { durationChange } from '@/lib/change/duration-change';
import { latencyChange } from '@/lib/change/latency-change';
import { segmentTimeChange } from '@/lib/change/segment-time-change';
import { normalDraws, spread } from '@/tests/reference/normal-draws';

/** How far a formula may lie from the draws, as a share of their deviation. */
const tolerance = { value: 0.04, reason: 'second order of the quotient, rounding to 0.1 points and the chance of 60,000 draws' };
const drawCount = 60_000;
const runs = 3;

const draw = normalDraws(7);
const deviationOf = (sample: () => number): number => spread(Array.from({ length: drawCount }, sample)).deviation;
const meanOf = (one: () => number): number => (one() + one() + one()) / runs;
const scatter = { coefficientOfVariation: 0.08, baselineRunCount: runs };
const amplitude = (trueUv: number) => () => trueUv * (1 + 0.08 * draw());
const mark = (trueMs: number) => trueMs + 0.05 * draw();
const expectClose = (standardError: unknown, deviation: number): void => {
  expect(Math.abs(Number(standardError) / deviation - 1)).toBeLessThan(tolerance.value);
};

describe('the error of a change against random draws', () => {
  it.each([0.5, 1, 1.5])('amplitude at %f of baseline', (share) => {
    const deviation = deviationOf(() => (100 * amplitude(8000 * share)()) / meanOf(amplitude(8000)));
    const change = amplitudeChange({ baselineUv: 8000, currentUv: 8000 * share, ...scatter });
    expectClose(change.kind === 'change' && change.standardErrorPercent, deviation);
  });

  it('proximal/distal ratio', () => {
    const baselineRatio = () => meanOf(amplitude(8000)) / meanOf(amplitude(10_000));
    const deviation = deviationOf(() => (100 * (amplitude(4000)() / amplitude(10_000)())) / baselineRatio());
    const change = amplitudeRatio({ baseline: { proximalUv: 8000, distalUv: 10_000 }, current: { proximalUv: 4000, distalUv: 10_000 }, ...scatter });
    expectClose(change.kind === 'ratio' && change.standardErrorPercent, deviation);
  });

  it('latency', () => {
    const deviation = deviationOf(() => mark(4.1) - meanOf(() => mark(3.8)));
    expectClose(latencyChange({ baselineMs: 3.8, currentMs: 4.1, baselineRunCount: runs }).standardErrorMs, deviation);
  });

  it('duration', () => {
    const duration = (trueMs: number) => () => mark(10 + trueMs) - mark(10);
    const deviation = deviationOf(() => duration(6.9)() - meanOf(duration(5.6)));
    expectClose(durationChange({ baselineMs: 5.6, currentMs: 6.9, baselineRunCount: runs }).standardErrorMs, deviation);
  });

  it('conduction time of a segment', () => {
    const time = (trueMs: number) => () => mark(7 + trueMs) - mark(7);
    const deviation = deviationOf(() => time(2.5)() - meanOf(time(2)));
    const change = segmentTimeChange({
      baseline: { proximalOnsetMs: 9, distalOnsetMs: 7 },
      current: { proximalOnsetMs: 9.5, distalOnsetMs: 7 },
      baselineRunCount: runs,
    });
    expectClose(change.kind === 'change' && change.standardErrorMs, deviation);
  });
});
