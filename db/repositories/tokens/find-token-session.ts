import type { Handle } from '@/db/connection';
import type { LiveSession } from '@/db/repositories/sessions/find-live-session';

// The roles are those of this moment, as for a session.
const USE = `
  select t.token_id as "sessionId", t.person_id as "personId", t.email, t.display_name as "displayName", t.is_demo as "isDemo",
    t.expires_at as "expiresAt", null as "reauthenticatedAt",
    coalesce((select jsonb_agg(jsonb_build_object(
      'hospitalId', m.hospital_id, 'hospitalName', m.hospital_name, 'timeZone', m.time_zone, 'role', m.role))
      from live_memberships(t.person_id) as m), '[]') as memberships
  from use_access_token(?) as t`;

/** The person of a token with their present roles, in the form of a session; null when the token is not good. */
export async function findTokenSession(handle: Handle, tokenHash: Buffer): Promise<LiveSession | null> {
  const { rows } = await handle.raw<{ rows: LiveSession[] }>(USE, [tokenHash]);
  return rows[0] ?? null;
}
