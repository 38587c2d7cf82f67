import { describe, expect, it } from 'vitest';

import { metresPerSecond } from '@/lib/text/format';
import { velocityDigits } from '@/lib/text/velocity-digits';

describe('velocityDigits', () => {
  it.each([
    [3.5, 1],
    [9.94, 1],
    [9.95, 0],
    [31.06, 0],
    [-3.5, 1],
  ])('%s m/s is shown with %s digits after the point', (velocityMps, digits) => expect(velocityDigits(velocityMps)).toBe(digits));

  it.each([
    [3.5, '3.5\u00a0m/s'],
    [9.94, '9.9\u00a0m/s'],
    [9.95, '10\u00a0m/s'],
    [54.1, '54\u00a0m/s'],
  ])('a velocity of %s is written %s', (velocityMps, words) => expect(metresPerSecond(velocityMps)).toBe(words));
});
