import type { CaseState } from '@/lib/case/case-state';
import { evolve } from '@/lib/case/evolve';
import type { FeedEntry } from '@/lib/case/feed-entry';
import { upcast } from '@/lib/case/upcast';

/**
 * The state after an arrived entry, its number and hash included.
 * @param state state up to the entry before; not modified
 * @param entry the next entry; its number must be the state's plus one
 * @returns the state after it; only number and hash move when the body is not for this viewer
 * @throws {RangeError} when the number or the previous hash does not follow
 * @throws {UnknownKindError} for a kind or version this program does not know
 * @source house rule: apply if the number is last plus one and the hash before it is the one held
 * @accuracy exact; tests/lib/case/apply-entry.test.ts
 * @example
 * entries.reduce(applyEntry, initialState(caseId))
 */
export function applyEntry(state: CaseState, entry: FeedEntry): CaseState {
  if (entry.seq !== state.seq + 1) throw new RangeError(`Cannot apply entry ${entry.seq}: the state stands at ${state.seq}`);
  if (entry.previousHash !== state.hash) throw new RangeError(`Cannot apply entry ${entry.seq}: its previous hash is not the one held`);
  const known = upcast(entry);
  const next = known === null ? state : evolve(state, known);
  return { ...next, seq: entry.seq, hash: entry.hash };
}
