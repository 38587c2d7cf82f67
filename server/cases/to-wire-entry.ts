import type { WireEntry } from '@/lib/contracts/http/replies';
import type { SealedEntry } from '@/lib/record/entry';

/** A committed entry as it travels to people: the hashed fields and the hash. */
export function toWireEntry({ entry, hash }: SealedEntry): WireEntry {
  return { ...entry, hash, body: entry.body };
}
