import type { Handle } from '@/db/connection';

/** Who the patient of a case is, and the salt of the commitment in the log. */
export interface CaseIdentity {
  readonly hospitalId: string;
  readonly caseId: string;
  readonly salt: Uint8Array;
  readonly patientLabel: string;
  readonly recordNumber: string;
}

/** Keeps the identity apart from the log, where it can be erased. */
export async function insertIdentity(handle: Handle, identity: CaseIdentity): Promise<void> {
  await handle('case_identities').insert({
    hospital_id: identity.hospitalId,
    case_id: identity.caseId,
    salt: Buffer.from(identity.salt),
    patient_label: identity.patientLabel,
    record_number: identity.recordNumber,
  });
}
