import type { DeskPerson, TypedReading } from '@/tests/support/desk-person';
import { ulnarBaseline, ulnarSites, type UlnarSite } from '@/tests/support/ulnar-case';

/** The digit on the site's button, as the template gives it. */
export const siteKeys: Readonly<Record<UlnarSite, string>> = { axilla: '1', 'above-elbow': '2', 'below-elbow': '3', wrist: '4' };

/** What is typed for ADM at a share of the baseline, later by some ms: ms with two decimals, mV with two. */
export function typedAdm(site: UlnarSite, share = 1, laterMs = 0): TypedReading {
  const { onsetMs, amplitudeUv } = ulnarBaseline[site];
  return [(onsetMs + laterMs).toFixed(2), ((amplitudeUv * share) / 1000).toFixed(2)];
}

/** One run of an ulnar site, ADM read, FDI not. */
export function logUlnarByKeys(desk: DeskPerson, site: UlnarSite, share = 1, laterMs = 0, options: { tickSupramaximal?: boolean } = {}): Promise<void> {
  return desk.logRunByKeys(siteKeys[site], [typedAdm(site, share, laterMs)], options);
}

/** Three runs at every ulnar site and at the control, by keyboard alone; the first at a site says that it is supramaximal. */
export async function logBaselineByKeys(desk: DeskPerson): Promise<void> {
  for (const site of ulnarSites) {
    for (let count = 0; count < 3; count += 1) await logUlnarByKeys(desk, site, 1, 0, { tickSupramaximal: count === 0 });
  }
  for (let count = 0; count < 3; count += 1) await desk.logRunByKeys('5', [['3.30', '11.0']], { tickSupramaximal: count === 0 });
}
