import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { shortenText } from '@/lib/chart/shorten-text';
import { textWidth } from '@/lib/chart/text-width';

describe('shortenText', () => {
  it('leaves a name that fits', () => expect(shortenText('Wrist', 10, 100)).toBe('Wrist'));
  it('leaves no space before the ellipsis', () => expect(shortenText('Above elbow', 10, 46)).toBe('Above…'));
  it('keeps one character where nothing fits', () => expect(shortenText('Axilla', 10, 1)).toBe('A…'));

  it('fits, or is one character and an ellipsis, for any name', () => {
    fc.assert(
      fc.property(fc.string({ minLength: 1, maxLength: 40 }), fc.integer({ min: 5, max: 300 }), (name, roomPx) => {
        const short = shortenText(name, 12, roomPx);
        return textWidth(short, 12, false) <= roomPx || [...short].length <= 2;
      }),
    );
  });
});
