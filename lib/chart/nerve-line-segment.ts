import type { Nerve, Site } from '@/lib/alert/nerve-plan';
import type { Priority, SegmentJudgement } from '@/lib/alert/judgement';
import type { CaseState, PathRecord } from '@/lib/case/case-state';
import { pathIdOf, segmentKey } from '@/lib/case/keys';
import { findingPriority } from '@/lib/chart/finding-priority';
import { findingsOf } from '@/lib/chart/findings-of';
import type { NerveLineSegment } from '@/lib/chart/nerve-line';
import { isLastNotCompared } from '@/lib/chart/is-last-not-compared';
import { nerveLineSite } from '@/lib/chart/nerve-line-site';
import { siteShare } from '@/lib/chart/site-share';
import type { Standing } from '@/lib/chart/standing-text';
import { testedSince } from '@/lib/chart/tested-since';
import { velocityText } from '@/lib/chart/velocity-text';
import { brokenText } from '@/lib/chart/broken-text';
import { shortSegmentMm } from '@/lib/conduction/short-segment-mm';

/**
 * The nerve between two neighbouring sites: its own share of amplitude and of velocity kept.
 *
 * Method: the amplitude share is the proximal response over the distal one now, against the same ratio at baseline; so
 * a lesion is thin where it is and the nerve above keeps its thickness. It needs comparable runs at both ends, and it
 * cannot be told when there is no response from the distal end. The velocity share is
 * conduction time at baseline over the time now: the distance is the same, so its error cancels. The velocity takes a
 * priority only where the conduction time passed its limit.
 *
 * @param state the case; not modified
 * @param nerve the nerve of both sites
 * @param proximal the site nearer to the spine
 * @param distal its neighbour further out
 * @param channelId the channel the line is drawn from
 * @param nowMs time of the picture, Unix ms
 * @returns the segment; shares null where they cannot be told
 * @source product rule (nerve line)
 * @accuracy tests/lib/chart/nerve-line-view.test.ts, values computed by hand
 * @example
 * nerveLineSegment(state, nerve, aboveElbow, belowElbow, 'adm', nowMs).amplitudeShare // => 0.39
 */
export function nerveLineSegment(state: CaseState, nerve: Nerve, proximal: Site, distal: Site, channelId: string, nowMs: number): NerveLineSegment {
  const key = segmentKey(channelId, proximal.id, distal.id);
  const ends = [state.paths[pathIdOf(proximal.id, channelId)], state.paths[pathIdOf(distal.id, channelId)]] as const;
  const segment = state.segments[key];
  const isNotCompared = ends.some(isLastNotCompared);
  const isUntested = isNotCompared || !ends.every((end) => isTested(end, testedSince(state, nerve.id)));
  const amplitudeShare = ratio(siteShare(ends[0]), siteShare(ends[1]));
  const priority = segmentPriority(state, nerve.id, key, proximal, distal);
  const isDimAt = [proximal, distal].map((site) => nerveLineSite(state, nerve, site, channelId, nowMs).isDim);
  const isOlder = isDimAt.every(Boolean) || (segment !== undefined && [segment.proximalAt, segment.distalAt].every((at) => at < testedSince(state, nerve.id)));
  const isBroken = !isUntested && ends[0]?.compared?.reading.kind === 'absent' && amplitudeShare === 0;
  return {
    key,
    fromMm: proximal.positionMm,
    toMm: distal.positionMm,
    amplitudeShare,
    velocityShare: velocityShare(segment),
    ...(isBroken ? brokenText(ends[0]) : velocityText(segment, standingOf(segment, ends, isOlder))),
    priority,
    textPriority: isBroken ? priority : findingPriority(findingsOf(segment?.findings ?? [], 'time'), state.incidents[nerve.id]),
    isUntested,
    isNotCompared,
    isDim: isDimAt.some(Boolean),
    isBroken,
    isShort: distal.positionMm - proximal.positionMm < shortSegmentMm.value,
  };
}

function isTested(record: PathRecord | undefined, since: string): boolean {
  return record?.compared != null && record.compared.at >= since;
}

/** Before the first baseline there is nothing to compare with, and nothing is older. */
function standingOf(segment: SegmentJudgement | undefined, ends: readonly (PathRecord | undefined)[], isOlder: boolean): Standing {
  if (segment === undefined || ends.some((end) => end?.lastNotCompared === 'no-baseline')) return 'current';
  const runAts = [segment.proximalAt, segment.distalAt];
  const notCompared = [0, 1].filter((index) => isLastNotCompared(ends[index]));
  if (notCompared.some((index) => ends[index]?.lastAt === runAts[index])) return 'not-compared';
  return isOlder || notCompared.length > 0 ? 'older' : 'current';
}

function ratio(proximal: number | null, distal: number | null): number | null {
  return proximal === null || distal === null || distal === 0 ? null : proximal / distal;
}

function velocityShare(segment: SegmentJudgement | undefined): number | null {
  const timeMs = segment?.conductionTimeMs ?? null;
  const changeMs = segment?.timeChangeMs ?? null;
  if (timeMs === null || changeMs === null || timeMs <= 0 || changeMs >= timeMs) return null;
  return (timeMs - changeMs) / timeMs;
}

function locatedPriority(state: CaseState, nerveId: string, proximal: Site, distal: Site): Priority | null {
  const incident = state.incidents[nerveId];
  if (incident === undefined || incident.recoveredAt !== null || incident.location.kind !== 'segment') return null;
  const isHere = incident.location.proximalSiteId === proximal.id && incident.location.distalSiteId === distal.id;
  return isHere ? incident.level : null;
}

function segmentPriority(state: CaseState, nerveId: string, key: string, proximal: Site, distal: Site): Priority | null {
  return locatedPriority(state, nerveId, proximal, distal) ?? findingPriority(state.segments[key]?.findings ?? [], state.incidents[nerveId]);
}
