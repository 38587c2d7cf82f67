import { v7 as newId } from 'uuid';

import { makePool } from '@/db/connection';
import { assignPerson } from '@/db/repositories/cases/assign-person';
import { insertCase } from '@/db/repositories/cases/insert-case';
import { insertIdentity } from '@/db/repositories/cases/insert-identity';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { chainEntries } from '@/lib/record/chain-entries';
import { EMPTY_HEAD } from '@/lib/record/entry';
import type { CaseBuilder } from '@/tests/support/case-builder';

const entriesPerInsert = 500;
let storedCount = 0;

/**
 * Puts a played case into a product's database as a case of the demo hospital, with the very times of its log: a whole
 * operation is there at once, and nothing of it came late. Its desk, its surgeon and its physician may read it.
 */
export async function storeCase(product: { readonly database: { readonly adminUrl: string } }, script: CaseBuilder): Promise<{ caseId: string; reference: string }> {
  const admin = makePool(product.database.adminUrl, 1, 'test stored case');
  try {
    const people = await admin('people').join('memberships', 'memberships.person_id', 'people.id').whereIn('email', ['desk@demo.example', 'surgeon@demo.example', 'physician@demo.example']).select('people.id', 'people.display_name', 'memberships.role', 'memberships.hospital_id');
    const desk = people.find((person) => person.role === 'neurophysiologist');
    if (desk === undefined) throw new Error('The demo hospital has no neurophysiologist');
    const [caseId, hospitalId] = [newId(), desk.hospital_id as string];
    storedCount += 1;
    const reference = `R7-${String(storedCount).padStart(4, '0')}`;
    const drafts = script.entries.map(({ format: _format, seq: _seq, previousHash: _previous, hash: _hash, author, ...entry }) => {
      const writer = people.find((person) => person.role === author.role && person.hospital_id === hospitalId) ?? desk;
      const body = entry.kind === 'case.planned' ? { ...entry.body, reference } : (entry.body ?? {});
      return { ...entry, body, hospitalId, caseId, author: { id: writer.id as string, role: writer.role as string, displayName: writer.display_name as string } };
    });
    const sealed = chainEntries(EMPTY_HEAD, drafts);
    await admin.transaction(async (transaction) => {
      await insertCase(transaction, { hospitalId, id: caseId, reference, plannedBy: desk.id });
      await insertIdentity(transaction, { hospitalId, caseId, salt: Buffer.alloc(32, 7), patientLabel: 'Invented patient', recordNumber: 'DEMO-1' });
      for (const person of people.filter((one) => one.hospital_id === hospitalId)) await assignPerson(transaction, { hospitalId, caseId, personId: person.id, role: person.role });
      for (let from = 0; from < sealed.length; from += entriesPerInsert) await insertEntries(transaction, sealed.slice(from, from + entriesPerInsert));
    });
    return { caseId, reference };
  } finally {
    await admin.destroy();
  }
}
