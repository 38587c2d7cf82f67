import { describe, expect, it } from 'vitest';

import { boundedText } from '@/lib/contracts/text-schemas';

const takes = (text: string) => boundedText(12).safeParse(text).success;

describe('boundedText', () => {
  it.each(['Arm moved', 'µV Δ ≥ 50 %', 'Zwölf', 'ذراع', 'two\nlines', '👩‍⚕️', 'x'.repeat(12)])('takes %j', (text) => expect(takes(text)).toBe(true));

  it.each(['', '   ', 'x'.repeat(13), 'a\u0000b', 'a\u001bb', 'a\u0085b', 'a\ud800b', 'a\u2028b'])('refuses %j', (text) => expect(takes(text)).toBe(false));

  it.each(['\u202a', '\u202b', '\u202d', '\u202e', '\u2066', '\u2067', '\u2068', '\u2069'])('refuses %j, which would turn 38 into 83 on a screen', (sign) => {
    expect(takes(`${sign}38 %`)).toBe(false);
  });
});
