import type { Handle } from '@/db/connection';

/** A person or a wall that has a case open now. */
export interface PresentViewer {
  readonly personId: string | null;
  readonly screenId: string | null;
  readonly role: string;
  readonly displayName: string;
  readonly isDesk: boolean;
  readonly since: string;
}

/** Who of one case is connected to one or more processes, and when the last of their desks that is gone went; null when none did. */
export interface CasePresence {
  readonly viewers: readonly PresentViewer[];
  readonly deskGoneAt: string | null;
}

// A process says each second who is there. One that has said nothing for four seconds has ended or cannot be believed.
const IS_THERE = `p.left_at is null and p.seen_at > statement_timestamp() - interval '4 seconds'`;

/** One row of who is connected to other processes than `?`, of the case that `asked.case_id` names. */
export const ELSEWHERE = `
  select
    jsonb_agg(jsonb_build_object('personId', p.person_id, 'screenId', p.screen_id, 'role', p.role, 'displayName', p.display_name,
      'isDesk', p.is_desk, 'since', p.since)) filter (where ${IS_THERE}) as viewers,
    max(coalesce(p.left_at, p.seen_at)) filter (where p.is_desk and not (${IS_THERE})) as desk_gone_at
  from case_presence p where p.case_id = asked.case_id and p.process_id <> ?`;

/** The row as the database gives it. */
export interface ElsewhereRow {
  readonly viewers: readonly PresentViewer[] | null;
  readonly desk_gone_at: string | null;
}

/** Its moments in the form that they have everywhere. */
export function readElsewhere({ viewers, desk_gone_at }: ElsewhereRow): CasePresence {
  return { viewers: (viewers ?? []).map((viewer) => ({ ...viewer, since: new Date(viewer.since).toISOString() })), deskGoneAt: desk_gone_at };
}

/** Who has this case open in other processes than this one, on the feed. */
export async function elsewhere(feed: Handle, caseId: string, processId: string): Promise<CasePresence> {
  const { rows } = await feed.raw<{ rows: ElsewhereRow[] }>(`select present.* from (select ?::uuid as case_id) as asked, lateral (${ELSEWHERE}) as present`, [caseId, processId]);
  return readElsewhere(rows[0] ?? { viewers: null, desk_gone_at: null });
}
