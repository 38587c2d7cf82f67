import type { NerveLineSegment, NerveLineView } from '@/lib/chart/nerve-line';
import { standingText } from '@/lib/chart/standing-text';

/**
 * The nerve line while nothing is monitored: the last values stay, in the past tense, as outlines and dim.
 * @param view the nerve line; not modified
 * @returns the same nerve with every site dim and every segment an outline
 * @source product rule: only stable and improved look calm
 * @accuracy tests/lib/chart/not-monitored-view.test.ts
 * @example
 * notMonitoredView(view).segments.every((segment) => segment.isUntested) // => true
 */
export function notMonitoredView(view: NerveLineView): NerveLineView {
  return {
    ...view,
    sites: view.sites.map((site) => ({ ...site, isDim: true })),
    segments: view.segments.map((segment) => ({ ...segment, ...pastText(segment), isDim: true, isUntested: true })),
  };
}

/** Only a measured value that was current was; a reason still holds. */
function pastText(segment: NerveLineSegment) {
  const isCurrent = /^\d.*(?<!not compared)$/.test(segment.text);
  return standingText({ text: segment.text, shortText: segment.shortText }, isCurrent ? 'older' : 'current');
}
