/** Pages a signed-in person goes to from anywhere. */
export const deskLinks = [
  { href: '/today', label: 'Today' },
  { href: '/cases', label: 'Cases' },
  { href: '/plan', label: 'Plan a case' },
] as const;
