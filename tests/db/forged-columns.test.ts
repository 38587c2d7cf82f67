import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { SealedEntry } from '@/lib/record/entry';
import { addCase, chained, openRecordDatabase, type RecordDatabase } from './record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

/** The columns as the application would write them by hand. */
function columnsOf({ entry, hash, bytes }: SealedEntry): Record<string, unknown> {
  return {
    hospital_id: entry.hospitalId, case_id: entry.caseId, seq: entry.seq, format: entry.format, kind: entry.kind, kind_version: entry.kindVersion,
    command_id: entry.commandId, command_part: entry.commandPart, command_digest: Buffer.from(entry.commandDigest, 'hex'),
    event_at: entry.eventAt, recorded_at: entry.recordedAt, author_id: entry.author.id, author_role: entry.author.role,
    author_display_name: entry.author.displayName, body: JSON.stringify(entry.body), previous_hash: Buffer.from(entry.previousHash, 'hex'),
    hash: Buffer.from(hash, 'hex'), bytes: Buffer.from(bytes),
  };
}

/** A value that the column could hold but the bytes do not say. */
const forged: Readonly<Record<string, unknown>> = {
  seq: 3, kind: 'step.logged', kind_version: 2, command_id: 'other', command_part: 7, command_digest: Buffer.alloc(32, 1),
  event_at: '2027-03-14T10:00:02.001Z', recorded_at: '2027-03-14T10:00:02.001Z', author_id: 'other', author_role: 'surgeon',
  author_display_name: 'Other', body: '{"n":2,"more":0}', previous_hash: Buffer.alloc(32, 1), hash: Buffer.alloc(32, 1),
};

describe('the guard of entries', () => {
  test('takes columns that are what the bytes say: the control', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const [next] = chained(db.hospital, caseId, { seq: 1, hash: entries[0]?.hash ?? '' }, ['case.opened']);
    await expect(db.database.app('entries').insert(columnsOf(next as SealedEntry))).resolves.toBeDefined();
  });

  test.each(Object.entries(forged))('refuses the application a column %s that differs from the bytes', async (column, value) => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const [next] = chained(db.hospital, caseId, { seq: 1, hash: entries[0]?.hash ?? '' }, ['case.opened']);
    const insert = db.database.app('entries').insert({ ...columnsOf(next as SealedEntry), [column]: value });
    await expect(insert).rejects.toMatchObject({ code: '23514', constraint: expect.stringMatching(/^entries_(hash|columns)$/) as string });
  });

  test('refuses the case and the hospital of another entry, and any format but 1', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const victim = await addCase(db.database.app, db.hospital);
    const foreign = await addCase(db.database.app, db.other);
    const [next] = chained(db.hospital, caseId, { seq: 1, hash: entries[0]?.hash ?? '' }, ['case.opened']);
    const columns = columnsOf(next as SealedEntry);
    const attempts = [{ case_id: victim.caseId }, { case_id: foreign.caseId, hospital_id: db.other.id }, { format: 2 }];
    for (const attempt of attempts) await expect(db.database.app('entries').insert({ ...columns, ...attempt })).rejects.toMatchObject({ code: '23514' });
    // Hospital and case of different rows: the foreign key answers before the guard.
    await expect(db.database.app('entries').insert({ ...columns, hospital_id: db.other.id })).rejects.toMatchObject({ code: '23503' });
  });

  test('covers every column: none is left out of the table above', async () => {
    const columns = Object.keys(await db.admin('entries').columnInfo()).sort();
    expect([...Object.keys(forged), 'case_id', 'hospital_id', 'format', 'bytes'].sort()).toEqual(columns);
  });
});
