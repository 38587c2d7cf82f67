import { describe, expect, it } from 'vitest';

import { amplitudeOf } from '@/lib/response/amplitude-of';

describe('amplitudeOf', () => {
  it.each([
    ['is what was read', { kind: 'measured', onsetMs: 8, amplitudeUv: 3400, durationMs: null }, 3400],
    ['is 0 for no response', { kind: 'absent', highestIntensityMa: 18 }, 0],
    ['is nothing for an amplitude that was not read', { kind: 'measured', onsetMs: 8, amplitudeUv: null, durationMs: null }, null],
    ['is nothing for a channel that nobody looked at', { kind: 'not-read' }, null],
    ['is nothing for an unusable trace', { kind: 'unusable', reason: 'cautery' }, null],
  ] as const)('amplitudeOf %s', (_promise, reading, expected) => {
    expect(amplitudeOf(reading)).toBe(expected);
  });
});
