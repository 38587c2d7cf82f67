/** Dashes of one stretch: the pattern, and how far into it the stretch begins. */
export interface CentredDashes {
  readonly dashPx: number;
  readonly gapPx: number;
  readonly offsetPx: number;
}

/**
 * Lays a pattern of dashes into a stretch of any length without stretching it.
 *
 * Method: dash and gap keep their length, because their length is what the picture says; the pattern is cut alike at
 * both ends. Either a dash or a gap stands in the middle: a dash, unless it would leave less than half a dash at the ends.
 *
 * @param lengthPx length of the stretch in px, above 0
 * @param dashPx length of a dash in px, above 0
 * @param gapPx length of a gap in px, above 0
 * @returns dash and gap as given, and the offset in px, from 0 to less than dash + gap
 * @source house rule
 * @accuracy tests/lib/chart/centred-dashes.test.ts
 * @example
 * centredDashes(70, 20, 5) // => { dashPx: 20, gapPx: 5, offsetPx: 0 }
 */
export function centredDashes(lengthPx: number, dashPx: number, gapPx: number): CentredDashes {
  const pitchPx = dashPx + gapPx;
  const beyondDash = (lengthPx / 2) % pitchPx;
  const isSliver = beyondDash > pitchPx - dashPx / 2;
  const middlePx = isSliver ? dashPx + gapPx / 2 : dashPx / 2;
  const offsetPx = (((middlePx - lengthPx / 2) % pitchPx) + pitchPx) % pitchPx;
  return { dashPx, gapPx, offsetPx };
}
