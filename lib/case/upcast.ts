import type { CaseEntry, EntryKind } from '@/lib/case/entry-bodies';
import type { FeedEntry } from '@/lib/case/feed-entry';
import { knownKinds } from '@/lib/case/known-kinds';

/** An entry of a kind or version that this program does not know: the case is not live here, never skipped. */
export class UnknownKindError extends Error {
  override readonly name = 'UnknownKindError';
}

type Upcaster = (body: Readonly<Record<string, unknown>>) => Readonly<Record<string, unknown>>;

/** Pure steps from one version of a kind to the next, keyed "kind/fromVersion". None yet: all kinds are at version 1. */
const upcasters: Readonly<Record<string, Upcaster>> = {};

/**
 * An arrived entry at the newest version of its kind.
 * @param entry entry with its body
 * @returns the entry for `evolve`; null when the viewer may not read the body
 * @throws {UnknownKindError} for a kind or version this program does not know
 * @source house rule: kinds are for ever
 * @accuracy exact; tests/lib/case/frozen-log.test.ts
 * @example
 * upcast(entry)?.kind
 */
export function upcast(entry: FeedEntry): CaseEntry | null {
  const newest = Object.hasOwn(knownKinds, entry.kind) ? knownKinds[entry.kind as EntryKind] : undefined;
  if (newest === undefined || entry.kindVersion > newest) {
    throw new UnknownKindError(`Entry ${entry.seq} is of kind ${entry.kind} version ${entry.kindVersion}, which this version does not know`);
  }
  if (entry.body === null) return null;
  let body = entry.body;
  for (let version = entry.kindVersion; version < newest; version += 1) {
    const step = upcasters[`${entry.kind}/${version}`];
    if (step === undefined) throw new UnknownKindError(`Entry ${entry.seq}: no way from ${entry.kind} version ${version} to ${version + 1}`);
    body = step(body);
  }
  return { ...entry, kindVersion: newest, body } as unknown as CaseEntry;
}
