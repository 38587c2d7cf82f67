import { assertWithin } from '@/lib/units/assert-within';
import { bounds } from '@/lib/units/bounds';

/** A site of one nerve as one muscle saw it since the first abnormal run. */
export interface SiteVerdict {
  readonly siteId: string;
  readonly positionMm: number;
  readonly verdict: 'abnormal' | 'normal' | 'untested';
}

/** Where along the nerve the change lies, or which site to test next. */
export type ChangeLocation =
  | { readonly kind: 'segment'; readonly proximalSiteId: string; readonly distalSiteId: string }
  | { readonly kind: 'outside'; readonly beyond: 'distal' }
  | { readonly kind: 'nothing-abnormal' }
  | { readonly kind: 'not-known'; readonly nextSiteId: string }
  | { readonly kind: 'contradictory'; readonly nextSiteId: string };

/**
 * Where along a nerve a change lies, from the sites tested since the first abnormal run.
 *
 * Method: a stimulus proximal to the harm has to pass it and answers abnormally, one distal to it
 * answers normally. The change therefore lies between the most distal abnormal and the most
 * proximal normal site. A normal site proximal to an abnormal one is a contradiction: the
 * abnormal one is to be repeated, most likely its stimulus failed. It assumes one place of harm
 * and a response recorded distal to all sites.
 *
 * @param nerve sites from proximal to distal with position in mm (0 to 1,500), at least one, not
 *   modified; only runs after the first abnormal one may be passed as tested
 * @returns 'segment' with both sites; 'outside' when even the most distal site is abnormal;
 *   'not-known' with the untested site nearest to the middle of the unknown stretch;
 *   'contradictory' with the site to repeat; 'nothing-abnormal'
 * @throws {RangeError} when there is no site or a position lies outside 0 to 1,500 mm
 * @source common practice (stimulate on both sides of the lesion); halving: house rule
 * @accuracy exact; tests/lib/change/locate-change.test.ts
 * @example
 * locateChange({ sites: [
 *   { siteId: 'above-elbow', positionMm: 0, verdict: 'abnormal' },
 *   { siteId: 'below-elbow', positionMm: 100, verdict: 'normal' },
 * ] }) // => { kind: 'segment', proximalSiteId: 'above-elbow', distalSiteId: 'below-elbow' }
 */
export function locateChange(nerve: { readonly sites: readonly SiteVerdict[] }): ChangeLocation {
  const { sites } = nerve;
  if (sites.length === 0) throw new RangeError('Cannot locate a change: the nerve has no site');
  for (const site of sites) assertWithin(site.positionMm, bounds.positionMm, 'position of a site');
  const firstNormal = sites.findIndex((site) => site.verdict === 'normal');
  const lastAbnormal = sites.findLastIndex((site) => site.verdict === 'abnormal');
  if (firstNormal !== -1 && firstNormal < lastAbnormal) {
    const suspect = sites.find((site, index) => index > firstNormal && site.verdict === 'abnormal');
    if (suspect) return { kind: 'contradictory', nextSiteId: suspect.siteId };
  }
  const nextSite = halvingSite(sites, lastAbnormal, firstNormal === -1 ? sites.length : firstNormal);
  if (nextSite) return { kind: 'not-known', nextSiteId: nextSite.siteId };
  const proximal = sites[lastAbnormal];
  const distal = sites[firstNormal];
  if (!proximal) return { kind: 'nothing-abnormal' };
  if (!distal) return { kind: 'outside', beyond: 'distal' };
  return { kind: 'segment', proximalSiteId: proximal.siteId, distalSiteId: distal.siteId };
}

/** The site strictly between two indices that lies nearest to the middle of the stretch in mm; the proximal one of two. */
function halvingSite(sites: readonly SiteVerdict[], fromIndex: number, toIndex: number): SiteVerdict | null {
  const between = sites.slice(fromIndex + 1, toIndex);
  const start = sites[Math.max(fromIndex, 0)];
  const end = sites[Math.min(toIndex, sites.length - 1)];
  if (!start || !end) return null;
  const middleMm = (start.positionMm + end.positionMm) / 2;
  return between.reduce<SiteVerdict | null>((nearest, site) => {
    const isNearer = !nearest || Math.abs(site.positionMm - middleMm) < Math.abs(nearest.positionMm - middleMm);
    return isNearer ? site : nearest;
  }, null);
}
