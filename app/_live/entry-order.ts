import type { WireEntry } from '@/lib/contracts/http/replies';

/** Where an arriving entry stands against what the feed holds. */
export type EntryOrder = 'next' | 'known' | 'gap' | 'broken-link' | 'fork';

/**
 * Compares an arriving entry with the feed.
 * @param held last number and hash of the feed
 * @param knownHash hash that the feed holds at the entry's number, undefined when it is older than what is remembered
 */
export function entryOrder(
  held: { readonly seq: number; readonly hash: string },
  knownHash: string | undefined,
  entry: Pick<WireEntry, 'seq' | 'hash' | 'previousHash'>,
): EntryOrder {
  if (entry.seq <= held.seq) return knownHash !== undefined && knownHash !== entry.hash ? 'fork' : 'known';
  if (entry.seq > held.seq + 1) return 'gap';
  return entry.previousHash === held.hash ? 'next' : 'broken-link';
}
