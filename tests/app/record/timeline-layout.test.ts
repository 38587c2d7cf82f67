import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { timelineLayout } from '@/app/_features/record/timeline-layout';

const remPx = 16;
/** Least distance between words, px: 5.6 rem lying, 2.2 rem upright. */
const distances = { lying: 5.6 * remPx, upright: 2.2 * remPx } as const;

describe('timelineLayout', () => {
  it('timelineLayout puts ticks at their true times and words beside them where there is room', () => {
    // 0, 60 and 240 s over 1,024 px with 12 px at each end: 12, 262 and 1,012.
    const { isUpright, places } = timelineLayout([0, 60_000, 240_000], 1024, remPx);
    expect(isUpright).toBe(false);
    expect(places.map((place) => place.tickPx)).toEqual([12, 262, 1012]);
    // Words of the middle stand under it; those at the ends are moved half a column inside: 44.8 px.
    expect(places.map((place) => place.labelPx)).toEqual([44.8, 262, 1024 - 44.8].map((px) => expect.closeTo(px, 6)));
  });

  it('timelineLayout stands upright where the words do not fit beside one another', () => {
    expect(timelineLayout([0, 1, 2, 3, 4], 390, remPx)).toMatchObject({ isUpright: true, lengthPx: 5 * distances.upright });
    expect(timelineLayout([0], 390, remPx).isUpright).toBe(false);
  });

  it('timelineLayout never lets words touch, leaves nothing outside, and keeps the order', () => {
    const times = fc.uniqueArray(fc.integer({ min: 0, max: 7_200_000 }), { minLength: 1, maxLength: 14 }).map((ms) => ms.sort((first, second) => first - second));
    fc.assert(
      fc.property(times, fc.integer({ min: 280, max: 3800 }), (atMs, widthPx) => {
        const { isUpright, lengthPx, places } = timelineLayout(atMs, widthPx, remPx);
        const least = isUpright ? distances.upright : distances.lying;
        for (const [index, place] of places.entries()) {
          expect(place.labelPx).toBeGreaterThanOrEqual(least / 2 - 1e-6);
          expect(place.labelPx).toBeLessThanOrEqual(lengthPx - least / 2 + 1e-6);
          if (index === 0) continue;
          expect(place.labelPx - places[index - 1]!.labelPx).toBeGreaterThanOrEqual(least - 1e-6);
          expect(place.tickPx).toBeGreaterThan(places[index - 1]!.tickPx);
        }
      }),
    );
  });
});
