import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import type { CaseState, PathRecord } from '@/lib/case/case-state';
import { pathIdOf } from '@/lib/case/keys';
import { findingPriority } from '@/lib/chart/finding-priority';
import { findingsOf } from '@/lib/chart/findings-of';
import type { NerveLineSite } from '@/lib/chart/nerve-line';
import { testedSince } from '@/lib/chart/tested-since';
import { durationWords, millivolts, nonBreakingSpace, percent } from '@/lib/text/format';

/**
 * One site of the nerve line: the response from there as % of baseline, with its age.
 *
 * Method: the newest comparable run is shown; before there is one, the newest reading with its own unit. No response
 * is "none", never 0 %. Dim means older than the last risk step, than the freshness limit or than a run that is not
 * compared; it does not mean harmless. The response takes a priority only where its amplitude passed a limit.
 *
 * @param state the case; not modified
 * @param nerve the nerve of the site
 * @param site the site
 * @param channelId the channel the line is drawn from
 * @param nowMs time of the picture, Unix ms
 * @returns name, position in mm, text ("38 %", "none", "8.8 mV", "not tested"), age ("20 s", "63 min", "2 h") and priority
 * @source product rule
 * @accuracy tests/lib/chart/nerve-line-view.test.ts
 * @example
 * nerveLineSite(state, nerve, nerve.sites[1], 'adm', nowMs).text // => '38 %'
 */
export function nerveLineSite(state: CaseState, nerve: Nerve, site: Site, channelId: string, nowMs: number): NerveLineSite {
  const record = state.paths[pathIdOf(site.id, channelId)];
  const shownAt = record?.compared?.at ?? record?.lastAt ?? null;
  const ageMs = shownAt === null ? null : Math.max(0, nowMs - Date.parse(shownAt));
  const findings = record?.compared?.findings ?? [];
  const isOld = ageMs === null || ageMs > state.plan.rules.freshnessMinutes * 60_000;
  return {
    siteId: site.id,
    name: site.name,
    positionMm: site.positionMm,
    text: record === undefined ? 'not tested' : responseText(record),
    ageText: ageMs === null ? null : ageWords(ageMs),
    priority: findingPriority(findings, state.incidents[nerve.id]),
    textPriority: findingPriority(findingsOf(findings, 'amplitude'), state.incidents[nerve.id]),
    isDim: isOld || record?.compared == null || record.lastNotCompared !== null || shownAt === null || shownAt < lastRiskStep(state, nerve.id),
  };
}

/** In minutes for two hours: hours and minutes at each site would not stand beside one another. */
function ageWords(ageMs: number): string {
  const minutes = Math.floor(ageMs / 60_000);
  if (minutes >= 120) return `${Math.floor(minutes / 60)}${nonBreakingSpace}h`;
  return minutes >= 60 ? `${minutes}${nonBreakingSpace}min` : durationWords(ageMs);
}

function lastRiskStep(state: CaseState, nerveId: string): string {
  return testedSince({ ...state, incidents: {} }, nerveId);
}

function responseText(record: PathRecord): string {
  const reading = record.compared?.reading ?? record.lastReading;
  const share = record.compared?.change.percentOfBaseline ?? null;
  switch (reading.kind) {
    case 'absent':
      return 'none';
    case 'unusable':
      return 'not usable';
    case 'not-read':
      return 'not read';
    case 'measured':
      if (share !== null) return percent(share);
      return reading.amplitudeUv === null ? 'not read' : millivolts(reading.amplitudeUv);
  }
}
