import { describe, expect, it } from 'vitest';

import { assertFinite } from '@/lib/units/assert-finite';

describe('assertFinite', () => {
  it.each([0, -0, -1e308, 5e-324])('lets %s pass', (value) => {
    expect(() => assertFinite(value, 'onset')).not.toThrow();
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])('refuses %s with its name and value', (value) => {
    expect(() => assertFinite(value, 'onset')).toThrow(new RangeError(`Cannot use onset: ${value} is not a finite number`));
  });
});
