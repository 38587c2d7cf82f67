import { theatresOf } from '@/db/repositories/theatres/theatres-of';
import { withinHospitals } from '@/db/within-hospitals';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import { failure } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** What a plan says of its place. */
interface PlannedPlace {
  readonly theatre: string;
  /** Undefined where the theatre's name is enough. */
  readonly hospitalId: string | undefined;
}

/** The hospital a plan belongs to: one where the person may plan, that has a theatre of this name; the one that was named, if any. */
export async function hospitalForPlan(context: Pick<ServerContext, 'database'>, { actor }: SignedIn, { theatre, hospitalId: named }: PlannedPlace): Promise<string> {
  const hospitalIds = [...new Set(actor.memberships.map((membership) => membership.hospitalId))];
  const allowed = hospitalIds.filter((hospitalId) => decideAccess(actor, 'plan-case', { kind: 'hospital', hospitalId }).isAllowed);
  if (allowed.length === 0) throw failure('not-found', 'not-found', 'Not found: this account plans no cases.');
  // The same words for a hospital of others and for one that is not there.
  if (named !== undefined && !allowed.includes(named)) throw failure('not-found', 'no-such-hospital', `Not found: this account plans no cases in the hospital ${named}.`, 'hospitalId');
  const theatres = await withinHospitals(context.database.app, named === undefined ? allowed : [named], theatresOf);
  const fitting = theatres.filter(({ name }) => name === theatre);
  if (fitting.length === 1 && fitting[0] !== undefined) return fitting[0].hospitalId;
  if (fitting.length === 0) throw failure('bad-request', 'no-such-theatre', `No such theatre: "${theatre}" is none of ${namesOf(theatres)}.`, 'plan.theatre');
  throw failure('bad-request', 'which-hospital', `Which hospital: "${theatre}" stands in more than one hospital of this account. Name the hospital.`, 'hospitalId');
}

function namesOf(theatres: readonly { readonly name: string }[]): string {
  return theatres.slice(0, 20).map(({ name }) => `"${name}"`).join(', ') || 'the hospital\'s theatres (there are none)';
}
