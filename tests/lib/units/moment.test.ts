import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { momentOfMs } from '@/lib/units/moment-of-ms';
import { msOfMoment } from '@/lib/units/ms-of-moment';

describe('momentOfMs and msOfMoment', () => {
  it.each([
    [0, '1970-01-01T00:00:00.000Z'],
    [1, '1970-01-01T00:00:00.001Z'],
    // 2027-03-14 is day 20,891 since 1970: 20,891 · 86,400,000 ms.
    [20_891 * 86_400_000, '2027-03-14T00:00:00.000Z'],
  ])('%i ms is %s, both ways', (ms, moment) => {
    expect(momentOfMs(ms)).toBe(moment);
    expect(msOfMoment(moment)).toBe(ms);
  });

  it('come back to the millisecond', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2_000_000_000 }), (seconds) => {
        expect(msOfMoment(momentOfMs(seconds * 1000 + 7))).toBe(seconds * 1000 + 7);
      }),
    );
  });

  it('refuse what is no time', () => {
    expect(() => momentOfMs(Number.NaN)).toThrow(RangeError);
    expect(() => msOfMoment('10:41')).toThrow(RangeError);
  });
});
