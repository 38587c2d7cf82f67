import { assertEntry } from './assert-entry';
import type { Entry } from './entry';

/**
 * Reads an entry back from its stored bytes.
 *
 * Strict UTF-8, JSON, then the form of every field. Whether the bytes are canonical and where the entry stands in its
 * chain are other questions: `verifyChain` answers them.
 *
 * @param bytes canonical bytes of one entry; not modified
 * @returns the entry
 * @throws {RangeError} with a sentence when the bytes are no entry of a known format
 * @source house rule
 * @example parseEntry(sealed.bytes).seq
 */
export function parseEntry(bytes: Uint8Array): Entry {
  const value = parseJson(bytes);
  assertEntry(value);
  return value;
}

function parseJson(bytes: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes));
  } catch (cause) {
    throw new RangeError('The bytes are not JSON in UTF-8.', { cause });
  }
}
