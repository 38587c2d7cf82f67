import type { PlanCaseRequest } from '@/lib/contracts/http/commands';

/** What is planned, where, under which id. */
export interface Planning {
  readonly caseId: string;
  readonly hospitalId: string;
  readonly digest: string;
  readonly request: PlanCaseRequest;
}
