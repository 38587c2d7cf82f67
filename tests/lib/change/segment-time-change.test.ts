import { describe, expect, it } from 'vitest';

import { segmentTimeChange } from '@/lib/change/segment-time-change';

const baseline = { proximalOnsetMs: 9.1, distalOnsetMs: 7.1 };

describe('segmentTimeChange', () => {
  it('gives both times, the change and its error', () => {
    const current = { proximalOnsetMs: 9.5, distalOnsetMs: 7.1 };
    expect(segmentTimeChange({ baseline, current, baselineRunCount: 1 })).toEqual({
      kind: 'change',
      baselineMs: 2,
      currentMs: 2.4,
      changeMs: 0.4,
      changePercent: 20,
      standardErrorMs: 0.1,
      standardErrorPercent: 5,
    });
  });

  it('cancels a delay common to both sites', () => {
    const later = { proximalOnsetMs: 9.6, distalOnsetMs: 7.6 };
    expect(segmentTimeChange({ baseline, current: later, baselineRunCount: 1 })).toMatchObject({ changeMs: 0, changePercent: 0 });
  });

  it.each([
    ['now', baseline, { proximalOnsetMs: 7, distalOnsetMs: 7 }, 'latencies-equal'],
    ['now', baseline, { proximalOnsetMs: 6, distalOnsetMs: 7 }, 'latencies-exchanged'],
    ['baseline', { proximalOnsetMs: 6, distalOnsetMs: 7 }, baseline, 'latencies-exchanged'],
  ] as const)('is not computable when the onsets %s give no time', (when, before, current, reason) => {
    expect(segmentTimeChange({ baseline: before, current, baselineRunCount: 1 })).toEqual({ kind: 'not-computable', when, reason });
  });
});
