/**
 * Milliseconds since 1970 of a moment.
 * @param moment RFC 3339 in UTC with milliseconds
 * @returns ms
 * @throws {RangeError} when the text is no moment
 * @source RFC 3339
 * @accuracy exact to 1 ms; tests/lib/units/moment.test.ts
 * @example
 * msOfMoment('1970-01-01T00:00:01.000Z') // => 1000
 */
export function msOfMoment(moment: string): number {
  const ms = Date.parse(moment);
  if (Number.isNaN(ms)) throw new RangeError(`Cannot read time: "${moment}" is not RFC 3339`);
  return ms;
}
