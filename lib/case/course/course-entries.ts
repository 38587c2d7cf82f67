import type { CaseEntry } from '@/lib/case/entry-bodies';
import type { FeedEntry } from '@/lib/case/feed-entry';
import { upcast } from '@/lib/case/upcast';

/**
 * The entries of a log that can be read, at the newest version of their kinds.
 * @param entries the log, oldest first; not modified
 * @returns entries in the order of the log; those whose body is not for this viewer are left out
 * @throws {UnknownKindError} for a kind or version this program does not know
 * @source house rule: kinds are for ever
 * @example
 * courseEntries(entries).length
 */
export function courseEntries(entries: readonly FeedEntry[]): readonly CaseEntry[] {
  return entries.map(upcast).filter((entry) => entry !== null);
}

/**
 * The same entries in the order in which things were done: by event time, then by number.
 *
 * Method: a stable sort. The plan comes first whatever its time, because every other entry is read on it.
 *
 * @param entries entries in the order of the log; not modified
 * @returns a sorted copy
 * @source house rule: a late entry counts at its own time
 * @accuracy exact; tests/lib/case/course/blind-times.test.ts
 * @example
 * inEventOrder(entries)[0]?.kind // => 'case.planned'
 */
export function inEventOrder(entries: readonly CaseEntry[]): readonly CaseEntry[] {
  const key = (entry: CaseEntry) => (entry.kind === 'case.planned' ? '' : entry.eventAt);
  return [...entries].sort((first, second) => (key(first) === key(second) ? first.seq - second.seq : key(first) < key(second) ? -1 : 1));
}
