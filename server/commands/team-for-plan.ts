import { membersOf } from '@/db/repositories/people/members-of';
import { withinHospitals } from '@/db/within-hospitals';
import type { TeamMember } from '@/lib/case/entry-bodies';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';
import { failure } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** The people named in a planning, each of whom must hold that role in the hospital. */
export async function teamForPlan(context: Pick<ServerContext, 'database'>, hospitalId: string, { team = [] }: PlanCaseRequest): Promise<readonly TeamMember[]> {
  if (team.length === 0) return [];
  return withinHospitals(context.database.app, [hospitalId], async (transaction) => {
    const roles = [...new Set(team.map(({ role }) => role))];
    const members = new Map(await Promise.all(roles.map(async (role) => [role, await membersOf(transaction, hospitalId, role)] as const)));
    return team.map(({ personId, role }, index) => {
      const found = members.get(role)?.find((member) => member.personId === personId);
      if (found === undefined) throw failure('bad-request', 'no-such-person', `No such person: nobody with this id is ${role} in the hospital of this theatre.`, `team.${index}.personId`);
      return { personId, role, displayName: found.displayName };
    });
  });
}
