import type { Handle } from '@/db/connection';
import type { Assignment } from './assign-person';

/** Ends a person's part in a case; the row stays. False when there was none. */
export async function endAssignment(handle: Handle, assignment: Assignment): Promise<boolean> {
  const ended = await handle('case_assignments')
    .where({ hospital_id: assignment.hospitalId, case_id: assignment.caseId, person_id: assignment.personId, role: assignment.role })
    .whereNull('to_at')
    .update({ to_at: handle.fn.now() });
  return ended > 0;
}
