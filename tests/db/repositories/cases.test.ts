import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Knex } from 'knex';
import { assignmentsOfCases } from '@/db/repositories/cases/assignments-of-cases';
import { assignmentsOf } from '@/db/repositories/cases/assignments-of';
import { endAssignment } from '@/db/repositories/cases/end-assignment';
import { eraseIdentity } from '@/db/repositories/cases/erase-identity';
import { findCase } from '@/db/repositories/cases/find-case';
import { insertCase } from '@/db/repositories/cases/insert-case';
import { readIdentity } from '@/db/repositories/cases/read-identity';
import { findHospital } from '@/db/repositories/hospitals/find-hospital';
import { readsOfHospital } from '@/db/repositories/reads/reads-of-hospital';
import { findSnapshot } from '@/db/repositories/snapshots/find-snapshot';
import { insertSnapshot } from '@/db/repositories/snapshots/insert-snapshot';
import { theatresOf } from '@/db/repositories/theatres/theatres-of';
import { withinHospitals } from '@/db/within-hospitals';
import { addCase, openRecordDatabase, type RecordDatabase, type TestHospital } from '@/tests/db/record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const within = <Result>(hospital: TestHospital, work: (transaction: Knex.Transaction) => Promise<Result>) => withinHospitals(db.database.app, [hospital.id], work);

describe('findCase', () => {
  test('finds it in its hospital, and nothing in another', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    expect(await within(db.hospital, (transaction) => findCase(transaction, caseId))).toMatchObject({ id: caseId, hospitalId: db.hospital.id, plannedBy: db.hospital.deskId });
    expect(await within(db.other, (transaction) => findCase(transaction, caseId))).toBeNull();
  });

  test('a reference stands once in a hospital and may stand in another', async () => {
    const add = (hospital: TestHospital) =>
      within(hospital, (transaction) => insertCase(transaction, { hospitalId: hospital.id, id: uuidv7(), reference: 'SAME', plannedBy: hospital.deskId }));
    await add(db.hospital);
    await expect(add(db.hospital)).rejects.toMatchObject({ code: '23505', constraint: 'cases_hospital_id_reference_key' });
    await add(db.other);
  });
});

describe('readIdentity', () => {
  const reader = () => ({ personId: db.hospital.deskId, rule: 'assigned' });

  test('gives the identity and leaves a row in the audit for each read', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    const identity = await within(db.hospital, (transaction) => readIdentity(transaction, caseId, reader()));
    expect(identity).toMatchObject({ caseId, patientLabel: 'Invented patient', recordNumber: 'R-1', salt: Buffer.alloc(16, 7) });
    const reads = await withinHospitals(db.database.audit, [db.hospital.id], (transaction) => readsOfHospital(transaction, db.hospital.id, 10));
    expect(reads[0]).toMatchObject({ caseId, personId: db.hospital.deskId, screenId: null, what: 'identity', outcome: 'allowed', rule: 'assigned' });
  });

  test('gives nothing to another hospital', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    expect(await within(db.other, (transaction) => readIdentity(transaction, caseId, reader()))).toBeNull();
  });

  test('gives nothing once erased; who erased it and why stays, and the log stays whole', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    const erase = (hospital: TestHospital) => within(hospital, (transaction) => eraseIdentity(transaction, caseId, db.hospital.deskId, 'Asked by the patient'));
    expect(await erase(db.other), 'another hospital').toBe(false);
    expect([await erase(db.hospital), await erase(db.hospital)]).toEqual([true, false]);
    expect(await within(db.hospital, (transaction) => readIdentity(transaction, caseId, reader()))).toBeNull();
    expect(await db.admin('identity_erasures').where({ case_id: caseId }).select('erased_by', 'reason')).toEqual([{ erased_by: db.hospital.deskId, reason: 'Asked by the patient' }]);
    expect(await db.admin('entries').where({ case_id: caseId }).pluck('seq')).toEqual([1]);
  });
});

describe('assignments', () => {
  test('end and stay, and a person cannot be assigned twice at once', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    const assignment = { hospitalId: db.hospital.id, caseId, personId: db.hospital.deskId, role: 'neurophysiologist' };
    expect(await within(db.hospital, (transaction) => assignmentsOf(transaction, caseId))).toMatchObject([{ personId: db.hospital.deskId, role: 'neurophysiologist' }]);
    const again = { hospital_id: db.hospital.id, case_id: caseId, person_id: db.hospital.deskId, role: 'neurophysiologist' };
    await expect(within(db.hospital, (transaction) => transaction('case_assignments').insert(again))).rejects.toMatchObject({ code: '23505', constraint: 'case_assignments_now' });
    expect(await within(db.hospital, (transaction) => endAssignment(transaction, assignment))).toBe(true);
    expect(await within(db.hospital, (transaction) => endAssignment(transaction, assignment))).toBe(false);
    expect(await within(db.hospital, (transaction) => assignmentsOf(transaction, caseId))).toEqual([]);
    expect(await db.admin('case_assignments').where({ case_id: caseId }).count()).toEqual([{ count: 1 }]);
  });
});

describe('assignmentsOfCases', () => {
  test('names the present ones of the cases asked for, within the hospital', async () => {
    const one = await addCase(db.database.app, db.hospital);
    const two = await addCase(db.database.app, db.hospital);
    const foreign = await addCase(db.database.app, db.other);
    const found = await within(db.hospital, (transaction) => assignmentsOfCases(transaction, [one.caseId, two.caseId, foreign.caseId]));
    expect(new Set(found.map(({ caseId }) => caseId))).toEqual(new Set([one.caseId, two.caseId]));
    expect(found[0]).toMatchObject({ hospitalId: db.hospital.id, personId: db.hospital.deskId, role: 'neurophysiologist' });
  });
});

describe('findHospital', () => {
  test('finds the one that is set and no other', async () => {
    expect(await within(db.hospital, (transaction) => findHospital(transaction, db.hospital.id))).toEqual({ hospitalId: db.hospital.id, name: 'Hospital north', timeZone: 'Europe/London' });
    expect(await within(db.hospital, (transaction) => findHospital(transaction, db.other.id))).toBeNull();
  });
});

describe('findSnapshot', () => {
  test('gives the latest in the version asked for; the first of two equal ones stays', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital, ['case.opened', 'run.logged']);
    const keep = (seq: number, stateVersion: number, byte: number) =>
      insertSnapshot(db.database.app, { hospitalId: db.hospital.id, caseId, seq, stateVersion, bytes: Uint8Array.of(byte) });
    await keep(2, 1, 2);
    await keep(3, 1, 3);
    await keep(3, 1, 9);
    expect(await findSnapshot(db.database.feed, caseId, 1)).toMatchObject({ seq: 3, bytes: Buffer.of(3) });
    expect(await findSnapshot(db.database.feed, caseId, 2)).toBeNull();
    await expect(keep(4, 1, 4), 'of an entry that is not there').rejects.toMatchObject({ code: '23503' });
  });
});

describe('theatresOf', () => {
  test('names the theatres of the hospital', async () => {
    expect(await within(db.hospital, (transaction) => theatresOf(transaction))).toEqual([{ hospitalId: db.hospital.id, theatreId: db.hospital.theatreId, name: 'Theatre 1' }]);
  });
});

describe('insertSnapshot', () => {
  test('keeps the newest three of its case and touches no other case', async () => {
    const kinds = Array.from({ length: 9 }, () => 'run.logged');
    const [one, two] = [await addCase(db.database.app, db.hospital, kinds), await addCase(db.database.app, db.hospital, kinds)];
    const keep = (caseId: string, seq: number, stateVersion: number) =>
      insertSnapshot(db.database.app, { hospitalId: db.hospital.id, caseId, seq, stateVersion, bytes: Uint8Array.of(seq) });
    for (const seq of [2, 4]) await keep(two.caseId, seq, 1);
    for (const seq of [1, 2, 3, 5, 8]) await keep(one.caseId, seq, 1);
    await keep(one.caseId, 8, 2);
    await keep(one.caseId, 8, 2);
    const kept = async (caseId: string) => (await db.admin('case_snapshots').where({ case_id: caseId }).orderBy(['seq', 'state_version'])).map((row: { seq: string; state_version: number }) => [Number(row.seq), row.state_version]);
    expect(await kept(one.caseId)).toEqual([[5, 1], [8, 1], [8, 2]]);
    expect(await kept(two.caseId)).toEqual([[2, 1], [4, 1]]);
    expect(await findSnapshot(db.database.feed, one.caseId, 1)).toMatchObject({ seq: 8 });
  });
});
