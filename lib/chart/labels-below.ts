import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';
import { packLabels, type PlacedLabel } from '@/lib/chart/pack-labels';
import type { Shape, Tone } from '@/lib/chart/scene';
import { textWidth } from '@/lib/chart/text-width';
import { toneOf } from '@/lib/chart/tone-of';

/** Least distance between two captions in type sizes: clearly more than a space inside one. @source house rule */
const captionGap = 1.2;

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
    view.segments.filter((segment) => segment.text !== '').map<Caption>((segment) => ({
      key: `velocity-${segment.key}`,
      role: 'velocity',
      x: (toX(segment.fromMm) + toX(segment.toMm)) / 2,
      text: isShort ? segment.shortText : segment.text,
      tone: toneOf(segment.textPriority, 'second'),
      isBold: segment.textPriority !== null,
    }));
  const ages = view.sites.flatMap<Caption>((site) =>
    sizes.hasAges && site.ageText !== null
      ? [{ key: `age-${site.siteId}`, role: 'age', x: toX(site.positionMm), text: `${site.ageText} ago`, tone: 'second', isBold: false }]
      : [],
  );
  const full = captionRows(segments(false), sizes, 2);
  const velocities = full.isFitting ? full : captionRows(segments(true), sizes, Infinity);
  return below(velocities, captionRows(ages, sizes, Infinity), sizes);
}

function below(velocities: CaptionRows, ages: CaptionRows, sizes: NerveLineSizes): LabelsBelow {
  const topPx = sizes.textPx * 1.3;
  const agesTopPx = topPx + velocities.rows * sizes.lineHeightPx;
  const heightPx = agesTopPx + ages.rows * sizes.lineHeightPx - sizes.textPx * 0.75;
  return { shapes: [...draw(velocities, topPx, sizes), ...draw(ages, agesTopPx, sizes)], heightPx };
}

interface CaptionRows {
  readonly captions: readonly (Caption & { readonly place: PlacedLabel })[];
  readonly rows: number;
  readonly isFitting: boolean;
}

function captionRows(captions: readonly Caption[], sizes: NerveLineSizes, mostRows: number): CaptionRows {
  const labels = captions.map((caption) => ({ centrePx: caption.x, widthPx: textWidth(caption.text, sizes.textPx, true) }));
  const placed = packLabels(labels, sizes.widthPx, sizes.textPx * captionGap, mostRows);
  return {
    captions: captions.map((caption, index) => ({ ...caption, place: placed?.[index] ?? { row: index, centrePx: caption.x } })),
    rows: Math.max(0, ...(placed ?? []).map((place) => place.row + 1)),
    isFitting: placed !== null && labels.every((label) => label.widthPx <= sizes.widthPx),
  };
}

function draw(own: CaptionRows, topPx: number, sizes: NerveLineSizes): readonly Shape[] {
  return own.captions.map((caption) => ({
    kind: 'text',
    key: caption.key,
    role: caption.role,
    tone: caption.tone,
    x: caption.place.centrePx,
    y: topPx + caption.place.row * sizes.lineHeightPx,
    sizePx: sizes.textPx,
    widthPx: textWidth(caption.text, sizes.textPx, true),
    isMono: true,
    isBold: caption.isBold,
    text: caption.text,
  }));
}
