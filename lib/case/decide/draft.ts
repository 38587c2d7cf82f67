import type { EntryBodies, EntryDraft, EntryKind } from '@/lib/case/entry-bodies';

/** Newest version of every kind. All kinds are at their first version. */
const newestVersion = 1;

/** An entry draft of the newest version of its kind. @returns draft @source house rule: kinds are for ever */
export function draft<K extends EntryKind>(kind: K, body: EntryBodies[K]): EntryDraft {
  return { kind, kindVersion: newestVersion, body } as EntryDraft;
}
