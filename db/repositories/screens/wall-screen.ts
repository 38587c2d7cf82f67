/** A wall display: waiting to be paired, bound to one case, revoked, or ended with its case. */
export interface WallScreen {
  readonly id: string;
  readonly hospitalId: string | null;
  readonly theatreId: string | null;
  readonly caseId: string | null;
  readonly code: string;
  readonly words: string;
  readonly askedAt: string;
  readonly pairedAt: string | null;
  readonly pairedBy: string | null;
  readonly revokedAt: string | null;
  readonly endedAt: string | null;
  readonly lastSeenAt: string | null;
}

/** Columns of a wall screen; the hash of its token stays in the database. */
export const SCREEN_COLUMNS = `id, hospital_id as "hospitalId", theatre_id as "theatreId", case_id as "caseId", code, words,
  asked_at as "askedAt", paired_at as "pairedAt", paired_by as "pairedBy", revoked_at as "revokedAt", ended_at as "endedAt",
  last_seen_at as "lastSeenAt"`;
