import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { entriesAfter } from '@/db/repositories/entries/entries-after';
import { headOf } from '@/db/repositories/entries/head-of';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { verifyCase } from '@/db/read-models/verify-case';
import { chainEntries } from '@/lib/record/chain-entries';
import type { ChainHead, SealedEntry } from '@/lib/record/entry';
import { sealEntry } from '@/lib/record/seal-entry';
import { jsonBody } from '@/tests/lib/record/record-arbitraries';
import { addCase, chained, draft, openRecordDatabase, type RecordDatabase } from './record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const append = (sealed: readonly SealedEntry[]) => insertEntries(db.database.app, sealed);
const headAfter = (entries: readonly SealedEntry[]): ChainHead => ({ seq: entries.length, hash: entries.at(-1)?.hash ?? '' });

describe('insertEntries', () => {
  test('appends several entries at once, without a hospital being set, and they are read back byte for byte', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const more = chained(db.hospital, caseId, headAfter(entries), ['case.opened', 'run.logged', 'run.judged']);
    await append(more);
    expect(await entriesAfter(db.database.feed, caseId, 1, 10)).toEqual(more);
    expect(await headOf(db.database.feed, caseId)).toEqual({ seq: 4, hash: more[2]?.hash, recordedAt: more[2]?.entry.recordedAt });
  });

  test('takes any body that an entry may carry, and verification agrees with it', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    let head = await headOf(db.database.feed, caseId);
    await fc.assert(
      fc.asyncProperty(jsonBody, async (body) => {
        const sealed = chainEntries(head ?? { seq: 0, hash: '' }, [{ ...draft(db.hospital, caseId, 2, 'step.logged'), body }]);
        await append(sealed);
        const before = head?.seq ?? 0;
        head = await headOf(db.database.feed, caseId);
        expect((await entriesAfter(db.database.feed, caseId, before, 2)).map(({ hash }) => hash)).toEqual([sealed[0]?.hash]);
      }),
      { numRuns: 100 },
    );
    expect(await verifyCase(db.database.feed, caseId)).toEqual({ ok: true, count: 101 });
  });

  test('is a clash when the number is taken, and writes nothing', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    await append(chained(db.hospital, caseId, headAfter(entries), ['case.opened']));
    const late = chained(db.hospital, caseId, headAfter(entries), ['step.logged', 'step.logged']);
    await expect(append(late)).rejects.toMatchObject({ kind: 'clash' });
    expect((await headOf(db.database.feed, caseId))?.seq).toBe(2);
  });

  test('is a repeat when the command is in the log already, and writes nothing', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const command = draft(db.hospital, caseId, 2, 'step.logged');
    const once = chainEntries(headAfter(entries), [command]);
    await append(once);
    const again = chainEntries({ seq: 2, hash: once[0]?.hash ?? '' }, [{ ...command, recordedAt: draft(db.hospital, caseId, 3, '').recordedAt }]);
    await expect(append(again)).rejects.toMatchObject({ kind: 'repeat' });
    expect((await headOf(db.database.feed, caseId))?.seq).toBe(2);
  });

  test('writes all of a batch or none of it', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const [good, bad] = chained(db.hospital, caseId, headAfter(entries), ['case.opened', 'step.logged']);
    await expect(append([good as SealedEntry, { ...(bad as SealedEntry), hash: 'f'.repeat(64) }])).rejects.toMatchObject({ kind: 'refused' });
    expect((await headOf(db.database.feed, caseId))?.seq).toBe(1);
  });

  test('refuses a forged number, previous hash, hash and time, each by its own guard', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital, ['case.opened']);
    const head = headAfter(entries);
    const next = draft(db.hospital, caseId, 3, 'step.logged');
    const cases: readonly (readonly [string, SealedEntry])[] = [
      ['does not follow', sealEntry({ ...next, body: {}, format: 1, seq: 4, previousHash: head.hash })],
      ['does not follow', sealEntry({ ...next, body: {}, format: 1, seq: 3, previousHash: 'f'.repeat(64) })],
      ['hash is not that of its bytes', { ...sealEntry({ ...next, body: {}, format: 1, seq: 3, previousHash: head.hash }), hash: 'f'.repeat(64) }],
      ['recorded before', sealEntry({ ...next, body: {}, recordedAt: '2027-03-14T10:00:01.999Z', format: 1, seq: 3, previousHash: head.hash })],
      ['first entry of a case', sealEntry({ ...next, kind: 'case.planned', body: {}, format: 1, seq: 3, previousHash: head.hash })],
    ];
    for (const [sentence, forged] of cases) {
      await expect(append([forged]), sentence).rejects.toMatchObject({ kind: 'refused', message: expect.stringContaining(sentence) as string });
    }
    await expect(append(chainEntries(head, [next]))).resolves.toBeUndefined();
  });

  test('refuses a first entry that is not case.planned or follows something', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    const one = { ...draft(db.hospital, caseId, 1, 'case.planned'), body: {}, format: 1, seq: 1 } as const;
    // The case has its first entry already: the key answers before the guard, so both are tried on a case without entries.
    await expect(append([sealEntry({ ...one, previousHash: '0'.repeat(64) })])).rejects.toMatchObject({ kind: 'clash' });
    const empty = '018f0000-0000-7000-8000-00000000e001';
    await db.admin('cases').insert({ hospital_id: db.hospital.id, id: empty, reference: 'EMPTY', planned_by: db.hospital.deskId });
    await expect(append([sealEntry({ ...one, caseId: empty, previousHash: 'f'.repeat(64) })])).rejects.toMatchObject({ kind: 'refused', message: expect.stringContaining('nothing stands before it') as string });
    await expect(append([sealEntry({ ...one, caseId: empty, kind: 'case.opened', previousHash: '0'.repeat(64) })])).rejects.toMatchObject({ kind: 'refused' });
  });

  test('takes only addenda after the seal, and one seal', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital, ['case.opened', 'case.closed', 'case.sealed']);
    const head = headAfter(entries);
    for (const kind of ['run.logged', 'case.opened', 'case.sealed', 'addendumx.written']) {
      await expect(append(chained(db.hospital, caseId, head, [kind])), kind).rejects.toMatchObject({ kind: 'refused' });
    }
    await append(chained(db.hospital, caseId, head, ['addendum.written', 'addendum.written']));
    expect(await verifyCase(db.database.feed, caseId)).toEqual({ ok: true, count: 6 });
  });

  test('refuses an entry whose case belongs to another hospital', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    const forged = chainEntries(headAfter(entries), [{ ...draft(db.other, caseId, 2, 'case.opened') }]);
    await expect(append(forged)).rejects.toMatchObject({ code: '23503', constraint: 'entries_case' });
  });

  test('keeps numbers dense when sixteen writers append to one case, each deciding again after a clash', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    let clashes = 0;
    const write = async (): Promise<void> => {
      for (;;) {
        const head = await headOf(db.database.feed, caseId);
        if (head === null) throw new Error('The case has no head.');
        const late = { ...draft(db.hospital, caseId, 2, 'step.logged'), recordedAt: head.recordedAt };
        try {
          return await append(chainEntries(head, [late, { ...late, commandPart: 1 }]));
        } catch (error) {
          if ((error as { kind?: string }).kind !== 'clash') throw error;
          clashes += 1;
        }
      }
    };
    await Promise.all(Array.from({ length: 16 }, write));
    expect(await verifyCase(db.database.feed, caseId)).toEqual({ ok: true, count: 33 });
    // The control: without a single clash the race that this test is about did not happen.
    expect(clashes).toBeGreaterThan(0);
  });
});
