import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import { packLabels, type PlacedLabel } from '@/lib/chart/pack-labels';
import type { Shape, Tone } from '@/lib/chart/scene';
import { textWidth } from '@/lib/chart/text-width';
import { toneOf } from '@/lib/chart/tone-of';

interface Caption {
  readonly key: string;
  readonly role: string;
  readonly x: number;
  readonly text: string;
  readonly tone: Tone;
  readonly isBold: boolean;
}

/** What stands under the line, drawn downwards from 0, and the height it takes. */
export interface LabelsBelow {
  readonly shapes: readonly Shape[];
  readonly heightPx: number;
}

/**
 * Velocities under their segments, and under them the age of each response at its site.
 *
 * Method: full words in one row or two; else short words in as many rows as it takes. No text is cut or left out; ages
 * are left out only when the caller asks for none.
 *
 * @param view the nerve line; not modified
 * @param sizes its lengths
 * @param toX from mm to px
 * @returns shapes with y = 0 at the lower edge of the line and downwards positive, and the height in px
 * @source house rule
 * @accuracy tests/lib/chart/nerve-line-scene.test.ts (property test)
 * @example
 * labelsBelow(view, sizes, lineScale(view, sizes)).heightPx
 */
export function labelsBelow(view: NerveLineView, sizes: NerveLineSizes, toX: (positionMm: number) => number): LabelsBelow {
  const segments = (isShort: boolean) =>
    view.segments.map<Caption>((segment) => ({
      key: `velocity-${segment.key}`,
      role: 'velocity',
      x: (toX(segment.fromMm) + toX(segment.toMm)) / 2,
      text: isShort ? segment.shortText : segment.text,
      tone: toneOf(segment.priority, 'second'),
      isBold: segment.priority !== null,
    }));
  const ages = view.sites
    .filter((site) => sizes.hasAges && site.ageText !== null)
    .map<Caption>((site) => ({ key: `age-${site.siteId}`, role: 'age', x: toX(site.positionMm), text: site.ageText!, tone: 'second', isBold: false }));
  const velocities = row(segments(false), sizes, 2) ?? row(segments(true), sizes, Infinity)!;
  const under = row(ages, sizes, Infinity)!;
  const topPx = sizes.textPx * 1.3;
  const agesTopPx = topPx + velocities.rows * sizes.lineHeightPx;
  const heightPx = (ages.length === 0 ? agesTopPx : agesTopPx + under.rows * sizes.lineHeightPx) - sizes.textPx * 0.75;
  return { shapes: [...draw(velocities, topPx, sizes), ...draw(under, agesTopPx, sizes)], heightPx };
}

interface Row {
  readonly captions: readonly Caption[];
  readonly placed: readonly PlacedLabel[];
  readonly rows: number;
}

function row(captions: readonly Caption[], sizes: NerveLineSizes, mostRows: number): Row | null {
  const labels = captions.map((caption) => ({ centrePx: caption.x, widthPx: textWidth(caption.text, sizes.textPx, true) }));
  if (mostRows !== Infinity && labels.some((label) => label.widthPx > sizes.widthPx)) return null;
  const placed = packLabels(labels, sizes.widthPx, sizes.labelGapPx, mostRows);
  return placed === null ? null : { captions, placed, rows: Math.max(0, ...placed.map((place) => place.row + 1)) };
}

function draw(own: Row, topPx: number, sizes: NerveLineSizes): readonly Shape[] {
  return own.captions.map((caption, index) => ({
    kind: 'text',
    key: caption.key,
    role: caption.role,
    tone: caption.tone,
    x: own.placed[index]!.centrePx,
    y: topPx + own.placed[index]!.row * sizes.lineHeightPx,
    sizePx: sizes.textPx,
    widthPx: textWidth(caption.text, sizes.textPx, true),
    isMono: true,
    isBold: caption.isBold,
    text: caption.text,
  }));
}
