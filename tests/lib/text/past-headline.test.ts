import { describe, expect, it } from 'vitest';

import { pastHeadline, staysLarge } from '@/lib/text/past-headline';
import { stateMark } from '@/lib/text/state-mark';
import type { TheatreLine } from '@/lib/text/theatre-line';

const line: TheatreLine = { kind: 'stable', priority: null, isCalm: true, isFlashing: false, nerveId: null, headline: 'Stable', detail: '' };

describe('pastHeadline', () => {
  it.each([
    [{ kind: 'alert', priority: 'high', headline: 'Ulnar at 38 % of baseline' }, 'Alert was open: ulnar at 38 % of baseline', true],
    [{ kind: 'notice', priority: 'medium', headline: 'Ulnar at 40 % of baseline' }, 'Notice was open: ulnar at 40 % of baseline', true],
    [{ kind: 'watch', priority: 'low', headline: 'Ulnar at 62 % of baseline' }, 'Watch was open: ulnar at 62 % of baseline', false],
    [{ kind: 'cannot-be-judged', priority: 'high', headline: 'Muscle responses cannot be judged' }, 'Shown then: muscle responses cannot be judged', true],
    [{}, 'Shown then: stable', false],
  ] as const)('%j', (change, words, isLarge) => {
    const past = { ...line, ...change };
    expect([pastHeadline(past), staysLarge(past)]).toEqual([words, isLarge]);
  });
});

describe('stateMark', () => {
  it.each([
    [{}, 'calm'],
    [{ isCalm: false }, 'outline'],
    [{ kind: 'alert', priority: 'high', isCalm: false }, 'high'],
    [{ kind: 'recovered', isCalm: false }, 'plain'],
    [{ kind: 'paused', isCalm: false }, 'paused'],
    [{ kind: 'not-tested', isCalm: false }, 'outline'],
  ] as const)('%j: %s', (change, mark) => {
    expect(stateMark({ ...line, ...change })).toBe(mark);
  });
});
