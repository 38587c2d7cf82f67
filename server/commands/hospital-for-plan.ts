import { theatresOf } from '@/db/repositories/theatres/theatres-of';
import { withinHospitals } from '@/db/within-hospitals';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import { failure } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** The hospital a plan belongs to: the one where the person may plan and that has a theatre of this name. */
export async function hospitalForPlan(context: Pick<ServerContext, 'database'>, { actor }: SignedIn, theatre: string): Promise<string> {
  const hospitalIds = [...new Set(actor.memberships.map((membership) => membership.hospitalId))];
  const allowed = hospitalIds.filter((hospitalId) => decideAccess(actor, 'plan-case', { kind: 'hospital', hospitalId }).isAllowed);
  if (allowed.length === 0) throw failure('not-found', 'not-found', 'Not found: this account plans no cases.');
  const theatres = await withinHospitals(context.database.app, allowed, theatresOf);
  const fitting = theatres.filter(({ name }) => name === theatre);
  if (fitting.length === 1 && fitting[0] !== undefined) return fitting[0].hospitalId;
  if (fitting.length === 0) throw failure('bad-request', 'no-such-theatre', `No such theatre: "${theatre}" is none of ${namesOf(theatres)}.`, 'plan.theatre');
  throw failure('bad-request', 'which-hospital', `Which hospital: "${theatre}" stands in more than one hospital of this account.`, 'plan.theatre');
}

function namesOf(theatres: readonly { readonly name: string }[]): string {
  return theatres.slice(0, 20).map(({ name }) => `"${name}"`).join(', ') || 'the hospital\'s theatres (there are none)';
}
