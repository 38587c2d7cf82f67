import { theatresOf } from '@/db/repositories/theatres/theatres-of';
import { withinHospitals } from '@/db/within-hospitals';
import type { SessionReply } from '@/lib/contracts/http/replies';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import { notFound } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** Who is signed in, with present roles and the theatres of their hospitals. */
export async function sessionForActor(context: Pick<ServerContext, 'database'>, { session, actor }: SignedIn): Promise<SessionReply> {
  if (!decideAccess(actor, 'see-account', { kind: 'account', personId: session.personId }).isAllowed) throw notFound();
  const hospitalIds = [...new Set(session.memberships.map((membership) => membership.hospitalId))];
  const theatres = hospitalIds.length === 0 ? [] : await withinHospitals(context.database.app, hospitalIds, theatresOf);
  const { personId, displayName, email, isDemo, memberships } = session;
  return { personId, displayName, email, isDemo, memberships: [...memberships], theatres };
}
