import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { clockTime, decimal, durationWords, metresPerSecond, milliseconds, millivolts, percent, signed } from '@/lib/text/format';

const nbsp = '\u00a0';

describe('clockTime', () => {
  it.each([
    ['2027-03-14T09:41:20.000Z', 'Europe/Berlin', '10:41', '10:41:20'],
    // Summer time began on 28 March 2027 at 01:00 UTC.
    ['2027-03-28T01:00:00.000Z', 'Europe/Berlin', '03:00', '03:00:00'],
    ['2027-03-14T23:59:59.999Z', 'UTC', '23:59', '23:59:59'],
    ['2027-03-14T00:00:00.000Z', 'UTC', '00:00', '00:00:00'],
    ['2027-03-14T20:30:00.000Z', 'Asia/Kolkata', '02:00', '02:00:00'],
  ])('clockTime of %s in %s is %s', (moment, timeZone, short, long) => {
    expect(clockTime(moment, timeZone)).toBe(short);
    expect(clockTime(moment, timeZone, { seconds: true })).toBe(long);
  });
});

describe('numbers in text', () => {
  it.each([
    [decimal(-0.5, 2), '−0.50'],
    [decimal(-0.001, 2), '0.00'],
    [signed(1.4, 2), '+1.40'],
    [signed(-62, 0), '−62'],
    [signed(0.004, 2), '0.00'],
    [percent(37.6), `38${nbsp}%`],
    [percent(0), `0${nbsp}%`],
    [milliseconds(9.71), `9.71${nbsp}ms`],
    [millivolts(3450), `3.5${nbsp}mV`],
    [metresPerSecond(31.06), `31${nbsp}m/s`],
  ])('%s is written %s', (given, expected) => expect(given).toBe(expected));

  it('numbers never carry a hyphen for a minus, nor minus zero', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e5, max: 1e5, noNaN: true }), fc.integer({ min: 0, max: 3 }), (value, digits) => {
        expect(signed(value, digits)).toMatch(/^[+−]?\d+(\.\d+)?$/);
        expect(signed(value, digits)).not.toMatch(/^[+−]0(\.0+)?$/);
      }),
    );
  });
});

describe('durationWords', () => {
  it.each([
    [-5, `0${nbsp}s`],
    [59_999, `59${nbsp}s`],
    [60_000, `1${nbsp}min`],
    [3_599_999, `59${nbsp}min`],
    [72 * 60_000, `1${nbsp}h 12${nbsp}min`],
  ])('durationWords of %i ms claims no more than has passed: %s', (ms, expected) => expect(durationWords(ms)).toBe(expected));
});
