/** Dashes of one stretch: the pattern, and how far from either end it begins. */
export interface FittedDashes {
  readonly dashPx: number;
  readonly gapPx: number;
  readonly insetPx: number;
}

/**
 * Fits whole dashes of a given length into a stretch; only the gaps give way.
 *
 * Method: the number of dashes is the nearest for which the gap is at least half the wanted one. The dash keeps its
 * length, because its length is what the picture says; one dash alone stands in the middle, and in a stretch shorter
 * than a dash it is cut.
 *
 * @param lengthPx length of the stretch in px, above 0
 * @param dashPx wanted length of a dash in px, above 0
 * @param gapPx wanted gap in px, above 0
 * @returns dash, gap and inset in px; (count × dash) + (count − 1) × gap + 2 × inset is the length
 * @source house rule
 * @accuracy tests/lib/chart/fit-dashes.test.ts
 * @example
 * fitDashes(70, 20, 5) // => { dashPx: 20, gapPx: 5, insetPx: 0 }
 */
export function fitDashes(lengthPx: number, dashPx: number, gapPx: number): FittedDashes {
  let count = Math.max(1, Math.round((lengthPx + gapPx) / (dashPx + gapPx)));
  while (count > 1 && (lengthPx - count * dashPx) / (count - 1) < gapPx / 2) count -= 1;
  if (count === 1) {
    const dash = Math.min(dashPx, lengthPx);
    return { dashPx: dash, gapPx: lengthPx, insetPx: (lengthPx - dash) / 2 };
  }
  return { dashPx, gapPx: (lengthPx - count * dashPx) / (count - 1), insetPx: 0 };
}
