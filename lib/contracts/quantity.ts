import { z } from 'zod';

import { bounds, type BoundedQuantity } from '@/lib/units/bounds';

/**
 * A number inside the bounds of its quantity; the message says the value's limits and why they are there.
 * @returns a schema of the number in the unit of the quantity
 * @source house rule: limits and reasons from the bounds of the units
 */
export const quantity = (name: BoundedQuantity) => {
  const { min, max, unit, reason } = bounds[name];
  const message = `Out of range: ${min} to ${max} ${unit} is allowed. ${reason}`;
  return z.number({ error: 'Not a number' }).min(min, message).max(max, message);
};
