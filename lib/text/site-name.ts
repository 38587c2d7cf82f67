import type { CasePlan } from '@/lib/case/plan';

/** Name of a site in running text: first letter small. @returns "above elbow"; the id when the plan has no such site @source house rule */
export function siteName(plan: CasePlan, siteId: string): string {
  const site = plan.nerves.flatMap((nerve) => nerve.sites).find((candidate) => candidate.id === siteId);
  const name = site?.name ?? siteId;
  return name.charAt(0).toLowerCase() + name.slice(1);
}

/**
 * Two neighbouring sites in running text; a last word they share is said once.
 * @returns "above and below elbow", "axilla and above elbow"
 * @source house rule
 * @example
 * siteNames(plan, 'above-elbow', 'below-elbow') // => 'above and below elbow'
 */
export function siteNames(plan: CasePlan, firstId: string, secondId: string): string {
  const first = siteName(plan, firstId).split(' ');
  const second = siteName(plan, secondId).split(' ');
  const isShared = first.length === 2 && second.length === 2 && first[1] === second[1];
  return isShared ? `${first[0]} and ${second.join(' ')}` : `${first.join(' ')} and ${second.join(' ')}`;
}
