import { readIdentity } from '@/db/repositories/cases/read-identity';
import { withinHospitals } from '@/db/within-hospitals';
import type { CaseHeadReply } from '@/lib/contracts/http/replies';
import { decideAccess } from '@/lib/policy/decide-access';
import { roleOfRule } from '@/lib/policy/rules';
import type { SignedIn } from '@/server/auth/read-session';
import { openCase } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/** What the page of a case shows beside its log: identity only for those the policy shows it to, and each time it is noted. */
export async function caseHead(context: ServerContext, { actor, session }: SignedIn, caseId: string): Promise<CaseHeadReply> {
  const { row, resource, rule } = await openCase(context, actor, { caseId, action: 'see-case', what: 'case' });
  const seesIdentity = decideAccess(actor, 'see-identity', resource);
  const identity = seesIdentity.isAllowed
    ? await withinHospitals(context.database.app, [row.hospitalId], (transaction) =>
        readIdentity(transaction, caseId, { personId: session.personId, rule: seesIdentity.rule }),
      )
    : null;
  const hospital = session.memberships.find((membership) => membership.hospitalId === row.hospitalId);
  return {
    caseId,
    hospitalId: row.hospitalId,
    hospitalName: hospital?.hospitalName ?? '',
    timeZone: hospital?.timeZone ?? 'UTC',
    reference: row.reference,
    role: roleOfRule(rule) ?? '',
    mayWrite: decideAccess(actor, 'write-case', resource).isAllowed,
    patientLabel: identity?.patientLabel ?? null,
    recordNumber: identity?.recordNumber ?? null,
  };
}
