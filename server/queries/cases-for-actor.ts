import { casesForPerson } from '@/db/read-models/cases-for-person';
import { withinHospitals } from '@/db/within-hospitals';
import type { CaseListReply } from '@/lib/contracts/http/replies';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import type { ServerContext } from '@/server/server-context';

const mostCases = 200;

/** The list of cases of a signed-in person, in the hospitals where the policy lets them list any. */
export async function casesForActor(context: Pick<ServerContext, 'database'>, { actor }: SignedIn): Promise<CaseListReply> {
  const hospitalIds = [...new Set(actor.memberships.map((membership) => membership.hospitalId))].filter(
    (hospitalId) => decideAccess(actor, 'list-cases', { kind: 'hospital', hospitalId }).isAllowed,
  );
  if (hospitalIds.length === 0) return { cases: [] };
  const lines = await withinHospitals(context.database.app, hospitalIds, (transaction) => casesForPerson(transaction, actor.personId, mostCases));
  return { cases: lines.map(({ hospitalId: _hospital, status, ...line }) => ({ ...line, status: status === 'sealed' ? 'closed' : status })) };
}
