import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { roundTo } from '@/lib/units/round-to';

const named: readonly (readonly [string, number, number, number])[] = [
  ['rounds halves away from zero', 0.25, 0.1, 0.3],
  ['rounds negative halves away from zero', -0.25, 0.1, -0.3],
  ['rounds below a half towards zero', 0.2499, 0.1, 0.2],
  ['takes 1.005 as the half a person wrote', 1.005, 0.01, 1.01],
  ['takes 2.675 as the half a person wrote', 2.675, 0.01, 2.68],
  ['frees a difference from binary noise', 4.1 - 3.8, 0.001, 0.3],
  ['frees a small half from the noise of a difference', 5.0005 - 5, 0.001, 0.001],
  ['keeps 0.3 mA from 0.1 + 0.2', 0.1 + 0.2, 0.01, 0.3],
  ['keeps a whole step', 100_000, 0.01, 100_000],
  ['rounds to whole numbers', 2.5, 1, 3],
  ['rounds to steps above one', 12.5, 5, 15],
  ['rounds to a step whose inverse is no whole number', 0.9, 0.4, 0.8],
];

describe('roundTo', () => {
  it.each(named)('%s', (_promise, value, resolution, expected) => {
    expect(roundTo(value, resolution)).toBe(expected);
  });

  it('never returns minus zero', () => {
    expect(Object.is(roundTo(-0.0001, 0.01), 0)).toBe(true);
    expect(Object.is(roundTo(-0, 0.01), 0)).toBe(true);
  });

  it.each([
    [Number.NaN, 0.1],
    [Number.POSITIVE_INFINITY, 0.1],
    [1, 0],
    [1, -0.1],
    [1, Number.NaN],
    [1e300, 0.001],
  ])('refuses value %s with resolution %s', (value, resolution) => {
    expect(() => roundTo(value, resolution)).toThrow(RangeError);
  });

  it('is idempotent, odd and within half a step', () => {
    const value = fc.double({ min: -1e5, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(value, fc.constantFrom(0.001, 0.01, 0.1, 1), (any, resolution) => {
        const rounded = roundTo(any, resolution);
        expect(roundTo(rounded, resolution)).toBe(rounded);
        expect(roundTo(-any, resolution)).toBe(rounded === 0 ? 0 : -rounded);
        expect(Math.abs(rounded - any)).toBeLessThanOrEqual(resolution * 0.500001);
      }),
    );
  });

  it('agrees with the decimal digits that were typed', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99_999_999, max: 99_999_999 }), (thousandths) => {
        const typed = Number(`${thousandths}e-3`);
        const hundredths = Math.floor((Math.abs(thousandths) + 5) / 10);
        expect(Math.abs(roundTo(typed, 0.01))).toBe(Number(`${hundredths}e-2`));
      }),
      { numRuns: 20_000 },
    );
  });
});
