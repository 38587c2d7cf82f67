import { describe, expect, it } from 'vitest';

import type { Reading } from '@/lib/response/reading';
import { milliamperes, readingWords } from '@/lib/text/reading-words';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('readingWords', () => {
  it.each<[Reading, 'muscle' | 'nerve', string]>([
    [{ kind: 'measured', onsetMs: 9.71, amplitudeUv: 3500, durationMs: 6.1 }, 'muscle', 'onset 9.71 ms, 3.5 mV, negative peak 6.10 ms'],
    [{ kind: 'measured', onsetMs: null, amplitudeUv: 12.3, durationMs: null }, 'nerve', 'onset not read, 12.3 µV'],
    [{ kind: 'measured', onsetMs: 3, amplitudeUv: null, durationMs: null }, 'muscle', 'onset 3.00 ms, amplitude not read'],
    [{ kind: 'absent', highestIntensityMa: 25 }, 'muscle', 'no response up to 25.0 mA'],
    [{ kind: 'unusable', reason: 'wet-field' }, 'muscle', 'not usable, wet field'],
    [{ kind: 'not-read' }, 'muscle', 'not read'],
  ])('says %o of a %s channel, never blank', (reading, kind, words) => {
    expect(plain(readingWords(reading, kind))).toBe(words);
  });
});

describe('milliamperes', () => {
  it('keeps the second digit that thresholds on the exposed nerve need', () => {
    expect([0.35, 1, 18].map((value) => plain(milliamperes(value)))).toEqual(['0.35 mA', '1.0 mA', '18.0 mA']);
  });
});
