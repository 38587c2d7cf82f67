import type { Action } from '@/lib/policy/action';
import type { Role } from '@/lib/policy/actor';
import type { CaseResource } from '@/lib/policy/resource';

/** One sentence of the policy: who may do what to which cases. */
export interface CaseRule {
  readonly name: string;
  readonly role: Role;
  /** Assigned to the case, or any case of the hospital. */
  readonly reach: 'assigned' | 'hospital';
  readonly statuses: readonly CaseResource['status'][];
  readonly actions: readonly Action[];
}

const everyStatus = ['planned', 'open', 'closed'] as const;
const beforeClose = ['planned', 'open'] as const;

/**
 * What people may do to cases. A case that no line allows stays unseen.
 * @source house rule: the table of people in the product's description; a reviewer meets closed cases by their reference only
 */
export const caseRules: readonly CaseRule[] = [
  {
    name: 'neurophysiologist-of-the-case',
    role: 'neurophysiologist',
    reach: 'assigned',
    statuses: everyStatus,
    actions: ['see-case', 'see-identity', 'write-case', 'send-message', 'accept-baseline', 'see-screens', 'revoke-screen'],
  },
  { name: 'neurophysiologist-pairs-until-close', role: 'neurophysiologist', reach: 'assigned', statuses: beforeClose, actions: ['pair-screen'] },
  { name: 'surgeon-of-the-case', role: 'surgeon', reach: 'assigned', statuses: everyStatus, actions: ['see-case', 'see-identity'] },
  {
    name: 'physician-of-the-case',
    role: 'physician',
    reach: 'assigned',
    statuses: everyStatus,
    actions: ['see-case', 'see-identity', 'send-message', 'give-advice', 'accept-baseline', 'confirm-baseline', 'see-screens'],
  },
  { name: 'reviewer-of-closed-cases', role: 'reviewer', reach: 'hospital', statuses: ['closed'], actions: ['see-case'] },
];

/** What people may do in a hospital as a whole. */
export const hospitalRules: readonly { readonly name: string; readonly role: Role; readonly actions: readonly Action[] }[] = [
  { name: 'neurophysiologist-of-the-hospital', role: 'neurophysiologist', actions: ['list-cases', 'plan-case', 'list-people'] },
  { name: 'surgeon-of-the-hospital', role: 'surgeon', actions: ['list-cases'] },
  { name: 'physician-of-the-hospital', role: 'physician', actions: ['list-cases'] },
  { name: 'reviewer-of-the-hospital', role: 'reviewer', actions: ['list-cases'] },
];

/**
 * The role that a rule on cases speaks of; an entry carries it as its author's role.
 *
 * @param ruleName name of a rule, as `decideAccess` tells it
 * @returns the role, or null when the rule speaks of no person
 * @source house rule
 * @example roleOfRule('surgeon-of-the-case') // 'surgeon'
 */
export function roleOfRule(ruleName: string): Role | null {
  return caseRules.find((rule) => rule.name === ruleName)?.role ?? null;
}
