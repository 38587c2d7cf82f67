import type { Handle } from '@/db/connection';

/** What a waiting wall is bound to, and by whom. */
export interface Pairing {
  readonly screenId: string;
  readonly hospitalId: string;
  readonly theatreId: string | null;
  readonly caseId: string;
  readonly pairedBy: string;
}

/** Binds a waiting wall to one case; false when it no longer waits. */
export async function pairScreen(handle: Handle, pairing: Pairing): Promise<boolean> {
  const paired = await handle('wall_screens')
    .where({ id: pairing.screenId })
    .whereNull('paired_at')
    .whereNull('revoked_at')
    .update({
      hospital_id: pairing.hospitalId,
      theatre_id: pairing.theatreId,
      case_id: pairing.caseId,
      paired_by: pairing.pairedBy,
      paired_at: handle.fn.now(),
    });
  return paired > 0;
}
