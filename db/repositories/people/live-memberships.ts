import type { Handle } from '@/db/connection';
import type { LiveMembership } from '@/db/repositories/sessions/find-live-session';

/** A person's present roles in every hospital. */
export async function liveMemberships(handle: Handle, personId: string): Promise<LiveMembership[]> {
  const { rows } = await handle.raw<{ rows: LiveMembership[] }>(
    'select hospital_id as "hospitalId", hospital_name as "hospitalName", time_zone as "timeZone", role from live_memberships(?)',
    [personId],
  );
  return rows;
}
