import type { Handle } from '@/db/connection';

/** One read, or one refusal to let someone read. A person or a wall, never nobody. */
export interface Read {
  readonly hospitalId: string;
  readonly personId: string | null;
  readonly screenId: string | null;
  readonly caseId: string | null;
  readonly what: string;
  readonly outcome: 'allowed' | 'denied';
  readonly rule: string;
}

/** Adds a row to the audit of reads. */
export async function noteRead(handle: Handle, read: Read): Promise<void> {
  await handle('read_audit').insert({
    hospital_id: read.hospitalId,
    person_id: read.personId,
    screen_id: read.screenId,
    case_id: read.caseId,
    what: read.what,
    outcome: read.outcome,
    rule: read.rule,
  });
}
