import { describe, expect, it } from 'vitest';

import { timeChange } from '@/lib/change/time-change';

const pair = { baselineMs: 3.8, currentMs: 4.1, baselineRunCount: 3, markerErrorMs: 0.05, markCount: 1 } as const;

describe('timeChange', () => {
  it('gives the change in ms and percent with its error', () => {
    // 0.3 ms of 3.8 ms is 7.89 %; 0.05 · √(4/3) = 0.0577 ms, 1.52 % of 3.8 ms.
    expect(timeChange(pair)).toEqual({ changeMs: 0.3, changePercent: 7.9, standardErrorMs: 0.058, standardErrorPercent: 1.5 });
  });

  it('errs √2 more with two marks', () => {
    // 0.05 · √2 · √(4/3) = 0.08165 ms.
    expect(timeChange({ ...pair, markCount: 2 }).standardErrorMs).toBe(0.082);
  });

  it('keeps an improvement as a negative change', () => {
    expect(timeChange({ ...pair, baselineMs: 4.1, currentMs: 3.8 })).toMatchObject({ changeMs: -0.3, changePercent: -7.3 });
  });

  it('reaches a limit exactly: 3.5 to 3.85 ms is 10 %', () => {
    expect(timeChange({ ...pair, baselineMs: 3.5, currentMs: 3.85 })).toMatchObject({ changeMs: 0.35, changePercent: 10 });
  });

  it.each([{ baselineMs: 0 }, { currentMs: -1 }, { currentMs: 100.1 }, { markerErrorMs: 5.1 }, { baselineRunCount: 1.5 }])(
    'refuses %o',
    (wrong) => {
      expect(() => timeChange({ ...pair, ...wrong })).toThrow(RangeError);
    },
  );
});
