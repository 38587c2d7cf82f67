import type { Priority } from '@/lib/alert/judgement';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import type { Shape, Tone } from '@/lib/chart/scene';
import { toneOf } from '@/lib/chart/tone-of';

/** How much of a ring is filled, so that priority is seen without its colour. @source house rule */
const filledShare: Record<Priority, number> = { alert: 0.66, notice: 0.36, watch: 0 };

/**
 * The sites on the line: a ring each, filled in the middle for a notice and nearly whole for an alert.
 *
 * Method: tone and filling follow the priority of the site, a dim site is drawn in the second ink. The end of the line,
 * where the response is recorded, is a dim ring.
 *
 * @param view the nerve line; not modified
 * @param sizes its lengths
 * @param toX from mm to px
 * @returns circles around y = 0
 * @source product rule: priority is never colour alone
 * @accuracy tests/lib/chart/node-shapes.test.ts
 * @example
 * nodeShapes(view, sizes, lineScale(view, sizes))
 */
export function nodeShapes(view: NerveLineView, sizes: NerveLineSizes, toX: (positionMm: number) => number): readonly Shape[] {
  const ring = (key: string, x: number, tone: Tone, priority: Priority | null): readonly Shape[] => {
    const node = (name: string, shapeTone: Tone, radiusPx: number, strokePx: number | null): Shape =>
      ({ kind: 'node', key: `${name}-${key}`, role: name, tone: shapeTone, x, y: 0, radiusPx, strokePx });
    const edge = tone === 'medium' ? [node('edge', 'medium-edge', sizes.radiusPx, sizes.strokePx + 3)] : [];
    const share = priority === null ? 0 : filledShare[priority];
    const filling = share === 0 ? [] : [node('filling', tone, sizes.radiusPx * share, null)];
    return [...edge, node('node', tone, sizes.radiusPx, sizes.strokePx), ...filling];
  };
  const sites = view.sites.flatMap((site) => ring(site.siteId, toX(site.positionMm), toneOf(site.priority, site.isDim ? 'second' : 'ink'), site.priority));
  return view.end === null ? sites : [...sites, ...ring('end', toX(view.end.positionMm), 'second', null)];
}
