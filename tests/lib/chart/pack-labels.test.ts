import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { packLabels } from '@/lib/chart/pack-labels';

const label = (centrePx: number, widthPx: number) => ({ centrePx, widthPx });

describe('packLabels', () => {
  it('leaves labels with room where they want to be', () => {
    expect(packLabels([label(50, 40), label(150, 40)], 200, 5, 1)).toEqual([{ row: 0, centrePx: 50 }, { row: 0, centrePx: 150 }]);
  });
  it('pushes a label a little aside', () => {
    expect(packLabels([label(50, 40), label(90, 40)], 200, 5, 1)).toEqual([{ row: 0, centrePx: 50 }, { row: 0, centrePx: 95 }]);
  });
  it('keeps the last label inside the picture', () => {
    expect(packLabels([label(195, 40)], 200, 5, 1)).toEqual([{ row: 0, centrePx: 180 }]);
  });
  it('takes a second row where one has no room', () => {
    expect(packLabels([label(100, 60), label(110, 60)], 300, 5, Infinity)?.map((place) => place.row)).toEqual([0, 1]);
  });
  it('leaves the first row only where there is no room in it', () => {
    const crowded = [label(60, 100), label(110, 100), label(250, 40), label(330, 40)];
    expect(packLabels(crowded, 400, 5, Infinity)?.map((place) => place.row)).toEqual([0, 1, 0, 0]);
  });
  it('says so when the rows do not do', () => expect(packLabels([label(100, 60), label(110, 60)], 300, 5, 1)).toBeNull());
  it('has nothing to do without labels', () => expect(packLabels([], 300, 5, 1)).toEqual([]));

  it('never lets two labels of a row touch, nor a label leave the picture', () => {
    const roomPx = 400;
    const labels = fc.array(fc.record({ centrePx: fc.double({ min: 0, max: roomPx, noNaN: true }), widthPx: fc.double({ min: 1, max: roomPx, noNaN: true }) }), { maxLength: 12 });
    fc.assert(
      fc.property(labels, (unordered) => {
        const ordered = unordered.toSorted((left, right) => left.centrePx - right.centrePx);
        const placed = packLabels(ordered, roomPx, 4, Infinity);
        if (placed === null) throw new Error('Expected a place for each label');
        placed.forEach((place, index) => {
          const half = ordered[index]!.widthPx / 2;
          expect(place.centrePx - half).toBeGreaterThanOrEqual(-0.02);
          expect(place.centrePx + half).toBeLessThanOrEqual(roomPx + 0.02);
          placed.slice(index + 1).forEach((other, later) => {
            if (other.row !== place.row) return;
            expect(other.centrePx - place.centrePx).toBeGreaterThanOrEqual(half + ordered[index + 1 + later]!.widthPx / 2 + 4 - 0.02);
          });
        });
      }),
    );
  });
});
