import type { ChainHead, Entry, JsonObject, SealedEntry } from './entry';
import { sealEntry } from './seal-entry';

/** An entry before it has its place in the chain. The body is checked to be plain JSON when it is sealed. */
export type UnchainedEntry = Omit<Entry, 'format' | 'seq' | 'previousHash' | 'body'> & { readonly body: object };

/**
 * Gives new entries their numbers and hashes, each on the one before.
 *
 * Knows nothing of what else was appended meanwhile: the database refuses a number that is taken, and the caller then
 * reads the head and decides again.
 *
 * @param head the last entry's number and hash, `EMPTY_HEAD` for a new case
 * @param drafts entries in their order; not modified
 * @returns sealed entries, one per draft, numbered from head.seq + 1
 * @throws {RangeError} when a draft's time is lower than the one before, or a field has not its form
 * @source house rule
 * @example chainEntries(EMPTY_HEAD, [planned])[0]?.entry.seq // 1
 */
export function chainEntries(head: ChainHead, drafts: readonly UnchainedEntry[]): SealedEntry[] {
  const chained: SealedEntry[] = [];
  let last = head;
  for (const draft of drafts) {
    if (last.recordedAt !== undefined && draft.recordedAt < last.recordedAt) {
      throw new RangeError(`recordedAt is ${draft.recordedAt}; it may not be lower than ${last.recordedAt} of entry ${last.seq}.`);
    }
    const sealed = sealEntry({ ...draft, body: draft.body as JsonObject, format: 1, seq: last.seq + 1, previousHash: last.hash });
    chained.push(sealed);
    last = { seq: sealed.entry.seq, hash: sealed.hash, recordedAt: sealed.entry.recordedAt };
  }
  return chained;
}
