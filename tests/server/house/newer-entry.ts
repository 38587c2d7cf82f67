import { v7 as newId } from 'uuid';

import { headOf } from '@/db/repositories/entries/head-of';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { chainEntries } from '@/lib/record/chain-entries';

import type { SecondServer } from './second-server';
import type { TestHouse } from './open-test-house';

/** Appends what only a newer program would write: an entry of a kind that this one does not know. */
export async function appendNewerEntry(house: TestHouse, { context }: SecondServer, caseId: string): Promise<void> {
  const { app, feed } = context.database;
  const head = await headOf(feed, caseId);
  const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
  if (head === null) throw new Error(`Case ${caseId} has no entries.`);
  const at = new Date(Math.max(Date.now(), Date.parse(head.recordedAt))).toISOString();
  const author = { id: 'newer', role: 'timer', displayName: 'A newer program' };
  const newer = { hospitalId, caseId, kind: 'kind.not-known', kindVersion: 1, commandId: newId(), commandPart: 0, commandDigest: 'a'.repeat(64), eventAt: at, recordedAt: at, author, body: {} };
  await insertEntries(app, chainEntries(head, [newer]));
}
