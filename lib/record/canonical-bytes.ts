import canonicalize from 'canonicalize';
import { assertJson } from './assert-json';

/**
 * The one way to write a JSON value as bytes.
 *
 * Keys sorted by UTF-16 code unit, no white space, numbers as ECMAScript prints them, UTF-8. Two engines that agree on
 * the value agree on every byte. Stricter than the RFC in one point: NUL is refused (see `assertJson`).
 *
 * @param value a plain JSON value; not modified
 * @returns a new array of UTF-8 bytes
 * @throws {RangeError} for anything that is not plain JSON: undefined, NaN, a lone surrogate, a date
 * @source RFC 8785, "JSON Canonicalization Scheme"
 * @accuracy tests/lib/record/canonical-bytes.test.ts, the vectors published with the RFC
 * @example new TextDecoder().decode(canonicalBytes({ b: 1, a: 'µV' })) // '{"a":"µV","b":1}'
 */
export function canonicalBytes(value: unknown): Uint8Array {
  assertJson(value, 'value');
  const text = canonicalize(value);
  if (text === undefined) throw new RangeError('value has no JSON form.');
  return new TextEncoder().encode(text);
}
