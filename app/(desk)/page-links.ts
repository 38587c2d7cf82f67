import type { SessionReply } from '@/lib/contracts/http/replies';

const today = { href: '/today', label: 'Today' } as const;
const cases = { href: '/cases', label: 'Cases' } as const;
const plan = { href: '/plan', label: 'Plan a case' } as const;

/** Pages that a person's roles have a use for; all of them while the server does not say who it is. */
export function pageLinks(person: Pick<SessionReply, 'memberships'> | null) {
  const roles = person?.memberships.map(({ role }) => role) ?? ['physician', 'neurophysiologist'];
  const follows = roles.includes('physician') || roles.includes('neurophysiologist');
  return [...(follows ? [today] : []), cases, ...(roles.includes('neurophysiologist') ? [plan] : [])];
}

/** Where a person lands: a physician among the cases to follow, everybody else at the list of cases. */
export function homeOf(person: Pick<SessionReply, 'memberships'> | null): string {
  const roles = person?.memberships.map(({ role }) => role) ?? [];
  return roles.includes('physician') && !roles.includes('neurophysiologist') ? today.href : cases.href;
}
