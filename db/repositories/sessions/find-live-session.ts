import type { Handle } from '@/db/connection';

/** A session that is neither revoked nor past its time, with its person. */
export interface LiveSession {
  readonly sessionId: string;
  readonly personId: string;
  readonly email: string;
  readonly displayName: string;
  readonly isDemo: boolean;
  readonly expiresAt: string;
  readonly reauthenticatedAt: string | null;
  readonly memberships: readonly LiveMembership[];
}

/** A role in a hospital that was not revoked. */
export interface LiveMembership {
  readonly hospitalId: string;
  readonly hospitalName: string;
  readonly timeZone: string;
  readonly role: string;
}

// One statement for every request: the roles are those of this moment, not those of the sign-in.
const FIND = `
  select s.person_id as "personId", s.email, s.display_name as "displayName", s.is_demo as "isDemo",
    s.expires_at as "expiresAt", s.reauthenticated_at as "reauthenticatedAt",
    coalesce((select jsonb_agg(jsonb_build_object(
      'hospitalId', m.hospital_id, 'hospitalName', m.hospital_name, 'timeZone', m.time_zone, 'role', m.role))
      from live_memberships(s.person_id) as m), '[]') as memberships
  from session_person(?) as s`;

/** The session with its person and their present roles, or null when it is not live. */
export async function findLiveSession(handle: Handle, sessionId: string): Promise<LiveSession | null> {
  const { rows } = await handle.raw<{ rows: Omit<LiveSession, 'sessionId'>[] }>(FIND, [sessionId]);
  const row = rows[0];
  return row === undefined ? null : { sessionId, ...row };
}
