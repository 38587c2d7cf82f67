import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { fitDashes } from '@/lib/chart/fit-dashes';

describe('fitDashes', () => {
  it('fills a stretch that holds whole dashes exactly', () => expect(fitDashes(70, 20, 5)).toEqual({ dashPx: 20, gapPx: 5, insetPx: 0 }));
  it('stretches the gaps, never the dashes', () => expect(fitDashes(74, 20, 5)).toEqual({ dashPx: 20, gapPx: 7, insetPx: 0 }));
  it('puts a single dash in the middle', () => expect(fitDashes(30, 20, 5)).toEqual({ dashPx: 20, gapPx: 30, insetPx: 5 }));
  it('cuts a dash that is longer than the stretch', () => expect(fitDashes(12, 20, 5)).toMatchObject({ dashPx: 12, insetPx: 0 }));

  it('keeps the length of the dash and never lays dashes over one another', () => {
    const px = fc.double({ min: 1, max: 2000, noNaN: true });
    fc.assert(
      fc.property(px, fc.double({ min: 1, max: 100, noNaN: true }), fc.double({ min: 0.5, max: 20, noNaN: true }), (lengthPx, dashPx, gapPx) => {
        const fitted = fitDashes(lengthPx, dashPx, gapPx);
        expect(fitted.dashPx).toBeCloseTo(Math.min(dashPx, lengthPx), 9);
        expect(fitted.gapPx).toBeGreaterThanOrEqual(Math.min(gapPx / 2, lengthPx) - 1e-9);
        const count = fitted.insetPx > 0 || fitted.gapPx === lengthPx ? 1 : Math.round((lengthPx + fitted.gapPx) / (fitted.dashPx + fitted.gapPx));
        expect(count * fitted.dashPx + (count - 1) * fitted.gapPx + 2 * fitted.insetPx).toBeCloseTo(lengthPx, 6);
      }),
    );
  });
});
