import { setTimeout as pause } from 'node:timers/promises';
import { expect, it } from 'vitest';
import { watchEventLoop } from '@/server/telemetry/event-loop';

it('watchEventLoop sees a blocked loop, and forgets it at the next read', async () => {
  const watch = watchEventLoop();
  await pause(30);
  const until = performance.now() + 200;
  while (performance.now() < until);
  await pause(30);
  expect(watch.read().maxMs).toBeGreaterThan(150);
  await pause(60);
  expect(watch.read().maxMs).toBeLessThan(150);
  watch.stop();
});
