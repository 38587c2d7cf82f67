/** What a person is to one hospital. */
export type Role = 'neurophysiologist' | 'surgeon' | 'physician' | 'reviewer' | 'administrator';

/** A role that a person holds in one hospital now. */
export interface Membership {
  readonly hospitalId: string;
  readonly role: Role;
}

/** Who asks: a signed-in person, a paired wall, a timer of the server, or nobody known. */
export type Actor =
  | { readonly kind: 'person'; readonly personId: string; readonly memberships: readonly Membership[] }
  | { readonly kind: 'screen'; readonly screenId: string; readonly hospitalId: string; readonly caseId: string }
  | { readonly kind: 'timer' }
  | { readonly kind: 'none' };
