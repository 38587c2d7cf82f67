import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { NerveLineSizes } from '@/lib/chart/nerve-line-sizes';

/**
 * Where a position along the nerve lies in the picture: to scale, between the two ends.
 * @param view the nerve line; not modified
 * @param sizes its lengths
 * @returns a function from mm to px; all of a nerve without length lies in the middle
 * @source house rule
 * @accuracy exact
 * @example
 * lineScale(view, sizes)(250)
 */
export function lineScale(view: NerveLineView, sizes: NerveLineSizes): (positionMm: number) => number {
  const positions = [...view.sites.map((site) => site.positionMm), ...(view.end === null ? [] : [view.end.positionMm])];
  const least = Math.min(...positions);
  const length = Math.max(...positions) - least;
  // The first and last names stand centred on their sites where there is room for that.
  const padPx = Math.min(sizes.textPx * 2.6, sizes.widthPx * 0.08);
  const roomPx = sizes.widthPx - 2 * padPx;
  return (positionMm) => (length === 0 ? sizes.widthPx / 2 : padPx + ((positionMm - least) / length) * roomPx);
}
