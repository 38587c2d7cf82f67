import type { Handle } from '@/db/connection';

/** A case's own row: what never changes about it. */
export interface CaseRow {
  readonly hospitalId: string;
  readonly id: string;
  readonly reference: string;
  readonly plannedBy: string;
  readonly createdAt: string;
}

/** The case, or null when there is none that this handle may see. */
export async function findCase(handle: Handle, caseId: string): Promise<CaseRow | null> {
  const row = await handle('cases')
    .where({ id: caseId })
    .first<CaseRow | undefined>('hospital_id as hospitalId', 'id', 'reference', 'planned_by as plannedBy', 'created_at as createdAt');
  return row ?? null;
}
