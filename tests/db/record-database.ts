import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { v7 as uuidv7 } from 'uuid';
import { makeDatabase, makePool, type Database } from '@/db/connection';
import { assignPerson } from '@/db/repositories/cases/assign-person';
import { insertCase } from '@/db/repositories/cases/insert-case';
import { insertIdentity } from '@/db/repositories/cases/insert-identity';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { withinHospitals } from '@/db/within-hospitals';
import { chainEntries, type UnchainedEntry } from '@/lib/record/chain-entries';
import { EMPTY_HEAD, type ChainHead, type SealedEntry } from '@/lib/record/entry';
import { createTestDatabase } from '@/tests/support/database';

/** A hospital of a test with one person in each role that the tests need. */
export interface TestHospital {
  readonly id: string;
  readonly name: string;
  readonly theatreId: string;
  readonly deskId: string;
  readonly reviewerId: string;
}

/** A database of its own with two hospitals, pools for every role, and the administrator's way past all guards. */
export interface RecordDatabase {
  readonly database: Database;
  readonly admin: Knex;
  readonly urls: { readonly app: string; readonly feed: string; readonly audit: string; readonly admin: string };
  readonly hospital: TestHospital;
  readonly other: TestHospital;
  drop(): Promise<void>;
}

export async function openRecordDatabase(): Promise<RecordDatabase> {
  const made = await createTestDatabase();
  const urls = { app: made.appUrl, feed: made.feedUrl, audit: made.auditUrl, admin: made.adminUrl };
  const database = makeDatabase(urls);
  const admin = makePool(urls.admin, 2, 'test administrator');
  const hospital = await addHospital(admin, 'north');
  const other = await addHospital(admin, 'south');
  return {
    database,
    admin,
    urls,
    hospital,
    other,
    async drop() {
      await database.close();
      await admin.destroy();
      await made.drop();
    },
  };
}

async function addHospital(admin: Knex, slug: string): Promise<TestHospital> {
  const hospital = { id: uuidv7(), name: `Hospital ${slug}`, theatreId: uuidv7(), deskId: uuidv7(), reviewerId: uuidv7() };
  await admin('hospitals').insert({ id: hospital.id, slug, name: hospital.name, time_zone: 'Europe/London' });
  await admin('theatres').insert({ hospital_id: hospital.id, id: hospital.theatreId, name: 'Theatre 1' });
  await addPerson(admin, hospital.deskId, `desk@${slug}.example`, hospital.id, 'neurophysiologist');
  await addPerson(admin, hospital.reviewerId, `reviewer@${slug}.example`, hospital.id, 'reviewer');
  return hospital;
}

async function addPerson(admin: Knex, id: string, email: string, hospitalId: string, role: string): Promise<void> {
  await admin('people').insert({ id, email, display_name: role, password_hash: `hash of ${email}`, second_factor_secret: `secret of ${email}` });
  await admin('memberships').insert({ hospital_id: hospitalId, person_id: id, role });
}

/** An entry of a case at n seconds after ten o'clock, not yet chained. */
export function draft(hospital: TestHospital, caseId: string, n: number, kind: string, body: object = { n }): UnchainedEntry {
  const at = new Date(Date.UTC(2027, 2, 14, 10, 0, n)).toISOString();
  return {
    hospitalId: hospital.id,
    caseId,
    kind,
    kindVersion: 1,
    commandId: uuidv7(),
    commandPart: 0,
    commandDigest: 'ab'.repeat(32),
    eventAt: at,
    recordedAt: at,
    author: { id: hospital.deskId, role: 'neurophysiologist', displayName: 'Neurophysiologist' },
    body,
  };
}

/** Chains drafts of these kinds after a head; entry n of the case gets second n. */
export function chained(hospital: TestHospital, caseId: string, head: ChainHead, kinds: readonly string[]): SealedEntry[] {
  return chainEntries(head, kinds.map((kind, index) => draft(hospital, caseId, head.seq + index + 1, kind)));
}

export const PLAN = { title: 'Ulnar nerve at the elbow', procedure: 'Decompression', side: 'left', theatre: 'Theatre 1' };

/** Adds a case with its identity, its assignment and its first entry in one transaction, as planning a case does. */
export async function addCase(app: Knex, hospital: TestHospital, moreKinds: readonly string[] = []): Promise<{ caseId: string; entries: SealedEntry[] }> {
  const caseId = uuidv7();
  const reference = `T-${randomUUID().slice(0, 8)}`;
  const [first] = chainEntries(EMPTY_HEAD, [draft(hospital, caseId, 1, 'case.planned', { reference, plan: PLAN })]);
  if (first === undefined) throw new Error('No first entry was chained.');
  const more = chained(hospital, caseId, { seq: 1, hash: first.hash }, moreKinds);
  await withinHospitals(app, [hospital.id], async (transaction) => {
    await insertCase(transaction, { hospitalId: hospital.id, id: caseId, reference, plannedBy: hospital.deskId });
    await insertIdentity(transaction, { hospitalId: hospital.id, caseId, salt: Buffer.alloc(16, 7), patientLabel: 'Invented patient', recordNumber: 'R-1' });
    await assignPerson(transaction, { hospitalId: hospital.id, caseId, personId: hospital.deskId, role: 'neurophysiologist' });
    await insertEntries(transaction, [first, ...more]);
  });
  return { caseId, entries: [first, ...more] };
}
