import type { LiveDatabase } from '@/app/_live/live-database';
import type { WireEntry } from '@/lib/contracts/http/replies';

const mostCases = 3;
const mostEntriesPerCase = 20_000;

/** Committed entries that a desk keeps, so that a reload without a link still shows the case. */
export interface KeptEntries {
  /** The dense beginning of the case's log as last seen; empty when nothing is kept. */
  read(personId: string, caseId: string): Promise<WireEntry[]>;
  /** Keeps entries that follow what is kept. The newest 3 cases of a person, the first 20,000 entries of each. */
  keep(personId: string, caseId: string, entries: readonly WireEntry[]): Promise<void>;
  /** Drops one case, when what is kept cannot be used. */
  forget(personId: string, caseId: string): Promise<void>;
}

/** Kept entries in IndexedDB. */
export function indexedKeptEntries(database: LiveDatabase, nowMs: () => number = Date.now): KeptEntries {
  const rangeOf = (personId: string, caseId: string) => IDBKeyRange.bound([personId, caseId, 0], [personId, caseId, Infinity]);
  const forget = async (personId: string, caseId: string) => {
    const transaction = database.transaction(['entries', 'cases'], 'readwrite');
    await transaction.objectStore('entries').delete(rangeOf(personId, caseId));
    await transaction.objectStore('cases').delete([personId, caseId]);
    await transaction.done;
  };
  const forgetOldest = async (personId: string) => {
    const cases = (await database.getAll('cases')).filter((one) => one.personId === personId);
    const surplus = cases.sort((one, other) => other.usedAtMs - one.usedAtMs).slice(mostCases);
    for (const one of surplus) await forget(personId, one.caseId);
  };
  return {
    read: async (personId, caseId) => denseStart((await database.getAll('entries', rangeOf(personId, caseId))).map((row) => row.entry)),
    keep: async (personId, caseId, entries) => {
      const isNewCase = (await database.get('cases', [personId, caseId])) === undefined;
      const transaction = database.transaction(['entries', 'cases'], 'readwrite');
      for (const entry of entries.filter((one) => one.seq <= mostEntriesPerCase)) {
        void transaction.objectStore('entries').put({ personId, caseId, seq: entry.seq, entry });
      }
      void transaction.objectStore('cases').put({ personId, caseId, usedAtMs: nowMs() });
      await transaction.done;
      if (isNewCase) await forgetOldest(personId);
    },
    forget,
  };
}

/** Two tabs may have left a hole between their writes: what lies behind it cannot be applied. */
function denseStart(entries: readonly WireEntry[]): WireEntry[] {
  const hole = entries.findIndex((entry, index) => entry.seq !== index + 1);
  return hole === -1 ? [...entries] : entries.slice(0, hole);
}

/** Keeps nothing: walls, and browsers without a store. */
export const noKeptEntries: KeptEntries = { read: async () => [], keep: async () => undefined, forget: async () => undefined };
