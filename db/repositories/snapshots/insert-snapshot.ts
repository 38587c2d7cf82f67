import type { Handle } from '@/db/connection';

/** The state of a case after an entry, as bytes. Disposable: it can always be folded again from the log. */
export interface Snapshot {
  readonly hospitalId: string;
  readonly caseId: string;
  readonly seq: number;
  readonly stateVersion: number;
  readonly bytes: Uint8Array;
}

/** Keeps a snapshot. Two processes fold the same entries to the same state, so the first one stays. */
export async function insertSnapshot(handle: Handle, snapshot: Snapshot): Promise<void> {
  await handle.raw(
    'insert into case_snapshots (hospital_id, case_id, seq, state_version, bytes) values (?, ?, ?, ?, ?) on conflict do nothing',
    [snapshot.hospitalId, snapshot.caseId, snapshot.seq, snapshot.stateVersion, Buffer.from(snapshot.bytes)],
  );
}
