/**
 * Refuses a number that is not finite.
 *
 * Method: NaN and both infinities are a mistake of the caller, because every absence in this
 * program has a spelled state of its own. It does not check any range.
 *
 * @param value a number in any unit, expected finite
 * @param name what the number is, in the clinic's words, for the sentence of the error
 * @returns nothing; it returns only when the number is finite
 * @throws {RangeError} when the number is NaN or infinite
 * @source house rule
 * @accuracy exact; tests/lib/units/assert-finite.test.ts
 * @example
 * assertFinite(3.8, 'onset') // => undefined
 */
export function assertFinite(value: number, name: string): void {
  if (!Number.isFinite(value)) {
    throw new RangeError(`Cannot use ${name}: ${String(value)} is not a finite number`);
  }
}
