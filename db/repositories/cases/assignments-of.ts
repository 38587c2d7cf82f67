import type { Handle } from '@/db/connection';

/** A person's present part in a case. */
export interface CurrentAssignment {
  readonly personId: string;
  readonly role: string;
  readonly fromAt: string;
}

/** Who is assigned to a case now. */
export async function assignmentsOf(handle: Handle, caseId: string): Promise<CurrentAssignment[]> {
  return handle('case_assignments')
    .where({ case_id: caseId })
    .whereNull('to_at')
    .orderBy(['role', 'from_at'])
    .select<CurrentAssignment[]>('person_id as personId', 'role', 'from_at as fromAt');
}
