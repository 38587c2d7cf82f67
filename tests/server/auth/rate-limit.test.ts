import { describe, expect, test } from 'vitest';

import { makeRateLimit } from '@/server/auth/rate-limit';

describe('makeRateLimit', () => {
  test('lets a burst through, then so many a second, each key for itself', () => {
    let nowMs = 0;
    const limit = makeRateLimit({ perSecond: 2, burst: 3, nowMs: () => nowMs });
    expect([1, 2, 3, 4].map(() => limit.take('a'))).toEqual([true, true, true, false]);
    expect(limit.take('b')).toBe(true);
    nowMs = 499;
    expect(limit.take('a')).toBe(false);
    nowMs = 1_000;
    expect([limit.take('a'), limit.take('a'), limit.take('a')]).toEqual([true, true, false]);
  });

  test('forgets the oldest key past its bound, so that strangers cannot fill the memory', () => {
    const limit = makeRateLimit({ perSecond: 0, burst: 1, nowMs: () => 0, mostKeys: 2 });
    for (const key of ['a', 'b', 'c']) limit.take(key);
    expect([limit.take('c'), limit.take('a')]).toEqual([false, true]);
  });
});
