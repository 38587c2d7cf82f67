import type { Handle } from '@/db/connection';

/** A present assignment with the case it is to. */
export interface CaseAssignment {
  readonly caseId: string;
  readonly hospitalId: string;
  readonly personId: string;
  readonly role: string;
}

/** Who is assigned to any of these cases now. Run it within the hospitals of the readers. */
export async function assignmentsOfCases(handle: Handle, caseIds: readonly string[]): Promise<CaseAssignment[]> {
  return handle('case_assignments')
    .whereIn('case_id', [...caseIds])
    .whereNull('to_at')
    .select<CaseAssignment[]>('case_id as caseId', 'hospital_id as hospitalId', 'person_id as personId', 'role');
}
