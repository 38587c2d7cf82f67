import type { Action } from '@/lib/policy/action';
import type { Actor } from '@/lib/policy/actor';
import type { CaseResource, Resource } from '@/lib/policy/resource';
import { caseRules, hospitalRules } from '@/lib/policy/rules';

/** The answer of the policy with the rule that gave it; `no-rule` is the default deny. */
export interface AccessDecision {
  readonly isAllowed: boolean;
  readonly rule: string;
}

type Person = Extract<Actor, { kind: 'person' }>;

const denied: AccessDecision = { isAllowed: false, rule: 'no-rule' };

/**
 * May this actor do this to that?
 *
 * Default deny: only a rule that fits role, hospital, assignment and status allows, and its name is told so that the
 * audit can say why. Looks at what it is given: the caller brings memberships and assignments as they stand now. Says
 * nothing about whether the case exists; a caller answers "denied" and "no such case" with the same words.
 *
 * @param actor who asks; not modified
 * @param action what is asked
 * @param resource what it is asked of; not modified
 * @returns allowed or denied, with the rule's name
 * @source house rule
 * @accuracy tests/lib/policy/decide-access.test.ts, a matrix written by hand
 * @example decideAccess({ kind: 'none' }, 'see-case', resource) // { isAllowed: false, rule: 'no-rule' }
 */
export function decideAccess(actor: Actor, action: Action, resource: Resource): AccessDecision {
  const rule = ruleFor(actor, action, resource);
  return rule === null ? denied : { isAllowed: true, rule };
}

function ruleFor(actor: Actor, action: Action, resource: Resource): string | null {
  if (actor.kind === 'screen') return screenRule(actor, action, resource);
  if (actor.kind === 'timer') return action === 'run-timer' && resource.kind === 'case' && resource.status === 'open' ? 'timer-of-an-open-case' : null;
  if (actor.kind !== 'person') return null;
  if (resource.kind === 'case') return caseRule(actor, action, resource);
  if (resource.kind === 'account') return accountRule(actor, action, resource.personId);
  const fitting = hospitalRules.find((rule) => rule.actions.includes(action) && holds(actor, resource.hospitalId, rule.role));
  return fitting?.name ?? null;
}

function caseRule(actor: Person, action: Action, resource: CaseResource): string | null {
  const fitting = caseRules.find(
    (rule) =>
      rule.actions.includes(action) &&
      rule.statuses.includes(resource.status) &&
      holds(actor, resource.hospitalId, rule.role) &&
      (rule.reach === 'hospital' || isAssigned(actor, resource, rule.role)),
  );
  return fitting?.name ?? null;
}

function screenRule(actor: Extract<Actor, { kind: 'screen' }>, action: Action, resource: Resource): string | null {
  if (resource.kind !== 'case' || resource.caseId !== actor.caseId || resource.hospitalId !== actor.hospitalId) return null;
  if (resource.status === 'closed') return null;
  return action === 'see-case' || action === 'confirm-paint' ? 'wall-of-the-case' : null;
}

function accountRule(actor: Person, action: Action, personId: string): string | null {
  return actor.personId === personId && (action === 'see-account' || action === 'reauthenticate') ? 'own-account' : null;
}

function holds(actor: Person, hospitalId: string, role: string): boolean {
  return actor.memberships.some((membership) => membership.hospitalId === hospitalId && membership.role === role);
}

function isAssigned(actor: Person, resource: CaseResource, role: string): boolean {
  return resource.assignments.some((assignment) => assignment.personId === actor.personId && assignment.role === role);
}
