import { describe, expect, it } from 'vitest';

import { fitHeadline, headlineLength } from '@/lib/text/fit-headline';

describe('fitHeadline', () => {
  const exact = 'x'.repeat(headlineLength);
  it.each([
    ['the fullest that fits', [exact, 'short'], exact],
    ['the next when one is a character too long', [`${exact}x`, 'short'], 'short'],
    ['the shortest when none fits, never nothing', [`${exact}xx`, `${exact}x`], `${exact}x`],
    ['nothing of nothing', [], ''],
  ] as const)('fitHeadline takes %s', (_case, candidates, expected) => expect(fitHeadline(candidates)).toBe(expected));
});
