import { centredDashes } from '@/lib/chart/centred-dashes';
import type { NerveLineSegment } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import type { Shape, Tone } from '@/lib/chart/scene';
import { toneOf } from '@/lib/chart/tone-of';

/** Most that is drawn of a gain: a response above baseline stands out of its ghost, but never hides its neighbours. */
const mostShare = 1.25;
/** Least that is drawn of a velocity: below it dashes could not be told from a bar. @source house rule */
const leastVelocityShare = 0.15;

/**
 * One segment over its baseline ghost: thickness is its own share of amplitude, dash and gap its share of velocity.
 *
 * Method: an outline only while it is untested or its share cannot be told; a break with end bars where no response
 * was recorded; a solid bar where the velocity is not known. The ghost has the dashes of the baseline, so that kept
 * velocity lies on it dash by dash, whatever the length. Thickness above 1 is drawn up to 1.25.
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
  const line = (role: string, tone: Tone, widthPx: number, velocityShare: number | null = 1) =>
    dashed(bar(`${role}-${segment.key}`, role, tone, fromX, toX, widthPx), velocityShare, sizes);
  const ghost = line('ghost', 'ghost', sizes.thicknessPx);
  if (segment.isBroken) return [ghost, ...edged(broken(segment, fromX, toX, sizes))];
  if (segment.isUntested || segment.amplitudeShare === null) return edged([outline(segment, fromX, toX, sizes)]);
  const share = Math.min(segment.amplitudeShare, mostShare);
  const thickness = Math.max(sizes.leastThicknessPx, sizes.thicknessPx * share);
  const tone = toneOf(segment.priority, segment.isDim ? 'second' : 'ink');
  return [ghost, ...edged([line('segment', tone, thickness, segment.velocityShare)])];
}

type Line = Extract<Shape, { kind: 'line' }>;
type Rect = Extract<Shape, { kind: 'rect' }>;

/** Yellow cannot be seen on white: an edge of 1 px lies under it. */
function edged(shapes: readonly (Line | Rect)[]): readonly Shape[] {
  const edges = shapes.filter((shape) => shape.tone === 'medium').map((shape): Shape => {
    const edge = { key: `edge-${shape.key}`, role: 'edge', tone: 'medium-edge' } as const;
    return shape.kind === 'line' ? { ...shape, ...edge, widthPx: shape.widthPx + 2 } : { ...shape, ...edge, strokePx: (shape.strokePx ?? 0) + 2 };
  });
  return [...edges, ...shapes];
}

function bar(key: string, role: string, tone: Tone, x1: number, x2: number, widthPx: number): Line {
  return { kind: 'line', key, role, tone, x1, y1: 0, x2, y2: 0, widthPx, dashPx: null };
}

function dashed(line: Line, velocityShare: number | null, sizes: NerveLineSizes): Line {
  if (velocityShare === null) return line;
  const share = Math.max(velocityShare, leastVelocityShare);
  const { dashPx, gapPx, offsetPx } = centredDashes(line.x2 - line.x1, sizes.dashPx * share, sizes.gapPx * share);
  return { ...line, dashPx: [dashPx, gapPx], dashOffsetPx: offsetPx };
}

function outline(segment: NerveLineSegment, fromX: number, toX: number, sizes: NerveLineSizes): Rect {
  const stroke = Math.max(1, sizes.strokePx * 0.5);
  return {
    kind: 'rect',
    key: `segment-${segment.key}`,
    role: 'outline',
    tone: toneOf(segment.priority, 'second'),
    // Its ends lie under the nodes: only its length is seen.
    x: fromX - sizes.radiusPx,
    y: -sizes.thicknessPx / 2 + stroke / 2,
    widthPx: toX - fromX + 2 * sizes.radiusPx,
    heightPx: sizes.thicknessPx - stroke,
    strokePx: stroke,
    dashPx: [stroke * 2, stroke * 2.2],
  };
}

function broken(segment: NerveLineSegment, fromX: number, toX: number, sizes: NerveLineSizes): readonly Line[] {
  const tone = toneOf(segment.priority, 'ink');
  const middle = (fromX + toX) / 2;
  const halfGap = Math.min(sizes.thicknessPx * 0.9, (toX - fromX) / 4);
  const width = Math.max(1.5, sizes.strokePx);
  const end = (side: string, x: number): Line => ({ kind: 'line', key: `bar-${side}-${segment.key}`, role: 'break', tone, x1: x, y1: -sizes.thicknessPx * 0.75, x2: x, y2: sizes.thicknessPx * 0.75, widthPx: width, dashPx: null });
  return [
    bar(`stub-a-${segment.key}`, 'break', tone, fromX, middle - halfGap, width),
    bar(`stub-b-${segment.key}`, 'break', tone, middle + halfGap, toX, width),
    end('a', middle - halfGap),
    end('b', middle + halfGap),
  ];
}
