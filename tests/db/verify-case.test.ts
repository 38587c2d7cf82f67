import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { verifyCase } from '@/db/read-models/verify-case';
import { readVerifyRequest, verifyRecords } from '@/server/setup/verify-records';
import { addCase, openRecordDatabase, type RecordDatabase } from './record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const ELSEWHERE = '018f0000-0000-7000-8000-00000000fffe';

/** Another value that the column can hold. A column without a line here fails the test: nobody may add one unwatched. */
const edits: Readonly<Record<string, string>> = {
  hospital_id: `'018f0000-0000-7000-8000-00000000ffff'`,
  case_id: `'${ELSEWHERE}'`,
  seq: 'seq + 1000',
  format: '1 + 1',
  kind: `'step.removed'`,
  kind_version: 'kind_version + 1',
  command_id: `command_id || 'x'`,
  command_part: 'command_part + 1',
  command_digest: `set_byte(command_digest, 31, get_byte(command_digest, 31) # 1)`,
  event_at: `event_at + interval '1 millisecond'`,
  recorded_at: `recorded_at + interval '1 millisecond'`,
  author_id: `author_id || 'x'`,
  author_role: `'surgeon'`,
  author_display_name: `author_display_name || ' '`,
  body: `body || '{"n": 2.0000000000000000001}'`,
  previous_hash: `set_byte(previous_hash, 0, get_byte(previous_hash, 0) # 128)`,
  hash: `set_byte(hash, 0, get_byte(hash, 0) # 1)`,
  bytes: `set_byte(bytes, octet_length(bytes) - 3, get_byte(bytes, octet_length(bytes) - 3) # 1)`,
};

/** Edits as a superuser who switches triggers, foreign keys and the table's own checks off, looks, and takes it back. */
async function seenAfterEdit(admin: Knex, edit: string, look: (knex: Knex) => Promise<void>): Promise<void> {
  const undone = new Error('undone');
  await admin
    .transaction(async (transaction) => {
      await transaction.raw('alter table entries drop constraint entries_format_check');
      await transaction.raw(`set local session_replication_role = 'replica'`);
      const { rowCount } = await transaction.raw<{ rowCount: number }>(edit);
      if (rowCount !== 1) throw new Error(`The edit changed ${rowCount} rows: ${edit}`);
      await look(transaction);
      throw undone;
    })
    .catch((error: unknown) => {
      if (error !== undone) throw error;
    });
}

const printed = async (knex: Knex, caseId: string | null) => {
  const lines: string[] = [];
  const passed = await verifyRecords(knex, caseId, (line) => lines.push(line));
  return { passed, lines };
};

describe('verifyRecords', () => {
  test("finds a superuser's edit of any column of any entry at its number, and passes the untouched control", async () => {
    const { caseId } = await addCase(db.database.app, db.hospital, ['case.opened', 'run.logged', 'run.judged', 'case.closed']);
    const control = await addCase(db.database.app, db.hospital, ['case.opened']);
    expect(Object.keys(edits).sort()).toEqual(Object.keys(await db.admin('entries').columnInfo()).sort());
    const missed: string[] = [];
    for (const [column, value] of Object.entries(edits)) {
      for (let seq = 1; seq <= 5; seq += 1) {
        await seenAfterEdit(db.admin, `update entries set ${column} = ${value} where case_id = '${caseId}' and seq = ${seq}`, async (knex) => {
          const { passed, lines } = await printed(knex, null);
          // The last entry under another case's id leaves no gap behind; it is found where it stands now.
          const [place, number] = column === 'case_id' && seq === 5 ? [ELSEWHERE, 1] : [caseId, seq];
          const found = lines.some((line) => line.startsWith(`Case ${place}: entry ${number} is bad.`));
          const isControlGood = lines.includes(`Case ${control.caseId}: verified, 2 entries.`);
          if (passed || !found || !isControlGood) missed.push(`${column} of entry ${seq}: ${lines.join(' | ')}`);
        });
      }
    }
    expect(missed).toEqual([]);
    expect((await printed(db.database.feed, null)).passed).toBe(true);
  }, 120_000);

  test('finds a row that was removed inside, swapped with its neighbour, or left without its case', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital, ['case.opened', 'run.logged']);
    await seenAfterEdit(db.admin, `delete from entries where case_id = '${caseId}' and seq = 2`, async (knex) => {
      expect(await verifyCase(knex, caseId)).toEqual({ ok: false, seq: 2, problem: 'It is missing: after entry 1 stands entry 3.' });
    });
    await seenAfterEdit(db.admin, `delete from cases where id = '${caseId}'`, async (knex) => {
      expect((await printed(knex, null)).lines).toContainEqual(expect.stringContaining(`Case ${caseId}: entry 1 is bad. There is no case`));
    });
    await seenAfterEdit(db.admin, `update cases set hospital_id = '${db.other.id}' where id = '${caseId}'`, async (knex) => {
      expect(await verifyCase(knex, caseId)).toMatchObject({ ok: false, seq: 1 });
    });
  });

  test('gives the same verdict however small the batches are', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital, ['case.opened', 'run.logged', 'run.judged', 'case.closed', 'case.sealed']);
    for (const batch of [1, 2, 3, 6, 7]) expect(await verifyCase(db.database.feed, caseId, batch)).toEqual({ ok: true, count: 6 });
    await seenAfterEdit(db.admin, `update entries set kind = 'step.removed' where case_id = '${caseId}' and seq = 4`, async (knex) => {
      for (const batch of [1, 2, 3, 6, 7]) expect(await verifyCase(knex, caseId, batch)).toMatchObject({ ok: false, seq: 4 });
    });
  });

  test('does not pass a case that is not there', async () => {
    const missing = '018f0000-0000-7000-8000-00000000dead';
    expect(await printed(db.database.feed, missing)).toEqual({
      passed: false,
      lines: [`Case ${missing}: entry 1 is bad. It is missing: case ${missing} has no entries.`, 'Not verified: 1 of 1.'],
    });
  });
});

describe('readVerifyRequest', () => {
  const id = '018f0000-0000-7000-8000-0000000000c1';
  test.each([
    [['--all'], null],
    [['--case', id], id],
    [['--case', id.toUpperCase()], id],
  ])('takes %j', (words, caseId) => {
    expect(readVerifyRequest(words)).toEqual({ kind: 'verify', caseId });
  });

  test.each([[[]], [['--all', '--case', id]], [['--case', '12']], [['--case']], [['--every']], [[id]]])('answers %j with a sentence', (words) => {
    expect(readVerifyRequest(words)).toMatchObject({ kind: 'wrong', sentence: expect.stringMatching(/npm run verify -- --all\.|a UUID is allowed\.$/) as string });
  });
});
