import type { Handle } from '@/db/connection';
import type { CaseIdentity } from './insert-identity';

/** In whose name an identity is read, and the rule that allowed it. */
export interface IdentityReader {
  readonly personId: string;
  readonly rule: string;
}

// Reading and noting the read are one statement, so that neither happens without the other.
const READ = `
  with found as (select hospital_id, case_id, salt, patient_label, record_number from case_identities where case_id = :caseId),
    noted as (
      insert into read_audit (hospital_id, person_id, case_id, what, outcome, rule)
      select hospital_id, :personId, case_id, 'identity', 'allowed', :rule from found)
  select hospital_id as "hospitalId", case_id as "caseId", salt, patient_label as "patientLabel", record_number as "recordNumber" from found`;

/** The patient's identity, or null when it was erased or may not be seen. Each read leaves a row in the audit. */
export async function readIdentity(handle: Handle, caseId: string, reader: IdentityReader): Promise<CaseIdentity | null> {
  const { rows } = await handle.raw<{ rows: CaseIdentity[] }>(READ, { caseId, personId: reader.personId, rule: reader.rule });
  return rows[0] ?? null;
}
