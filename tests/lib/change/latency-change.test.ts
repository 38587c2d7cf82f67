import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { latencyChange } from '@/lib/change/latency-change';

const onset = fc.integer({ min: 100, max: 100_000 }).map((steps) => steps / 1000);

describe('latencyChange', () => {
  it('assumes one mark of 0.05 ms in each run', () => {
    // 0.05 · √2 = 0.0707 ms against a single baseline run.
    expect(latencyChange({ baselineMs: 3.8, currentMs: 4.1, baselineRunCount: 1 })).toMatchObject({ changeMs: 0.3, standardErrorMs: 0.071 });
  });

  it('takes the mark error of the case', () => {
    expect(latencyChange({ baselineMs: 3.8, currentMs: 4.1, baselineRunCount: 1, markerErrorMs: 0.1 }).standardErrorMs).toBe(0.141);
  });

  it('is the opposite when baseline and run change places', () => {
    fc.assert(
      fc.property(onset, onset, (first, second) => {
        const there = latencyChange({ baselineMs: first, currentMs: second, baselineRunCount: 1 }).changeMs;
        const back = latencyChange({ baselineMs: second, currentMs: first, baselineRunCount: 1 }).changeMs;
        expect(there + back).toBe(0);
      }),
    );
  });

  it.each([0.09, 100.1, Number.NaN])('refuses an onset of %s ms on either side', (onsetMs) => {
    expect(() => latencyChange({ baselineMs: onsetMs, currentMs: 4, baselineRunCount: 1 })).toThrow(RangeError);
    expect(() => latencyChange({ baselineMs: 4, currentMs: onsetMs, baselineRunCount: 1 })).toThrow(RangeError);
  });
});
