import { assertFinite } from '@/lib/units/assert-finite';

/** A change and its standard error in the same unit. */
export interface ChangeWithError {
  readonly change: number;
  readonly standardError: number;
}

/** Standard errors a change has to exceed. */
const standardErrorsNeeded = 2;

/**
 * Whether a change is larger than the scatter of the measurement explains.
 *
 * Method: more than twice the standard error, in either direction. About one quiet run in twenty
 * passes it by chance, which is why a finding asks for its repeat. It never vetoes a loss: an
 * absent response is judged without it.
 *
 * @param measured signed change and its standard error in one and the same unit; the error is 0 or more
 * @returns true when the change exceeds two standard errors, false at exactly two and below
 * @throws {RangeError} when a number is not finite or the error is negative
 * @source house rule (two standard errors, about 95 %)
 * @accuracy exact at the limit; tests/lib/change/is-beyond-noise.test.ts
 * @example
 * isBeyondNoise({ change: -30, standardError: 9.2 }) // => true
 * isBeyondNoise({ change: 0.1, standardError: 0.05 }) // => false
 */
export function isBeyondNoise(measured: ChangeWithError): boolean {
  assertFinite(measured.change, 'change');
  assertFinite(measured.standardError, 'standard error');
  if (measured.standardError < 0) {
    throw new RangeError(`Cannot use standard error: ${measured.standardError} is below 0`);
  }
  return Math.abs(measured.change) > standardErrorsNeeded * measured.standardError;
}
