import type { Snapshot } from '@/db/repositories/snapshots/insert-snapshot';
import type { CaseState } from '@/lib/case/case-state';
import type { KeptCase } from '@/server/cases/kept-case';

/** Raised whenever the shape of the state, or what `evolve` copies into it, changes: older snapshots are then passed over. */
export const stateVersion = 3;

const snapshotEvery = 500;

/** Whether the entries from `before` to `after` crossed a number at which a snapshot is kept. */
export function isSnapshotDue(beforeSeq: number, afterSeq: number): boolean {
  return Math.floor(beforeSeq / snapshotEvery) < Math.floor(afterSeq / snapshotEvery);
}

/** The kept case as bytes. Disposable: the log alone counts. */
export function writeSnapshot(hospitalId: string, { state, head }: KeptCase): Snapshot {
  const bytes = new TextEncoder().encode(JSON.stringify({ state, head }));
  return { hospitalId, caseId: state.caseId, seq: head.seq, stateVersion, bytes };
}

/** The kept case of a snapshot, or null when it does not say what its row says: the log is read instead. */
export function readSnapshot(snapshot: Snapshot): KeptCase | null {
  const { state, head } = parsed(snapshot.bytes);
  return state?.seq === snapshot.seq && head?.seq === snapshot.seq && state.hash === head.hash ? { state, head } : null;
}

function parsed(bytes: Uint8Array): { state?: CaseState; head?: KeptCase['head'] } {
  try {
    return (JSON.parse(new TextDecoder().decode(bytes)) ?? {}) as { state?: CaseState; head?: KeptCase['head'] };
  } catch {
    return {};
  }
}
