import { readIdentity } from '@/db/repositories/cases/read-identity';
import { findCommand } from '@/db/repositories/entries/find-command';
import { withinHospitals } from '@/db/within-hospitals';
import type { CommandReply } from '@/lib/contracts/http/replies';
import type { SignedIn } from '@/server/auth/read-session';
import type { Planning } from '@/server/commands/planning';
import { toWireEntry } from '@/server/cases/to-wire-entry';
import type { ServerContext } from '@/server/server-context';

/** The answer to a planning that is in the log already, or null. The same command with another plan or patient is refused. */
export async function repeatedPlanning(context: ServerContext, { session }: SignedIn, planning: Planning): Promise<CommandReply | null> {
  const { caseId, hospitalId, digest, request } = planning;
  const written = await findCommand(context.database.feed, caseId, request.commandId);
  const first = written[0];
  if (first === undefined) return null;
  const identity = await withinHospitals(context.database.app, [hospitalId], (transaction) =>
    readIdentity(transaction, caseId, { personId: session.personId, rule: 'repeat-of-own-planning' }),
  );
  const isSamePatient =
    identity === null || (identity.patientLabel === request.identity.patientLabel && identity.recordNumber === request.identity.recordNumber);
  if (first.entry.commandDigest === digest && isSamePatient) return { kind: 'committed', caseId, entries: written.map(toWireEntry) };
  const message = `Command id used twice: ${request.commandId} planned a case with other content. Nothing was changed.`;
  return { kind: 'refused', code: 'command-id-used', message, field: 'commandId' };
}
