import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { findCommand } from '@/db/repositories/entries/find-command';
import { headOf } from '@/db/repositories/entries/head-of';
import { headsOf } from '@/db/repositories/entries/heads-of';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { chainEntries } from '@/lib/record/chain-entries';
import { addCase, draft, openRecordDatabase, type RecordDatabase } from '@/tests/db/record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

describe('headsOf', () => {
  test('gives the last entry of each case, leaves out a case without entries, and the time of the database', async () => {
    const one = await addCase(db.database.app, db.hospital, ['case.opened', 'run.logged']);
    const two = await addCase(db.database.app, db.other);
    const before = await db.admin.raw<{ rows: { at: string }[] }>('select clock_timestamp() as at');
    const { checkedAt, heads } = await headsOf(db.database.feed, [one.caseId, two.caseId, uuidv7()]);
    const after = await db.admin.raw<{ rows: { at: string }[] }>('select clock_timestamp() as at');
    expect(Object.fromEntries(heads)).toEqual({
      [one.caseId]: { seq: 3, hash: one.entries[2]?.hash, recordedAt: one.entries[2]?.entry.recordedAt },
      [two.caseId]: { seq: 1, hash: two.entries[0]?.hash, recordedAt: two.entries[0]?.entry.recordedAt },
    });
    expect(checkedAt >= (before.rows[0]?.at ?? '~')).toBe(true);
    expect(checkedAt <= (after.rows[0]?.at ?? '')).toBe(true);
  });

  test('gives a time also when no case is asked for', async () => {
    const { checkedAt, heads } = await headsOf(db.database.feed, []);
    expect(heads.size).toBe(0);
    expect(checkedAt).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/);
  });
});

describe('headOf', () => {
  test('is null for a case that is not there', async () => {
    expect(await headOf(db.database.feed, uuidv7())).toBeNull();
  });
});

describe('findCommand', () => {
  test('gives all parts of a command in order, and none of an unknown one or of another case', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const run = draft(db.hospital, caseId, 2, 'run.logged');
    const parts = chainEntries({ seq: 1, hash: entries[0]?.hash ?? '' }, [run, { ...run, kind: 'run.judged', commandPart: 1 }]);
    await insertEntries(db.database.app, parts);
    expect(await findCommand(db.database.feed, caseId, run.commandId)).toEqual(parts);
    expect(await findCommand(db.database.feed, caseId, 'repeat/ulnar-1/3')).toEqual([]);
    expect(await findCommand(db.database.feed, uuidv7(), run.commandId)).toEqual([]);
  });
});
