/** Under this, in m/s, a whole number would hide a seventh of the value and more: 3.5 is no 4. @source house rule */
const slowBelowMps = 9.95;

/**
 * Digits after the point with which a velocity is shown: whole m/s, and one digit for a very slow nerve.
 *
 * Method: the limit is where one digit would show "10.0". The standard error is shown with as many.
 *
 * @param velocityMps velocity in m/s, finite
 * @returns 0, or 1 under 9.95 m/s
 * @source house rule
 * @accuracy exact at the limit; tests/lib/text/velocity-digits.test.ts
 * @example
 * velocityDigits(3.5) // => 1
 */
export function velocityDigits(velocityMps: number): 0 | 1 {
  return Math.abs(velocityMps) < slowBelowMps ? 1 : 0;
}
