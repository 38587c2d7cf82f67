import { CHAIN_START, verifyEntry, type StoredEntry } from './verify-entry';

/** All entries were found good, or the first bad one is named. */
export type ChainVerdict = { readonly ok: true; readonly count: number } | { readonly ok: false; readonly seq: number; readonly problem: string };

/**
 * Checks all entries of one case, from its first.
 *
 * Dense numbers, hashes, previous hashes, times that never go back, canonical bytes, known format, and the grammar:
 * case.planned first, only addenda after case.sealed. Does not see a tail that was cut or a chain that was rewritten
 * from end to end and does not judge the bodies.
 *
 * @param stored every entry of the case in its order; not modified
 * @returns how many were good, or the number of the first bad one with a sentence; an empty list is bad at 1
 * @source house rule
 * @accuracy tests/lib/record/verify-chain.test.ts flips every bit of a case
 * @example verifyChain(chainEntries(EMPTY_HEAD, [planned])) // { ok: true, count: 1 }
 */
export function verifyChain(stored: readonly StoredEntry[]): ChainVerdict {
  if (stored.length === 0) return { ok: false, seq: 1, problem: 'It is missing: the case has no entries.' };
  let position = CHAIN_START;
  for (const one of stored) {
    const verdict = verifyEntry(one, position);
    if (!verdict.ok) return { ok: false, seq: position.seq + 1, problem: verdict.problem };
    position = verdict.position;
  }
  return { ok: true, count: stored.length };
}
