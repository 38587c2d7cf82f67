import type { Handle } from '@/db/connection';
import type { Snapshot } from './insert-snapshot';

/** The latest snapshot of a case in this version of the state, or null. */
export async function findSnapshot(handle: Handle, caseId: string, stateVersion: number): Promise<Snapshot | null> {
  const row = await handle('case_snapshots')
    .where({ case_id: caseId, state_version: stateVersion })
    .orderBy('seq', 'desc')
    .first<Snapshot | undefined>('hospital_id as hospitalId', 'case_id as caseId', 'seq', 'state_version as stateVersion', 'bytes');
  return row ?? null;
}
