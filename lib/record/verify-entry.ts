import { canonicalBytes } from './canonical-bytes';
import { NO_HASH, type Entry } from './entry';
import { entryHash } from './entry-hash';
import { parseEntry } from './parse-entry';

/** An entry as it was stored or handed over. */
export interface StoredEntry {
  readonly bytes: Uint8Array;
  readonly hash: string;
}

/** What verification remembers between two entries, so that a long case can be read in batches. */
export interface ChainPosition {
  readonly seq: number;
  readonly hash: string;
  readonly recordedAt: string;
  readonly hospitalId: string | null;
  readonly caseId: string | null;
  readonly isSealed: boolean;
}

/** Where verification of a case begins. */
export const CHAIN_START: ChainPosition = { seq: 0, hash: NO_HASH, recordedAt: '', hospitalId: null, caseId: null, isSealed: false };

/** The entry was found good, or one sentence says what is wrong. */
export type EntryVerdict =
  | { readonly ok: true; readonly entry: Entry; readonly position: ChainPosition }
  | { readonly ok: false; readonly problem: string };

/**
 * Checks one stored entry against the position before it.
 *
 * Trusts nothing but the bytes: hash, form, canonical writing (which also finds a key that stands twice), number,
 * previous hash, case, time and the grammar of a case. Cannot see a tail that was cut or a chain that was rewritten from
 * end to end: that needs a head kept elsewhere.
 *
 * @param stored bytes and hash as kept; not modified
 * @param before position after the entry before, `CHAIN_START` for the first
 * @returns the entry with the next position, or the first problem as a sentence
 * @source house rule
 * @example verifyEntry(stored, CHAIN_START).ok
 */
export function verifyEntry(stored: StoredEntry, before: ChainPosition): EntryVerdict {
  const hash = entryHash(stored.bytes);
  if (hash !== stored.hash) return { ok: false, problem: `Its bytes have the hash ${short(hash)}, but ${short(stored.hash)} is stored.` };
  let entry: Entry;
  try {
    entry = parseEntry(stored.bytes);
    if (!areEqual(canonicalBytes(entry), stored.bytes)) {
      return { ok: false, problem: 'Its bytes are not in canonical form: key order, spacing, a number written otherwise, or a key that stands twice.' };
    }
  } catch (cause) {
    return { ok: false, problem: `Its bytes are no entry: ${cause instanceof Error ? cause.message : 'unreadable.'}` };
  }
  const problem = placeProblem(entry, before) ?? grammarProblem(entry, before);
  if (problem !== null) return { ok: false, problem };
  const { seq, recordedAt, hospitalId, caseId, kind } = entry;
  return { ok: true, entry, position: { seq, hash, recordedAt, hospitalId, caseId, isSealed: before.isSealed || kind === 'case.sealed' } };
}

function placeProblem(entry: Entry, before: ChainPosition): string | null {
  if (entry.seq !== before.seq + 1) return `It says that it is number ${entry.seq}, but ${before.seq + 1} is next.`;
  if (entry.previousHash !== before.hash) return `It follows hash ${short(entry.previousHash)}, but the entry before has ${short(before.hash)}.`;
  if (before.caseId !== null && entry.caseId !== before.caseId) return `It belongs to case ${entry.caseId}.`;
  if (before.hospitalId !== null && entry.hospitalId !== before.hospitalId) return `It belongs to hospital ${entry.hospitalId}.`;
  if (entry.recordedAt < before.recordedAt) return `It was recorded at ${entry.recordedAt}, before the entry before it, at ${before.recordedAt}.`;
  return null;
}

function grammarProblem(entry: Entry, before: ChainPosition): string | null {
  const isFirst = before.seq === 0;
  if (isFirst && entry.kind !== 'case.planned') return `It is ${entry.kind}, but the first entry of a case is case.planned.`;
  if (!isFirst && entry.kind === 'case.planned') return 'It is case.planned, which stands only at the beginning of a case.';
  if (before.isSealed && !entry.kind.startsWith('addendum.')) return `It is ${entry.kind}, but after case.sealed only addenda may follow.`;
  return null;
}

function areEqual(left: Uint8Array, right: Uint8Array): boolean {
  return left.length === right.length && left.every((byte, index) => byte === right[index]);
}

function short(hash: string): string {
  return `${hash.slice(0, 12)}…`;
}
