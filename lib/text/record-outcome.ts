import type { CaseCourse } from '@/lib/case/course/case-course';
import type { NerveEnds, PathEnds } from '@/lib/case/course/nerve-ends';
import type { SegmentEnds } from '@/lib/case/course/segment-ends';
import type { CasePlan } from '@/lib/case/plan';
import { metresPerSecond, percent } from '@/lib/text/format';
import { nerveTitle } from '@/lib/text/nerve-title';
import { notComparedWords } from '@/lib/text/reason-words';
import { channelName } from '@/lib/text/run-sentence';
import { siteName, siteNames } from '@/lib/text/site-name';

/**
 * Closing against opening in sentences, for the paths that calm rests on.
 * @param course the course of the case
 * @returns sentences with full stops, one for each nerve and channel, then velocities; no outlook
 * @source product rule: one number for one fact, % of baseline
 * @accuracy tests/lib/text/record-sentences.test.ts
 * @example
 * recordOutcome(course)[0] // => 'Ulnar to ADM, last run against opening baseline: axilla 93 %, …'
 */
export function recordOutcome(course: CaseCourse): readonly string[] {
  const { plan } = course.final;
  const amplitudes = course.nerves.flatMap((nerve) => amplitudeSentences(nerve, plan));
  const required = new Set(plan.paths.filter((path) => path.isRequired).map((path) => path.channelId));
  const velocities = course.segments.filter((segment) => required.has(segment.channelId)).flatMap((segment) => velocityWords(segment, plan));
  return [...amplitudes, ...(velocities.length === 0 ? [] : [`Velocity, opening and last: ${velocities.join('; ')}.`])];
}

function amplitudeSentences({ nerve, paths }: NerveEnds, plan: CasePlan): readonly string[] {
  const shown = paths.filter((path) => path.isRequired || nerve.role === 'control');
  const channelIds = [...new Set(shown.map((path) => path.channelId))];
  return channelIds.map((channelId) => {
    const sites = shown.filter((path) => path.channelId === channelId).map((path) => `${siteName(plan, path.siteId)} ${endWords(path)}`);
    return `${nerveTitle(plan, nerve.id)} to ${channelName(plan, channelId)}, last run against opening baseline: ${sites.join(', ')}.`;
  });
}

function endWords(path: PathEnds): string {
  if (path.closing === null) return 'not tested';
  if (path.opening === null) return 'no baseline';
  if (path.percentOfOpening === null) return path.closing.notCompared === null ? 'not tested after its baseline' : `not compared (${notComparedWords[path.closing.notCompared]})`;
  return `${path.closing.reading.kind === 'absent' ? 'no response' : percent(path.percentOfOpening)}`;
}

function velocityWords({ proximalSiteId, distalSiteId, opening, closing }: SegmentEnds, plan: CasePlan): readonly string[] {
  const before = opening?.kind === 'velocity' ? metresPerSecond(opening.velocityMps) : null;
  const after = closing?.velocity.kind === 'velocity' ? metresPerSecond(closing.velocity.velocityMps) : null;
  if (before === null && after === null) return [];
  return [`${siteNames(plan, proximalSiteId, distalSiteId)} ${before ?? 'not computed'}, then ${after ?? 'not computed'}`];
}
