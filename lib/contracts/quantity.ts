import { z } from 'zod';

import { bounds, type BoundedQuantity } from '@/lib/units/bounds';

/**
 * A number inside its limits; both messages, for no number and for a number outside, say what is allowed.
 * @param min least number allowed, in the field's own unit
 * @param max greatest number allowed, in the same unit
 * @param allowed the limits in words: "1 to 99 % is allowed"
 * @param reason why they are there; empty where the words say enough
 * @returns a schema of a finite number
 * @source house rule: an error says what is wrong and what is allowed
 */
export const boundedNumber = (min: number, max: number, allowed: string, reason = '') => {
  const limits = reason === '' ? allowed : `${allowed}. ${reason}`;
  return z.number({ error: `Not a number: ${limits}` }).min(min, `Out of range: ${limits}`).max(max, `Out of range: ${limits}`);
};

/**
 * A number inside the bounds of its quantity; the message says the value's limits and why they are there.
 * @returns a schema of the number in the unit of the quantity
 * @source house rule: limits and reasons from the bounds of the units
 */
export const quantity = (name: BoundedQuantity) => {
  const { min, max, unit, reason } = bounds[name];
  return boundedNumber(min, max, `${min} to ${max}${unit === '' ? '' : ` ${unit}`} is allowed`, reason);
};
