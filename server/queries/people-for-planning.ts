import { membersOf } from '@/db/repositories/people/members-of';
import { withinHospitals } from '@/db/within-hospitals';
import type { PeopleReply } from '@/lib/contracts/http/replies';
import { decideAccess } from '@/lib/policy/decide-access';
import type { SignedIn } from '@/server/auth/read-session';
import { notFound } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

const teamRoles = ['neurophysiologist', 'physician', 'surgeon'] as const;

/** People who may take part in a case, of each hospital where this person plans. */
export async function peopleForPlanning({ database }: Pick<ServerContext, 'database'>, { actor }: SignedIn): Promise<PeopleReply> {
  const own = [...new Set(actor.memberships.map(({ hospitalId }) => hospitalId))];
  const hospitalIds = own.filter((hospitalId) => decideAccess(actor, 'list-people', { kind: 'hospital', hospitalId }).isAllowed);
  if (hospitalIds.length === 0) throw notFound();
  return withinHospitals(database.app, hospitalIds, async (transaction) => {
    const people: PeopleReply['people'] = [];
    for (const hospitalId of hospitalIds) {
      for (const role of teamRoles) {
        const members = await membersOf(transaction, hospitalId, role);
        people.push(...members.map(({ personId, displayName }) => ({ hospitalId, personId, displayName, role })));
      }
    }
    return { people };
  });
}
