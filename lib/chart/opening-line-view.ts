import type { Baseline } from '@/lib/case/case-state';
import type { CaseCourse } from '@/lib/case/course/case-course';
import { pathIdOf } from '@/lib/case/keys';
import type { NerveLineSegment, NerveLineSite, NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineDescription } from '@/lib/chart/nerve-line-description';
import { nerveLineView } from '@/lib/chart/nerve-line-view';
import { shownChannel } from '@/lib/chart/shown-channel';
import { metresPerSecond, milliseconds } from '@/lib/text/format';
import { amplitudeWords } from '@/lib/text/reading-words';

/**
 * A nerve at its opening baseline: what every later line is held against, so it is drawn in full.
 *
 * Method: sites and distances of the time of the first acceptance; each site with the mean amplitude of its opening
 * baseline, each segment with the velocity of those means. A site without a baseline is dim, its segments are outlines.
 *
 * @param course the course of the case; not modified
 * @param nerveId a nerve of the plan
 * @returns the view; null before a baseline was accepted
 * @source product rule (nerve line): the baseline is what it is compared with
 * @accuracy tests/lib/chart/opening-line-view.test.ts, values by hand
 * @example
 * openingLineView(course, 'ulnar')?.sites[0]?.text // => '8.6 mV'
 */
export function openingLineView(course: CaseCourse, nerveId: string): NerveLineView | null {
  const { opened } = course;
  if (opened === null) return null;
  const channel = shownChannel(opened, nerveId);
  const base = nerveLineView(opened, nerveId, 0);
  if (channel === null) return base;
  const paths = course.nerves.find((one) => one.nerve.id === nerveId)?.paths ?? [];
  const baselineAt = (siteId: string) => paths.find((path) => path.pathId === pathIdOf(siteId, channel.id))?.opening ?? null;
  const sites = base.sites.map((site): NerveLineSite => {
    const amplitudeUv = baselineAt(site.siteId)?.amplitudeUv ?? null;
    const text = amplitudeUv === null ? 'no baseline' : amplitudeWords(amplitudeUv, channel.kind);
    return { ...site, text, ageText: null, priority: null, textPriority: null, isDim: amplitudeUv === null };
  });
  const segments = base.segments.map((segment, index) => {
    const [proximal, distal] = [sites[index], sites[index + 1]];
    const ends = [proximal, distal].filter((site) => site !== undefined).map((site) => baselineAt(site.siteId));
    return openingSegment(segment, ends, distal === undefined ? onsetText(ends[0] ?? null) : velocityText(course, channel.id, proximal?.siteId, distal.siteId));
  });
  const view = { ...base, sites, segments };
  return { ...view, description: nerveLineDescription(view) };
}

function openingSegment(segment: NerveLineSegment, ends: readonly (Baseline | null)[], text: string): NerveLineSegment {
  const isUntested = ends.some((end) => end === null || end.amplitudeUv === null);
  const share = isUntested ? null : 1;
  const plain = { priority: null, textPriority: null, isNotCompared: false, isDim: false, isBroken: false };
  return { ...segment, ...plain, amplitudeShare: share, velocityShare: share, text, shortText: text, isUntested };
}

function onsetText(baseline: Baseline | null): string {
  return baseline?.onsetMs == null ? 'no onset' : milliseconds(baseline.onsetMs);
}

function velocityText(course: CaseCourse, channelId: string, proximalSiteId: string | undefined, distalSiteId: string): string {
  const ends = course.segments.find((one) => one.channelId === channelId && one.proximalSiteId === proximalSiteId && one.distalSiteId === distalSiteId);
  if (ends?.opening?.kind !== 'velocity') return 'no velocity';
  return `${metresPerSecond(ends.opening.velocityMps)}${ends.opening.isShort ? ', short' : ''}`;
}
