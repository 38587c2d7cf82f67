import { fitDashes } from '@/lib/chart/fit-dashes';
import type { NerveLineSegment } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import type { Shape } from '@/lib/chart/scene';
import { toneOf } from '@/lib/chart/tone-of';

/** Most that is drawn of a gain: a response above baseline stands out of its ghost, but never hides its neighbours. */
const mostShare = 1.25;

/**
 * One segment over its baseline ghost: thickness is its own share of amplitude, dash length its share of velocity.
 *
 * Method: an outline only while it is untested or its share cannot be told; a break with end bars where no response
 * was recorded; a solid bar where the velocity is not known. Shares above 1 are drawn up to 1.25.
 *
 * @param segment the segment; not modified
 * @param fromX left end in px, beside the node
 * @param toX right end in px
 * @param sizes lengths of the line
 * @returns shapes around y = 0, the ghost first; none where there is no room between the nodes
 * @source product rule (nerve line)
 * @accuracy tests/lib/chart/nerve-line-scene.test.ts
 * @example
 * segmentShapes(segment, 100, 300, sizes).length // => 2
 */
export function segmentShapes(segment: NerveLineSegment, fromX: number, toX: number, sizes: NerveLineSizes): readonly Shape[] {
  if (toX - fromX < 1) return [];
  const ghost = bar(`ghost-${segment.key}`, 'ghost', 'ghost', fromX, toX, sizes.thicknessPx, null);
  if (segment.isBroken) return [ghost, ...broken(segment, fromX, toX, sizes)];
  if (segment.isUntested || segment.amplitudeShare === null) return [outline(segment, fromX, toX, sizes)];
  const share = Math.min(segment.amplitudeShare, mostShare);
  const thickness = Math.max(sizes.leastThicknessPx, sizes.thicknessPx * share);
  const tone = toneOf(segment.priority, segment.isDim ? 'second' : 'ink');
  if (segment.velocityShare === null) return [ghost, bar(`segment-${segment.key}`, 'segment', tone, fromX, toX, thickness, null)];
  const wanted = sizes.dashPx * Math.min(Math.max(segment.velocityShare, 0.15), mostShare);
  const fitted = fitDashes(toX - fromX, wanted, sizes.gapPx);
  const from = fromX + fitted.insetPx;
  const to = toX - fitted.insetPx;
  const dashes = bar(`segment-${segment.key}`, 'segment', tone, from, to, thickness, [fitted.dashPx, fitted.gapPx]);
  return tone === 'medium' ? [ghost, bar(`edge-${segment.key}`, 'edge', 'medium-edge', from, to, thickness + 2, null), dashes] : [ghost, dashes];
}

function bar(key: string, role: string, tone: Extract<Shape, { kind: 'line' }>['tone'], x1: number, x2: number, widthPx: number, dashPx: readonly number[] | null): Shape {
  return { kind: 'line', key, role, tone, x1, y1: 0, x2, y2: 0, widthPx, dashPx };
}

function outline(segment: NerveLineSegment, fromX: number, toX: number, sizes: NerveLineSizes): Shape {
  const stroke = Math.max(1, sizes.strokePx * 0.5);
  return {
    kind: 'rect',
    key: `segment-${segment.key}`,
    role: 'outline',
    tone: toneOf(segment.priority, 'second'),
    x: fromX,
    y: -sizes.thicknessPx / 2 + stroke / 2,
    widthPx: toX - fromX,
    heightPx: sizes.thicknessPx - stroke,
    strokePx: stroke,
    dashPx: [stroke * 2, stroke * 2.2],
  };
}

function broken(segment: NerveLineSegment, fromX: number, toX: number, sizes: NerveLineSizes): readonly Shape[] {
  const tone = toneOf(segment.priority, 'ink');
  const middle = (fromX + toX) / 2;
  const halfGap = Math.min(sizes.thicknessPx * 0.9, (toX - fromX) / 4);
  const width = Math.max(1.5, sizes.strokePx);
  const end = (side: string, x: number): Shape => ({ kind: 'line', key: `bar-${side}-${segment.key}`, role: 'break', tone, x1: x, y1: -sizes.thicknessPx * 0.75, x2: x, y2: sizes.thicknessPx * 0.75, widthPx: width, dashPx: null });
  return [
    bar(`stub-a-${segment.key}`, 'break', tone, fromX, middle - halfGap, width, null),
    bar(`stub-b-${segment.key}`, 'break', tone, middle + halfGap, toX, width, null),
    end('a', middle - halfGap),
    end('b', middle + halfGap),
  ];
}
