import { expect, it } from 'vitest';
import { createRestartLimit } from '@/server/setup/restart-limit';

it('createRestartLimit starts what lived well again at once, however often', () => {
  const limit = createRestartLimit();
  expect(Array.from({ length: 30 }, () => limit.nextDelayMs(2_000))).toEqual(Array(30).fill(0));
});

it('createRestartLimit waits longer from one short life to the next and gives up after the fifth', () => {
  const limit = createRestartLimit();
  expect([0, 1, 2, 3, 4, 5].map(() => limit.nextDelayMs(1_999))).toEqual([100, 200, 400, 800, 1_600, null]);
});

it('createRestartLimit forgets short lives after a long one', () => {
  const limit = createRestartLimit();
  limit.nextDelayMs(10);
  limit.nextDelayMs(5_000);
  expect(limit.nextDelayMs(10)).toBe(100);
});
