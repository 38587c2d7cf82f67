import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { makePool } from '@/db/connection';
import { insertCase } from '@/db/repositories/cases/insert-case';
import { insertIdentity } from '@/db/repositories/cases/insert-identity';
import { noteRead } from '@/db/repositories/reads/note-read';
import { insertSnapshot } from '@/db/repositories/snapshots/insert-snapshot';
import { withinHospitals } from '@/db/within-hospitals';
import { addCase, openRecordDatabase, type RecordDatabase } from './record-database';

/** Tables that the application reads, each with the column that names the hospital. */
const readable = { hospitals: 'id', theatres: 'hospital_id', memberships: 'hospital_id', cases: 'hospital_id', case_identities: 'hospital_id', case_assignments: 'hospital_id', entries: 'hospital_id', case_snapshots: 'hospital_id' } as const;

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
  for (const hospital of [db.hospital, db.other]) {
    const { caseId } = await addCase(db.database.app, hospital, ['case.opened']);
    await insertSnapshot(db.database.app, { hospitalId: hospital.id, caseId, seq: 2, stateVersion: 1, bytes: Uint8Array.of(1) });
    await noteRead(db.database.app, { hospitalId: hospital.id, personId: hospital.deskId, screenId: null, caseId, what: 'case', outcome: 'allowed', rule: 'test' });
  }
});
afterAll(() => db.drop());

describe('withinHospitals', () => {
  test.each(Object.entries(readable))('shows of %s only rows of the hospital, all of both, none of neither', async (table, column) => {
    const seen = (hospitalIds: readonly string[]) =>
      withinHospitals(db.database.app, hospitalIds, async (transaction) => new Set(await transaction(table).pluck<string[]>(column)));
    expect(await seen([db.hospital.id])).toEqual(new Set([db.hospital.id]));
    expect(await seen([db.other.id])).toEqual(new Set([db.other.id]));
    expect(await seen([db.hospital.id, db.other.id])).toEqual(new Set([db.hospital.id, db.other.id]));
    expect(await seen([])).toEqual(new Set());
    expect(await db.database.app(table).pluck(column), 'no setting at all').toEqual([]);
  });

  test('shows people only to those who share a hospital with them', async () => {
    const emails = (hospitalIds: readonly string[]) =>
      withinHospitals(db.database.app, hospitalIds, (transaction) => transaction('people').orderBy('email').pluck<string[]>('email'));
    expect(await emails([db.hospital.id])).toEqual(['desk@north.example', 'reviewer@north.example']);
    expect(await emails([])).toEqual([]);
  });

  test('leaves nothing behind on the one connection of a pool, over 200 turns between hospitals and none', async () => {
    const pool = makePool(db.urls.app, 1, 'test of one connection');
    try {
      for (let turn = 0; turn < 200; turn += 1) {
        const hospital = turn % 2 === 0 ? db.hospital : db.other;
        const seen = await withinHospitals(pool, [hospital.id], (transaction) => transaction('entries').distinct('hospital_id').pluck<string[]>('hospital_id'));
        expect(seen).toEqual([hospital.id]);
        expect(await pool('entries').pluck('seq')).toEqual([]);
      }
    } finally {
      await pool.destroy();
    }
  });

  test('leaves nothing behind after a failure', async () => {
    const pool = makePool(db.urls.app, 1, 'test of one connection');
    try {
      await expect(withinHospitals(pool, [db.hospital.id], (transaction) => transaction.raw('select 1/0'))).rejects.toMatchObject({ code: '22012' });
      expect(await pool('cases').pluck('id')).toEqual([]);
    } finally {
      await pool.destroy();
    }
  });

  test.each(["x'; drop table entries", '', `${'0'.repeat(8)}-0000-0000-0000-${'0'.repeat(12)},`])('refuses %j as a hospital id before it asks the database', async (id) => {
    await expect(withinHospitals(db.database.app, [id], async () => 'reached')).rejects.toThrow(RangeError);
  });
});

describe('a person of one hospital', () => {
  const stranger = () => ({ id: '018f0000-0000-7000-8000-00000000aaaa', reference: 'X-1', plannedBy: db.hospital.deskId });

  test('cannot add a case, an identity or an assignment to another', async () => {
    const attempt = withinHospitals(db.database.app, [db.hospital.id], (transaction) => insertCase(transaction, { ...stranger(), hospitalId: db.other.id }));
    await expect(attempt).rejects.toMatchObject({ code: '42501' });
    const { caseId } = await addCase(db.database.app, db.other);
    const identity = { hospitalId: db.other.id, caseId, salt: Buffer.alloc(16), patientLabel: 'x', recordNumber: 'x' };
    await expect(withinHospitals(db.database.app, [db.hospital.id], (transaction) => insertIdentity(transaction, identity))).rejects.toMatchObject({ code: '42501' });
    const assignment = { hospital_id: db.other.id, case_id: caseId, person_id: db.other.reviewerId, role: 'reviewer' };
    await expect(withinHospitals(db.database.app, [db.hospital.id], (transaction) => transaction('case_assignments').insert(assignment))).rejects.toMatchObject({ code: '42501' });
  });

  test('cannot tie a foreign case to their own hospital', async () => {
    const { caseId } = await addCase(db.database.app, db.other);
    const identity = { hospitalId: db.hospital.id, caseId, salt: Buffer.alloc(16), patientLabel: 'x', recordNumber: 'x' };
    await expect(withinHospitals(db.database.app, [db.hospital.id], (transaction) => insertIdentity(transaction, identity))).rejects.toMatchObject({ code: '23503' });
  });

  test('cannot be assigned with a role that they have not in that hospital', async () => {
    const { caseId } = await addCase(db.database.app, db.hospital);
    const assignment = { hospital_id: db.hospital.id, case_id: caseId, person_id: db.hospital.deskId, role: 'physician' };
    await expect(withinHospitals(db.database.app, [db.hospital.id], (transaction) => transaction('case_assignments').insert(assignment))).rejects.toMatchObject({ code: '23503' });
  });
});

describe('the feed', () => {
  test('reads entries, cases and snapshots of every hospital', async () => {
    for (const table of ['entries', 'cases', 'case_snapshots']) {
      expect(new Set(await db.database.feed(table).pluck<string[]>('hospital_id'))).toEqual(new Set([db.hospital.id, db.other.id]));
    }
  });

  test.each(['people', 'memberships', 'sessions', 'sign_in_attempts', 'case_identities', 'identity_erasures', 'case_assignments', 'read_audit', 'hospitals', 'theatres'])('is refused %s', async (table) => {
    await expect(db.database.feed(table).select()).rejects.toMatchObject({ code: '42501' });
  });

  test('reads the heads of walls but neither token, code nor words, and writes nothing', async () => {
    await expect(db.database.feed('wall_screens').select('id', 'case_id', 'revoked_at')).resolves.toEqual([]);
    for (const column of ['token_hash', 'code', 'words']) await expect(db.database.feed('wall_screens').select(column)).rejects.toMatchObject({ code: '42501' });
    await expect(db.database.feed('entries').insert({ seq: 1 })).rejects.toMatchObject({ code: '42501' });
    await expect(db.database.feed.raw('select credentials_by_email(?)', ['desk@north.example'])).rejects.toMatchObject({ code: '42501' });
  });
});

describe('the audit', () => {
  test('reads the audit of the hospital that is set and nothing else', async () => {
    expect(await db.database.audit('read_audit').pluck('id')).toEqual([]);
    const seen = await withinHospitals(db.database.audit, [db.hospital.id], (transaction) => transaction('read_audit').pluck<string[]>('hospital_id'));
    expect(new Set(seen)).toEqual(new Set([db.hospital.id]));
    for (const table of ['entries', 'cases', 'people', 'case_identities']) await expect(db.database.audit(table).select()).rejects.toMatchObject({ code: '42501' });
  });
});
