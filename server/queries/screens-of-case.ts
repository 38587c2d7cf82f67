import { elsewhere } from '@/db/repositories/presence/elsewhere';
import { screensOfCase as boundScreens } from '@/db/repositories/screens/screens-of-case';
import { withinHospitals } from '@/db/within-hospitals';
import type { SignedIn } from '@/server/auth/read-session';
import type { Presence } from '@/server/cases/presence';
import { wallsIn } from '@/server/cases/whole-presence';
import { openCase } from '@/server/queries/open-case';
import type { ScreensReply } from '@/lib/contracts/http/account';
import type { ServerContext } from '@/server/server-context';

/** Walls bound to a case, with who of them is connected to any process. */
export async function screensOfCase(context: ServerContext, presence: Presence, { actor }: SignedIn, caseId: string): Promise<ScreensReply> {
  const { row } = await openCase(context, actor, { caseId, action: 'see-screens', what: 'screens' });
  const bound = await withinHospitals(context.database.app, [row.hospitalId], (transaction) => boundScreens(transaction, caseId));
  const connected = await connectedWalls(context, presence, caseId);
  return {
    screens: bound.map((screen) => ({
      screenId: screen.id,
      words: screen.words,
      pairedAt: screen.pairedAt ?? screen.askedAt,
      lastSeenAt: screen.lastSeenAt,
      endedAt: screen.endedAt,
      isConnected: connected.has(screen.id),
    })),
  };
}

/** A wall that another process has and that cannot be asked about counts as not connected. */
async function connectedWalls({ database, log }: ServerContext, presence: Presence, caseId: string): Promise<ReadonlySet<string>> {
  const here = presence.of(caseId).viewers;
  try {
    return wallsIn([...here, ...(await elsewhere(database.feed, caseId, presence.processId)).viewers]);
  } catch (cause) {
    log.warn({ err: cause, caseId }, 'Walls of other processes could not be asked for.');
    return wallsIn(here);
  }
}
