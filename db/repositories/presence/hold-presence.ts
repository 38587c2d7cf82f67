import type { Handle } from '@/db/connection';
import type { PresentViewer } from './elsewhere';

/** A viewer of this process with the case that it has open. */
export interface HeldViewer extends PresentViewer {
  readonly viewerId: string;
  readonly hospitalId: string;
  readonly caseId: string;
}

/** Says who is connected to this process now, in one statement: whoever is not named has left. */
export async function holdPresence(handle: Handle, processId: string, viewers: readonly HeldViewer[]): Promise<void> {
  const rows = viewers.map((viewer) => ({
    viewer_id: viewer.viewerId,
    hospital_id: viewer.hospitalId,
    case_id: viewer.caseId,
    person_id: viewer.personId,
    screen_id: viewer.screenId,
    role: viewer.role,
    display_name: viewer.displayName,
    is_desk: viewer.isDesk,
    since: viewer.since,
  }));
  await handle.raw('select hold_presence(?, ?::jsonb)', [processId, JSON.stringify(rows)]);
}
