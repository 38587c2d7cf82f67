import { indexedKeptEntries, noKeptEntries, type KeptEntries } from '@/app/_live/kept-entries';
import { openLiveDatabase, type KeptCaseHead, type KeptSession, type LiveDatabase } from '@/app/_live/live-database';
import { indexedWaitingStore, memoryWaitingStore, type WaitingStore } from '@/app/_live/waiting-store';

/** All that this browser keeps. */
export interface LiveStorage {
  readonly waiting: WaitingStore;
  readonly kept: KeptEntries;
  readSession(): Promise<KeptSession | null>;
  writeSession(session: KeptSession): Promise<void>;
  readHead(personId: string, caseId: string): Promise<KeptCaseHead | null>;
  writeHead(personId: string, head: KeptCaseHead): Promise<void>;
  /** Everything but waiting commands: what was read must not outlive the signing-out. */
  forgetReadings(): Promise<void>;
}

/** Storage in IndexedDB, or in memory where the browser keeps nothing. Never throws. */
export async function openLiveStorage(open: () => Promise<LiveDatabase> = openLiveDatabase): Promise<LiveStorage> {
  try {
    return indexedStorage(await open());
  } catch {
    return memoryStorage();
  }
}

function indexedStorage(database: LiveDatabase): LiveStorage {
  return {
    waiting: indexedWaitingStore(database),
    kept: indexedKeptEntries(database),
    readSession: async () => (await database.get('session', 'session')) ?? null,
    writeSession: async (session) => {
      await database.put('session', session, 'session');
    },
    readHead: async (personId, caseId) => (await database.get('heads', [personId, caseId]))?.head ?? null,
    writeHead: async (personId, head) => {
      await database.put('heads', { personId, caseId: head.caseId, head });
    },
    forgetReadings: async () => {
      const transaction = database.transaction(['entries', 'cases', 'heads', 'session'], 'readwrite');
      await Promise.all(Array.from(transaction.objectStoreNames, (name) => transaction.objectStore(name).clear()));
      await transaction.done;
    },
  };
}

function memoryStorage(): LiveStorage {
  return {
    waiting: memoryWaitingStore(),
    kept: noKeptEntries,
    readSession: async () => null,
    writeSession: async () => undefined,
    readHead: async () => null,
    writeHead: async () => undefined,
    forgetReadings: async () => undefined,
  };
}
