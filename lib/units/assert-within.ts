import { assertFinite } from '@/lib/units/assert-finite';
import type { Bound } from '@/lib/units/bounds';

/**
 * Refuses a number outside the limits of its field and says why the limits stand.
 *
 * Method: both limits are allowed values. It guards the arithmetic against a caller's mistake;
 * what a person types is refused earlier, at the door, with the same limits.
 *
 * @param value a number in the unit of the bound
 * @param bound limits with unit and reason, one row of `bounds`
 * @param name what the number is, in the clinic's words, for the sentence of the error
 * @returns nothing; it returns only when the number lies within the limits
 * @throws {RangeError} when the number is not finite, below the lower or above the upper limit
 * @source house rule
 * @accuracy exact; tests/lib/units/assert-within.test.ts
 * @example
 * assertWithin(4, { min: 0, max: 4, unit: '', reason: 'Four stimuli' }, 'train-of-four count') // => undefined
 */
export function assertWithin(value: number, bound: Bound, name: string): void {
  assertFinite(value, name);
  if (value < bound.min || value > bound.max) {
    const unit = bound.unit === '' ? '' : ` ${bound.unit}`;
    throw new RangeError(
      `Cannot use ${name}: ${value}${unit} is outside ${bound.min} to ${bound.max}${unit}. ${bound.reason}`,
    );
  }
}
