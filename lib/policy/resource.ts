import type { Role } from '@/lib/policy/actor';

/** A person's part in one case. It counts only while the person holds the same role in the case's hospital. */
export interface Assignment {
  readonly personId: string;
  readonly role: Role;
}

/** A case as the policy sees it. `closed` stands for everything after the close. */
export interface CaseResource {
  readonly kind: 'case';
  readonly hospitalId: string;
  readonly caseId: string;
  readonly status: 'planned' | 'open' | 'closed';
  readonly assignments: readonly Assignment[];
}

/** What is asked for: a hospital as a place to work in, one case, or one person's own account. */
export type Resource =
  | CaseResource
  | { readonly kind: 'hospital'; readonly hospitalId: string }
  | { readonly kind: 'account'; readonly personId: string };
