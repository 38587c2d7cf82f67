import type { Location } from '@/lib/alert/judgement';
import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import { locateChange, type SiteVerdict } from '@/lib/change/locate-change';
import type { CaseState, ComparedRecord } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';
import { isSince, type RunMark } from '@/lib/case/is-since';

/**
 * Where along a nerve the open change lies.
 *
 * Method: from the sites tested since the first abnormal run. Where no response by itself is past a limit and a segment
 * is, the segment is the place, once both of its ends are fresh.
 *
 * @param state the case with the newest judgement
 * @param nerve the nerve
 * @param first the first abnormal run; runs made before it are no evidence
 * @returns the segment, outside the tested sites, or not known with the next site to test; null when nothing fresh is abnormal
 * @source product rule: location from runs after the first abnormal one only
 * @accuracy tests/lib/case/locate-in-case.test.ts
 * @example
 * locateInCase(state, ulnar, { at: '2027-03-14T10:41:55.000Z', seq: 31 })?.kind // => 'segment'
 */
export function locateInCase(state: CaseState, nerve: Nerve, first: RunMark): Location | null {
  const sites: SiteVerdict[] = nerve.sites.map((site) => ({
    siteId: site.id,
    positionMm: site.positionMm,
    verdict: verdictOf(state, site, first),
  }));
  // Before the first abnormal site is known there is nothing to halve.
  if (!sites.some((site) => site.verdict === 'abnormal')) return locateSegment(state, nerve, first);
  const location = locateChange({ sites });
  switch (location.kind) {
    case 'nothing-abnormal':
      return null;
    case 'outside':
      return { kind: 'outside' };
    case 'contradictory':
      return { kind: 'not-known', nextSiteId: location.nextSiteId };
    case 'segment':
    case 'not-known':
      return location;
  }
}

function verdictOf(state: CaseState, site: Site, first: RunMark): SiteVerdict['verdict'] {
  const fresh = state.plan.paths
    .filter((path) => path.siteId === site.id)
    .map((path) => state.paths[path.id]?.compared ?? null)
    .filter((record): record is ComparedRecord => record !== null && isSince(record, first));
  if (fresh.some((record) => isAbnormal(record.findings))) return 'abnormal';
  // A response whose amplitude nobody read does not clear its site.
  return fresh.some((record) => record.change.percentOfBaseline !== null) ? 'normal' : 'untested';
}

function locateSegment(state: CaseState, nerve: Nerve, first: RunMark): Location | null {
  const bad = Object.values(state.segments).filter((segment) => segment.nerveId === nerve.id && isAbnormal(segment.findings));
  const fresh = bad.find((segment) => segment.proximalAt >= first.at && segment.distalAt >= first.at);
  if (fresh !== undefined) return { kind: 'segment', proximalSiteId: fresh.proximalSiteId, distalSiteId: fresh.distalSiteId };
  const half = bad.find((segment) => segment.proximalAt >= first.at || segment.distalAt >= first.at);
  if (half === undefined) return null;
  return { kind: 'not-known', nextSiteId: half.distalAt >= first.at ? half.proximalSiteId : half.distalSiteId };
}
