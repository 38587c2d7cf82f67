import type { Handle } from '@/db/connection';

/** A case about to exist; its first entry is written in the same transaction. */
export interface NewCase {
  readonly hospitalId: string;
  readonly id: string;
  readonly reference: string;
  readonly plannedBy: string;
}

/** Adds a case. Throws the database's 23505 when the hospital has this reference already. */
export async function insertCase(handle: Handle, planned: NewCase): Promise<void> {
  await handle('cases').insert({
    hospital_id: planned.hospitalId,
    id: planned.id,
    reference: planned.reference,
    planned_by: planned.plannedBy,
  });
}
