import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import type { CaseState, PathRecord } from '@/lib/case/case-state';
import { pathIdOf } from '@/lib/case/keys';
import { brokenText } from '@/lib/chart/broken-text';
import { findingPriority } from '@/lib/chart/finding-priority';
import { findingsOf } from '@/lib/chart/findings-of';
import { isLastNotCompared } from '@/lib/chart/is-last-not-compared';
import type { NerveLineSegment } from '@/lib/chart/nerve-line';
import { nerveLineSite } from '@/lib/chart/nerve-line-site';
import { siteShare } from '@/lib/chart/site-share';
import { standingText } from '@/lib/chart/standing-text';
import { testedSince } from '@/lib/chart/tested-since';
import { milliseconds } from '@/lib/text/format';

/**
 * From the most distal site to the channel: there is no response from further on, so the segment carries the whole
 * response of its site, and a latency in place of a velocity.
 *
 * Method: amplitude share is the site's own share; the velocity share is baseline onset over onset now. The onset holds
 * the time across the muscle's end plates too, so it is no velocity and is not shown as one.
 *
 * @param state the case; not modified
 * @param nerve the nerve of the site
 * @param site its most distal site
 * @param channelId the channel the line is drawn from
 * @param endMm position of the channel in mm
 * @param nowMs time of the picture, Unix ms
 * @returns the segment with the onset in ms as its text
 * @source common practice (distal latency)
 * @accuracy tests/lib/chart/nerve-line-view.test.ts
 * @example
 * distalSegment(state, nerve, wrist, 'adm', 530, nowMs).text // => '2.90 ms'
 */
export function distalSegment(state: CaseState, nerve: Nerve, site: Site, channelId: string, endMm: number, nowMs: number): NerveLineSegment {
  const record = state.paths[pathIdOf(site.id, channelId)];
  const isNotCompared = isLastNotCompared(record);
  const isUntested = isNotCompared || record?.compared == null || record.compared.at < testedSince(state, nerve.id);
  const share = siteShare(record);
  const isBroken = !isUntested && share === 0;
  const onset = onsetText(record);
  const { isDim } = nerveLineSite(state, nerve, site, channelId, nowMs);
  const isOlder = (isUntested || isDim) && record?.compared != null;
  const findings = record?.compared?.findings ?? [];
  const priority = findingPriority(findings, state.incidents[nerve.id]);
  return {
    key: `${channelId}|${site.id}|end`,
    fromMm: site.positionMm,
    toMm: endMm,
    amplitudeShare: share,
    velocityShare: onsetShare(record),
    ...(isBroken ? brokenText(record) : standingText({ text: onset, shortText: onset }, isOlder ? 'older' : 'current')),
    priority,
    textPriority: isBroken ? priority : findingPriority(findingsOf(findings, 'time'), state.incidents[nerve.id]),
    isUntested,
    isNotCompared,
    isDim,
    isBroken,
    isShort: false,
  };
}

function onsetText(record: PathRecord | undefined): string {
  const reading = record?.compared?.reading ?? record?.lastReading;
  if (reading === undefined) return '';
  if (reading.kind === 'absent') return 'no response';
  return reading.kind === 'measured' && reading.onsetMs !== null ? milliseconds(reading.onsetMs) : 'not read';
}

function onsetShare(record: PathRecord | undefined): number | null {
  const compared = record?.compared ?? null;
  if (compared?.reading.kind !== 'measured' || compared.reading.onsetMs === null || compared.change.onsetChangeMs === null) return null;
  const share = (compared.reading.onsetMs - compared.change.onsetChangeMs) / compared.reading.onsetMs;
  return share > 0 ? share : null;
}
