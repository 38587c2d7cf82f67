import { describe, expect, it } from 'vitest';

import { theatreTypeScale } from '@/lib/chart/theatre-type-scale';

const wall = { distanceM: 3, diagonalInch: 55, widthPx: 1920, heightPx: 1080 };

/** Height of a capital in mm that a size in px gives on a wall: pixel pitch by hand, capital 0.668 em. */
function capitalMm(sizePx: number, pitchMm: number): number {
  return sizePx * 0.668 * pitchMm;
}

describe('theatreTypeScale', () => {
  // 55 inch: 1397 mm over 2202.9 px is 0.634 mm a pixel. 22 and 30 arcmin at 3 m are 19.2 and 26.2 mm (tables of capital height).
  it('makes capitals of 19.2 and 26.2 mm on a 55-inch wall at 3 m', () => {
    const scale = theatreTypeScale(wall);
    expect(capitalMm(scale.neededPx, 0.6342)).toBeCloseTo(19.2, 1);
    expect(capitalMm(scale.statePx, 0.6342)).toBeCloseTo(26.2, 1);
  });

  it('makes capitals of 32.0 and 43.6 mm at 5 m', () => {
    const scale = theatreTypeScale({ ...wall, distanceM: 5 });
    // Sizes are rounded up to a tenth of a px, that is by less than 0.05 mm here; the table itself by 0.05 mm.
    expect(Math.abs(capitalMm(scale.neededPx, 0.6342) - 32)).toBeLessThan(0.1);
    expect(Math.abs(capitalMm(scale.statePx, 0.6342) - 43.6)).toBeLessThan(0.1);
  });

  it('doubles in px when the same wall has twice the pixels each way', () => {
    const once = theatreTypeScale(wall).neededPx;
    expect(theatreTypeScale({ ...wall, widthPx: 3840, heightPx: 2160 }).neededPx).toBeCloseTo(once * 2, 0);
  });

  it('is the same lying or standing', () => {
    expect(theatreTypeScale({ ...wall, widthPx: 1080, heightPx: 1920 })).toEqual(theatreTypeScale(wall));
  });

  it.each([{ distanceM: 0.4 }, { distanceM: 10.1 }, { diagonalInch: 4 }, { diagonalInch: Number.NaN }, { widthPx: 99 }, { heightPx: 20_001 }])('refuses %o', (wrong) => {
    expect(() => theatreTypeScale({ ...wall, ...wrong })).toThrow(RangeError);
  });
  it.each([{ distanceM: 0.5 }, { distanceM: 10 }, { diagonalInch: 5 }, { diagonalInch: 120 }])('takes %o', (edge) => {
    expect(theatreTypeScale({ ...wall, ...edge }).neededPx).toBeGreaterThan(0);
  });
});
