import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { caseLog } from '@/db/read-models/case-log';
import { casesForPerson } from '@/db/read-models/cases-for-person';
import { openCases } from '@/db/read-models/open-cases';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { withinHospitals } from '@/db/within-hospitals';
import { chainEntries } from '@/lib/record/chain-entries';
import { addCase, draft, openRecordDatabase, PLAN, type RecordDatabase } from '@/tests/db/record-database';

let db: RecordDatabase;
const cases = new Map<string, string>();
beforeAll(async () => {
  db = await openRecordDatabase();
  const lives = { planned: [], open: ['case.opened', 'run.logged'], closed: ['case.opened', 'case.closed'], sealed: ['case.opened', 'case.closed', 'case.sealed', 'addendum.written'] };
  for (const [status, kinds] of Object.entries(lives)) cases.set(status, (await addCase(db.database.app, db.hospital, kinds)).caseId);
  cases.set('foreign', (await addCase(db.database.app, db.other, ['case.opened'])).caseId);
});
afterAll(() => db.drop());

const readList = (personId: string, limit: number) => withinHospitals(db.database.app, [db.hospital.id], (transaction) => casesForPerson(transaction, personId, limit));
const listFor = async (personId: string) => (await readList(personId, 50)).lines;

describe('casesForPerson', () => {
  test('lists the assigned cases with what the plan and the last entry say, open ones first, then the latest', async () => {
    const lines = await listFor(db.hospital.deskId);
    expect(lines.map(({ caseId, status, lastSeq }) => [caseId, status, lastSeq])).toEqual([
      [cases.get('open'), 'open', 3],
      [cases.get('sealed'), 'sealed', 5],
      [cases.get('closed'), 'closed', 3],
      [cases.get('planned'), 'planned', 1],
    ]);
    expect(lines[1]).toMatchObject({ ...PLAN, hospitalId: db.hospital.id, hospitalName: 'Hospital north', timeZone: 'Europe/London', lastEntryAt: '2027-03-14T10:00:05.000Z' });
  });

  test('that is cut keeps the open cases and says how many there are', async () => {
    const { lines, total } = await readList(db.hospital.deskId, 2);
    expect([lines.map(({ caseId }) => caseId), total]).toEqual([[cases.get('open'), cases.get('sealed')], 4]);
    expect(await readList(db.other.deskId, 2)).toEqual({ lines: [], total: 0 });
  });

  test('gives a reviewer the closed and sealed cases of the hospital, and a stranger none', async () => {
    expect(new Set((await listFor(db.hospital.reviewerId)).map(({ status }) => status))).toEqual(new Set(['closed', 'sealed']));
    expect(await listFor(db.other.deskId)).toEqual([]);
    expect(await listFor(db.other.reviewerId)).toEqual([]);
  });

  test('shows the plan as it was revised', async () => {
    const { caseId, entries } = await addCase(db.database.app, db.hospital);
    await insertEntries(db.database.app, chainEntries({ seq: 1, hash: entries[0]?.hash ?? '' }, [draft(db.hospital, caseId, 2, 'plan.revised', { plan: { ...PLAN, side: 'right' } })]));
    expect((await listFor(db.hospital.deskId)).find((line) => line.caseId === caseId)).toMatchObject({ side: 'right', status: 'planned', lastSeq: 2 });
  });

  test('leaves a case out once the assignment has ended', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    await db.admin('case_assignments').where({ case_id: caseId }).update({ to_at: db.admin.fn.now() });
    expect((await listFor(db.hospital.deskId)).map((line) => line.caseId)).not.toContain(caseId);
  });
});

describe('openCases', () => {
  test('names every hospital\'s open cases, neither planned nor closed ones', async () => {
    expect(await openCases(db.database.feed)).toEqual(
      [{ caseId: cases.get('open'), hospitalId: db.hospital.id }, { caseId: cases.get('foreign'), hospitalId: db.other.id }].sort((a, b) => ((a.caseId ?? '') < (b.caseId ?? '') ? -1 : 1)),
    );
  });
});

describe('caseLog', () => {
  const page = (hospitalId: string, afterSeq: number, limit: number, kinds: readonly string[] | null) =>
    withinHospitals(db.database.app, [hospitalId], async (transaction) =>
      (await caseLog(transaction, cases.get('sealed') ?? '', { afterSeq, limit, kinds })).map(({ entry }) => [entry.seq, entry.kind]),
    );

  test('gives pages in order, filtered by kind, and nothing to another hospital', async () => {
    expect(await page(db.hospital.id, 0, 2, null)).toEqual([[1, 'case.planned'], [2, 'case.opened']]);
    expect(await page(db.hospital.id, 2, 10, null)).toEqual([[3, 'case.closed'], [4, 'case.sealed'], [5, 'addendum.written']]);
    expect(await page(db.hospital.id, 0, 10, ['case.sealed', 'case.planned'])).toEqual([[1, 'case.planned'], [4, 'case.sealed']]);
    expect(await page(db.hospital.id, 0, 10, [])).toEqual([]);
    expect(await page(db.other.id, 0, 10, null)).toEqual([]);
  });
});
