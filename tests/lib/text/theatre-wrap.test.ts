import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { theatreWrap } from '@/lib/text/theatre-wrap';

/** Where a line may end. */
const pieces = (text: string) => theatreWrap(text).split(' ').map((piece) => piece.replaceAll('\u00a0', '_'));

describe('theatreWrap', () => {
  it.each([
    ['Between above and below elbow. Last good 11:22, first seen 11:24, after nerve lifted.', ['Between', 'above', 'and', 'below', 'elbow.', 'Last_good_11:22,', 'first_seen_11:24,', 'after', 'nerve', 'lifted.']],
    ['Ulnar not compared since 10:40', ['Ulnar', 'not', 'compared_since_10:40']],
    ['Past its limit at 10:41.', ['Past', 'its', 'limit_at_10:41.']],
    ['4 of 4 sites tested since nerve lifted, 10:41. Lowest 97 % of baseline, at 10:42.', ['4_of_4_sites', 'tested', 'since', 'nerve', 'lifted,_10:41.', 'Lowest_97_%', 'of', 'baseline,', 'at_10:42.']],
    ['Train-of-four 4 of 4 at 10:37, before the change', ['Train-of-four_4_of_4', 'at_10:37,', 'before', 'the', 'change']],
    ['Ulnar slower, 31 m/s', ['Ulnar', 'slower,_31_m/s']],
    ['Inside the limit of −50 %, at 10:40.', ['Inside', 'the', 'limit', 'of_−50_%,', 'at_10:40.']],
    ['Tourniquet up 1 h 12 min', ['Tourniquet', 'up_1_h_12_min']],
    ['Only 2 minutes', ['Only_2', 'minutes']],
    ['Not tested since nerve lifted', ['Not', 'tested', 'since', 'nerve', 'lifted']],
  ])('keeps the facts of "%s" whole', (text, whole) => expect(pieces(text)).toEqual(whole));

  it('changes nothing but spaces, and nothing twice', () => {
    const words = fc.array(fc.constantFrom('Last', 'good', '10:41', '4', 'of', 'sites', '97', '%', 'ms', 'after', 'Between'), { maxLength: 12 }).map((list) => list.join(' '));
    fc.assert(
      fc.property(words, (text) => {
        expect(theatreWrap(text).replaceAll('\u00a0', ' ')).toBe(text);
        expect(theatreWrap(theatreWrap(text))).toBe(theatreWrap(text));
      }),
    );
  });
});
