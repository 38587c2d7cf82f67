import type { Handle } from '@/db/connection';
import { withinHospitals } from '@/db/within-hospitals';

/** The state of a case after an entry, as bytes. Disposable: it can always be folded again from the log. */
export interface Snapshot {
  readonly hospitalId: string;
  readonly caseId: string;
  readonly seq: number;
  readonly stateVersion: number;
  readonly bytes: Uint8Array;
}

/** One to begin from, and some in case it cannot be read or is of another version. */
const keptPerCase = 3;

/** Keeps a snapshot and the newest before it. Two processes fold the same entries to the same state, so the first one stays. */
export async function insertSnapshot(handle: Handle, snapshot: Snapshot): Promise<void> {
  const { hospitalId, caseId, seq, stateVersion, bytes } = snapshot;
  await withinHospitals(handle, [hospitalId], async (transaction) => {
    await transaction.raw('insert into case_snapshots (hospital_id, case_id, seq, state_version, bytes) values (?, ?, ?, ?, ?) on conflict do nothing', [
      hospitalId,
      caseId,
      seq,
      stateVersion,
      Buffer.from(bytes),
    ]);
    await transaction.raw(
      `delete from case_snapshots where case_id = :caseId and (seq, state_version) not in
        (select seq, state_version from case_snapshots where case_id = :caseId order by seq desc, state_version desc limit :kept)`,
      { caseId, kept: keptPerCase },
    );
  });
}
