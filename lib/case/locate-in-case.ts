import type { Location } from '@/lib/alert/judgement';
import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import { locateChange, type SiteVerdict } from '@/lib/change/locate-change';
import type { CaseState, ComparedRecord } from '@/lib/case/case-state';
import { isAbnormal } from '@/lib/case/is-abnormal';

/**
 * Where along a nerve the open change lies.
 * @param state the case with the newest judgement
 * @param nerve the nerve
 * @param firstSeq number of the first abnormal run; older runs are no evidence
 * @returns the segment, outside the tested sites, or not known with the next site to test; null when no fresh path is abnormal
 * @source product rule: location from runs after the first abnormal one only
 * @accuracy tests/lib/case/locate-in-case.test.ts
 * @example
 * locateInCase(state, ulnar, 31)?.kind // => 'segment'
 */
export function locateInCase(state: CaseState, nerve: Nerve, firstSeq: number): Location | null {
  const sites: SiteVerdict[] = nerve.sites.map((site) => ({
    siteId: site.id,
    positionMm: site.positionMm,
    verdict: verdictOf(state, site, firstSeq),
  }));
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
      // Before the first abnormal site is known there is nothing to halve.
      return sites.some((site) => site.verdict === 'abnormal') ? location : null;
  }
}

function verdictOf(state: CaseState, site: Site, firstSeq: number): SiteVerdict['verdict'] {
  const fresh = state.plan.paths
    .filter((path) => path.siteId === site.id)
    .map((path) => state.paths[path.id]?.compared ?? null)
    .filter((record): record is ComparedRecord => record !== null && record.seq >= firstSeq);
  if (fresh.length === 0) return 'untested';
  return fresh.some((record) => isAbnormal(record.findings)) ? 'abnormal' : 'normal';
}
