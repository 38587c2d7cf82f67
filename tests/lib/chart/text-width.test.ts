import { describe, expect, it } from 'vitest';

import { textWidth } from '@/lib/chart/text-width';

/** Advance widths in 1/1000 em, the wider of weights 400 and 700, read from the font files of the packages. */
const sansAdvances: Readonly<Record<string, number>> = {
  ' ': 312, i: 300, l: 318, j: 259, '.': 272, ',': 271, f: 365, r: 376, t: 376, '-': 373, I: 424, a: 552, c: 510, e: 563, n: 571, o: 576,
  s: 508, u: 567, v: 530, z: 505, m: 882, w: 740, A: 678, C: 658, E: 597, M: 858, O: 746, Q: 756, W: 886, '%': 969, '0': 659, '4': 624, '8': 624, '…': 780,
};

describe('textWidth', () => {
  it.each(Object.entries(sansAdvances))('keeps at least the room that "%s" takes', (character, advance) => {
    expect(textWidth(character, 1000, false)).toBeGreaterThanOrEqual(advance);
  });

  it.each(['0', '%', ' ', 'W', '−', 'm'])('keeps 632 units or more for the monospaced "%s"', (character) => {
    expect(textWidth(character, 1000, true)).toBeGreaterThanOrEqual(632);
  });

  it('does not keep more than a third too much for a name', () => {
    // Above elbow, bold: 678+596+576+530+563 + 312 + 563+318+596+576+740 units.
    expect(textWidth('Above elbow', 1000, false)).toBeLessThan(6048 * 1.33);
  });

  it('keeps more than an em for a character it does not know', () => expect(textWidth('漢', 10, true)).toBeGreaterThan(10));
  it('is nothing for an empty text and grows with the size', () => {
    expect(textWidth('', 20, false)).toBe(0);
    expect(textWidth('ab', 20, false)).toBeCloseTo(2 * textWidth('ab', 10, false), 6);
  });
});
