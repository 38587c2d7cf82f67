import type { SegmentJudgement } from '@/lib/alert/judgement';
import type { KeptRun } from '@/lib/case/case-state';

/**
 * Whether a run is one of the two that a segment was computed from.
 * @param segment a judged segment
 * @param kept the run
 * @returns true by site and time
 * @source house rule
 */
export function isEndOfSegment(segment: SegmentJudgement, { at, run }: KeptRun): boolean {
  return (segment.proximalSiteId === run.siteId && segment.proximalAt === at) || (segment.distalSiteId === run.siteId && segment.distalAt === at);
}
