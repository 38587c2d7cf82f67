import { casesForPerson } from '@/db/read-models/cases-for-person';
import { noteRead } from '@/db/repositories/reads/note-read';
import { withinHospitals } from '@/db/within-hospitals';
import { apiLimits } from '@/lib/contracts/http/api-limits';
import type { CaseListReply } from '@/lib/contracts/http/replies';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import type { ServerContext } from '@/server/server-context';

/**
 * The list of cases of a signed-in person, in the hospitals where the policy lets them list any. Each hospital's audit
 * gets a row: the list names procedures of its cases.
 */
export async function casesForActor({ database }: Pick<ServerContext, 'database'>, { actor }: SignedIn): Promise<CaseListReply> {
  const hospitalIds = [...new Set(actor.memberships.map((membership) => membership.hospitalId))];
  const decided = hospitalIds.map((hospitalId) => ({ hospitalId, ...decideAccess(actor, 'list-cases', { kind: 'hospital', hospitalId }) }));
  const allowed = decided.filter(({ isAllowed }) => isAllowed);
  if (allowed.length === 0) return { cases: [], total: 0 };
  const { lines, total } = await withinHospitals(database.app, allowed.map(({ hospitalId }) => hospitalId), (transaction) => casesForPerson(transaction, actor.personId, apiLimits.listedCases));
  for (const { hospitalId, rule } of allowed) {
    await noteRead(database.app, { hospitalId, personId: actor.personId, screenId: null, caseId: null, what: 'cases', outcome: 'allowed', rule });
  }
  return { cases: lines.map(({ hospitalId: _hospital, status, ...line }) => ({ ...line, status: status === 'sealed' ? 'closed' : status })), total };
}
