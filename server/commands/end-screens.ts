import { endScreensForCase } from '@/db/repositories/screens/end-screens-for-case';
import { withinHospitals } from '@/db/within-hospitals';
import type { ServerContext } from '@/server/server-context';

/** Notes that the walls of a closed case are through. The close itself is in the log and decides; this row only says when. */
export async function endScreens(context: ServerContext, hospitalId: string, caseId: string): Promise<void> {
  try {
    await withinHospitals(context.database.app, [hospitalId], (transaction) => endScreensForCase(transaction, caseId));
  } catch (cause) {
    context.log.warn({ err: cause, caseId }, 'The walls of a closed case were not marked as ended; they end by the log.');
  }
}
