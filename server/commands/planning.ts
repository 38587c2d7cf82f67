import type { TeamMember } from '@/lib/case/entry-bodies';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';

/** What is planned, where, under which id. */
export interface Planning {
  readonly caseId: string;
  readonly hospitalId: string;
  readonly digest: string;
  readonly request: PlanCaseRequest;
  /** People besides the planner, with the names of their accounts. */
  readonly team: readonly TeamMember[];
}
