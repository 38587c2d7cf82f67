import { describe, expect, it } from 'vitest';

import { durationChange } from '@/lib/change/duration-change';

describe('durationChange', () => {
  it('counts two marks in each run', () => {
    // 0.05 · √2 · √2 = 0.1 ms against a single baseline run.
    expect(durationChange({ baselineMs: 5, currentMs: 6, baselineRunCount: 1 })).toEqual({
      changeMs: 1,
      changePercent: 20,
      standardErrorMs: 0.1,
      standardErrorPercent: 2,
    });
  });

  it.each([0.09, 100.1])('refuses a duration of %s ms on either side', (durationMs) => {
    expect(() => durationChange({ baselineMs: durationMs, currentMs: 4, baselineRunCount: 1 })).toThrow(RangeError);
    expect(() => durationChange({ baselineMs: 4, currentMs: durationMs, baselineRunCount: 1 })).toThrow(RangeError);
  });
});
