import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { centredDashes } from '@/lib/chart/centred-dashes';

/** Where the pattern is dash and where gap, as stretches from 0 to the length. */
function drawn(lengthPx: number, dashPx: number, gapPx: number): readonly { readonly from: number; readonly to: number }[] {
  const { offsetPx } = centredDashes(lengthPx, dashPx, gapPx);
  const starts = Array.from({ length: Math.ceil((lengthPx + offsetPx) / (dashPx + gapPx)) + 1 }, (_, index) => index * (dashPx + gapPx) - offsetPx);
  return starts.map((start) => ({ from: Math.max(0, start), to: Math.min(lengthPx, start + dashPx) })).filter(({ from, to }) => to - from > 1e-9);
}

describe('centredDashes', () => {
  it('begins with a whole dash where whole dashes fit', () => expect(centredDashes(70, 20, 5)).toEqual({ dashPx: 20, gapPx: 5, offsetPx: 0 }));
  it('stretches no gap where they do not: 74 px are cut alike at both ends', () => {
    expect(drawn(74, 20, 5)).toEqual([{ from: 2, to: 22 }, { from: 27, to: 47 }, { from: 52, to: 72 }]);
  });
  it('puts a gap in the middle rather than slivers at the ends', () => {
    // A dash in the middle of 84 px leaves 2 px of a dash at either end; a gap there leaves 14.5 px.
    expect(drawn(84, 20, 5).map(({ from, to }) => to - from)).toEqual([14.5, 20, 20, 14.5]);
  });
  it('fills a stretch shorter than a dash', () => expect(drawn(12, 20, 5)).toEqual([{ from: 0, to: 12 }]));

  it('keeps dash and gap at any length, cuts both ends alike, and leaves no end of less than half a dash', () => {
    const px = fc.double({ min: 2, max: 2000, noNaN: true });
    const dash = fc.double({ min: 2, max: 60, noNaN: true });
    fc.assert(
      fc.property(px, dash, fc.double({ min: 0.1, max: 1, noNaN: true }), (lengthPx, dashPx, gapShare) => {
        const gapPx = dashPx * gapShare;
        expect(centredDashes(lengthPx, dashPx, gapPx)).toMatchObject({ dashPx, gapPx });
        const dashes = drawn(lengthPx, dashPx, gapPx);
        const first = dashes[0]!;
        const last = dashes.at(-1)!;
        expect(first.from).toBeCloseTo(lengthPx - last.to, 6);
        expect(first.from).toBeLessThanOrEqual(gapPx + 1e-6);
        expect(first.to - first.from).toBeGreaterThanOrEqual(Math.min(dashPx / 2, lengthPx) - 1e-6);
        dashes.slice(1).forEach((one, index) => expect(one.from - dashes[index]!.to).toBeCloseTo(gapPx, 6));
      }),
    );
  });
});
