import type { Handle } from '@/db/connection';
import type { Read } from './note-read';

/** A row of the audit. */
export interface NotedRead extends Read {
  readonly id: number;
  readonly at: string;
}

/** Latest reads in a hospital, newest first, on the audit's own connection within that hospital. */
export async function readsOfHospital(audit: Handle, hospitalId: string, limit: number): Promise<NotedRead[]> {
  return audit('read_audit')
    .where({ hospital_id: hospitalId })
    .orderBy('id', 'desc')
    .limit(limit)
    .select<NotedRead[]>('id', 'at', 'hospital_id as hospitalId', 'person_id as personId', 'screen_id as screenId', 'case_id as caseId', 'what', 'outcome', 'rule');
}
