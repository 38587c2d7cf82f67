import type { Handle } from '@/db/connection';
import type { LiveSession } from './find-live-session';

// One statement for all open sockets of a process, asked once a second.
const FIND = `
  select asked.id as "sessionId", s.person_id as "personId", s.email, s.display_name as "displayName", s.is_demo as "isDemo",
    s.expires_at as "expiresAt", s.reauthenticated_at as "reauthenticatedAt",
    coalesce((select jsonb_agg(jsonb_build_object(
      'hospitalId', m.hospital_id, 'hospitalName', m.hospital_name, 'timeZone', m.time_zone, 'role', m.role))
      from live_memberships(s.person_id) as m), '[]') as memberships
  from unnest(?::uuid[]) as asked (id), lateral session_person(asked.id) as s`;

/** Those of these sessions that are live, with their people and present roles, by session id. */
export async function findLiveSessions(handle: Handle, sessionIds: readonly string[]): Promise<Map<string, LiveSession>> {
  const { rows } = await handle.raw<{ rows: LiveSession[] }>(FIND, [[...sessionIds]]);
  return new Map(rows.map((row) => [row.sessionId, row]));
}
