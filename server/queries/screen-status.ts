import { findHospital } from '@/db/repositories/hospitals/find-hospital';
import { findScreenByToken } from '@/db/repositories/screens/find-screen-by-token';
import type { WallScreen } from '@/db/repositories/screens/wall-screen';
import { withinHospitals } from '@/db/within-hospitals';
import type { ScreenReply } from '@/lib/contracts/http/replies';
import { screenTokenHash, screenTokenOf } from '@/server/auth/screen-token';
import type { ServerContext } from '@/server/server-context';

/** How long a code on a wall is taken. House rule. */
export const pairingCodeS = 600;

/** The state of the wall that sent this cookie; null when it never asked, or when its code has grown too old. */
export async function screenStatus(context: ServerContext, cookie: string | null): Promise<ScreenReply | null> {
  const token = screenTokenOf(cookie, context.publicUrl);
  const screen = token === null ? null : await findScreenByToken(context.database.app, screenTokenHash(token));
  if (screen === null) return null;
  if (screen.hospitalId === null || screen.caseId === null) return waitingReply(screen, context.nowMs());
  return boundReply(context, screen, screen.hospitalId, screen.caseId);
}

function waitingReply({ id, code, words, askedAt, revokedAt }: WallScreen, nowMs: number): ScreenReply | null {
  const isTooOld = nowMs - Date.parse(askedAt) > pairingCodeS * 1000;
  return isTooOld || revokedAt !== null ? null : { kind: 'waiting', screenId: id, code, words };
}

async function boundReply(context: ServerContext, screen: WallScreen, hospitalId: string, caseId: string): Promise<ScreenReply> {
  const hospital = await withinHospitals(context.database.app, [hospitalId], (transaction) => findHospital(transaction, hospitalId));
  const timeZone = hospital?.timeZone ?? 'UTC';
  const { state } = await context.memory.catchUp(caseId);
  if (screen.revokedAt !== null) return { kind: 'ended', screenId: screen.id, reason: 'revoked', at: screen.revokedAt, timeZone };
  const closedAt = state.closedAt ?? screen.endedAt;
  if (closedAt !== null) return { kind: 'ended', screenId: screen.id, reason: 'case-closed', at: closedAt, timeZone };
  return { kind: 'paired', screenId: screen.id, caseId, timeZone };
}
