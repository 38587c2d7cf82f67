import type { SealedEntry } from '@/lib/record/entry';
import { parseEntry } from '@/lib/record/parse-entry';

/** The two columns that an entry is read from. */
export interface EntryRow {
  readonly bytes: Buffer;
  readonly hash: Buffer;
}

/** An entry from its bytes; the columns are for queries and are not trusted here. */
export function readSealedEntry({ bytes, hash }: EntryRow): SealedEntry {
  return { entry: parseEntry(bytes), hash: hash.toString('hex'), bytes: new Uint8Array(bytes) };
}
