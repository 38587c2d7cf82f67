import { createHash } from 'node:crypto';

import { canonicalBytes } from '@/lib/record/canonical-bytes';

/** Who the patient is, as the plan page sends it. */
export interface Identity {
  readonly patientLabel: string;
  readonly recordNumber: string;
}

/** What the log holds instead of the patient: it proves an identity that is shown, and tells nothing without the salt. */
export function identityCommitment(identity: Identity, salt: Uint8Array): string {
  const { patientLabel, recordNumber } = identity;
  return createHash('sha256').update('fascicle-identity-1\n').update(salt).update(canonicalBytes({ patientLabel, recordNumber })).digest('hex');
}
