import type { Handle } from '@/db/connection';

/** A person's part in a case; the role must be one that they have in the case's hospital. */
export interface Assignment {
  readonly hospitalId: string;
  readonly caseId: string;
  readonly personId: string;
  readonly role: string;
}

/** Assigns a person to a case from now on. Throws the database's 23503 when they have not that role in the hospital. */
export async function assignPerson(handle: Handle, assignment: Assignment): Promise<void> {
  await handle('case_assignments').insert({
    hospital_id: assignment.hospitalId,
    case_id: assignment.caseId,
    person_id: assignment.personId,
    role: assignment.role,
  });
}
