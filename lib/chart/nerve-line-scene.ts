import { labelsBelow } from '@/lib/chart/labels-below';
import { lineScale } from '@/lib/chart/line-scale';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineSizes, type NerveLineOptions } from '@/lib/chart/nerve-line-sizes';
import { nodeShapes } from '@/lib/chart/node-shapes';
import type { Scene, Shape } from '@/lib/chart/scene';
import { segmentShapes } from '@/lib/chart/segment-shapes';
import { siteLabels } from '@/lib/chart/site-labels';

/**
 * The nerve line as shapes: the nerve to scale, its responses above, its velocities and their ages below.
 *
 * Method: the height follows from the labels, so that no text is cut, hidden or laid over another; the width is kept.
 * A name may be shortened, a measured value never is.
 *
 * @param view the nerve line; not modified
 * @param options width (200 to 8,000 px), type (6 to 400 px), and whether ages are shown
 * @returns a scene of the given width; height 0 for a nerve without sites
 * @throws {RangeError} when width or type lies outside its range
 * @source product rule (nerve line)
 * @accuracy tests/lib/chart/nerve-line-scene.test.ts (property test: no two texts overlap, none leaves the picture)
 * @example
 * nerveLineScene(view, { widthPx: 900, textPx: 15, hasAges: true }).widthPx // => 900
 */
export function nerveLineScene(view: NerveLineView, options: NerveLineOptions): Scene {
  const sizes = nerveLineSizes(options);
  if (view.sites.length === 0) return { widthPx: sizes.widthPx, heightPx: 0, description: view.description, shapes: [] };
  const toX = lineScale(view, sizes);
  const above = siteLabels(view, sizes, toX);
  const below = labelsBelow(view, sizes, toX);
  const middle = above.heightPx + sizes.thicknessPx * 0.75;
  const shapes = [
    ...above.shapes.map((shape) => moved(shape, above.heightPx)),
    ...view.segments.flatMap((segment) =>
      segmentShapes(segment, toX(segment.fromMm) + sizes.radiusPx, toX(segment.toMm) - sizes.radiusPx, sizes),
    ).map((shape) => moved(shape, middle)),
    ...nodeShapes(view, sizes, toX).map((shape) => moved(shape, middle)),
    ...below.shapes.map((shape) => moved(shape, middle + sizes.thicknessPx * 0.75)),
  ];
  const heightPx = Math.ceil(middle + sizes.thicknessPx * 0.75 + below.heightPx + sizes.textPx * 0.25);
  return { widthPx: sizes.widthPx, heightPx, description: view.description, shapes };
}

function moved(shape: Shape, byPx: number): Shape {
  return shape.kind === 'line' ? { ...shape, y1: shape.y1 + byPx, y2: shape.y2 + byPx } : { ...shape, y: shape.y + byPx };
}
