/**
 * The moment of milliseconds since 1970.
 * @param ms ms since 1970, within what RFC 3339 can write
 * @returns RFC 3339 in UTC with milliseconds
 * @throws {RangeError} when ms is not finite
 * @source RFC 3339
 * @accuracy exact to 1 ms; tests/lib/units/moment.test.ts
 * @example
 * momentOfMs(1000) // => '1970-01-01T00:00:01.000Z'
 */
export function momentOfMs(ms: number): string {
  return new Date(ms).toISOString();
}
