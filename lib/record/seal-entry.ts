import { assertEntry } from './assert-entry';
import { canonicalBytes } from './canonical-bytes';
import type { Entry, SealedEntry } from './entry';
import { entryHash } from './entry-hash';

/**
 * Writes an entry as bytes and hashes them.
 *
 * @param entry a whole entry; not modified
 * @returns the entry with its canonical bytes and hash
 * @throws {RangeError} when a field has not its form or the body is not plain JSON
 * @source house rule
 * @example sealEntry(entry).hash
 */
export function sealEntry(entry: Entry): SealedEntry {
  assertEntry(entry);
  const bytes = canonicalBytes(entry);
  return { entry, hash: entryHash(bytes), bytes };
}
