import { openDB, type DBSchema, type IDBPDatabase } from 'idb';

import type { WaitingCommand } from '@/app/_live/live-store';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

/** Head of a case as this browser may keep it: nothing that names the patient. */
export type KeptCaseHead = Omit<CaseHeadReply, 'patientLabel' | 'recordNumber'>;

/** The person this desk was last confirmed for. */
export interface KeptSession {
  readonly personId: string;
  readonly displayName: string;
  readonly offsetMs: number | null;
}

/** What the browser keeps between reloads. Entries and heads belong to one person and go at sign-out; waiting commands stay. */
export interface LiveDatabaseSchema extends DBSchema {
  waiting: { key: number; value: Omit<WaitingCommand, 'order'> & { order?: number }; indexes: { 'by-person': string; 'by-command': string } };
  entries: { key: [string, string, number]; value: { personId: string; caseId: string; seq: number; entry: WireEntry } };
  cases: { key: [string, string]; value: { personId: string; caseId: string; usedAtMs: number } };
  heads: { key: [string, string]; value: { personId: string; caseId: string; head: KeptCaseHead } };
  session: { key: 'session'; value: KeptSession };
}

export type LiveDatabase = IDBPDatabase<LiveDatabaseSchema>;

const databaseName = 'fascicle-live';

/** Opens the browser's own store. Throws when the browser keeps nothing (blocked, private, full). */
export function openLiveDatabase(name = databaseName): Promise<LiveDatabase> {
  return openDB<LiveDatabaseSchema>(name, 1, {
    upgrade(database) {
      const waiting = database.createObjectStore('waiting', { keyPath: 'order', autoIncrement: true });
      waiting.createIndex('by-person', 'personId');
      waiting.createIndex('by-command', 'commandId', { unique: true });
      database.createObjectStore('entries', { keyPath: ['personId', 'caseId', 'seq'] });
      database.createObjectStore('cases', { keyPath: ['personId', 'caseId'] });
      database.createObjectStore('heads', { keyPath: ['personId', 'caseId'] });
      database.createObjectStore('session');
    },
  });
}
