import { expect, test } from 'vitest';

import { PaintConfirmations } from '@/app/_live/paint-confirmations';

/** A server that answers each saying in turn, and a wall that never waits. */
function wallOf(replies: unknown[]) {
  const said: unknown[] = [];
  const confirmations = new PaintConfirmations({
    request: async (body) => {
      said.push(body);
      const reply = replies.shift();
      if (reply instanceof Error) throw reply;
      return reply;
    },
    isConnected: () => true,
    nowMs: () => Date.parse('2027-03-14T10:41:20.000Z'),
    wait: async () => undefined,
  });
  return { said, confirmations };
}

test.each([
  ['noted', [{ kind: 'noted' }], 1],
  ['refused for good', [{ kind: 'refused', code: 'bad-request' }], 1],
  ['not saved, then noted', [{ kind: 'refused', code: 'not-saved' }, { kind: 'noted' }], 2],
  ['not answered, then noted', [new Error('no answer'), { kind: 'noted' }], 2],
])('a confirmation that is %s is said as often as it must, with the time of the paint', async (_what, replies, count) => {
  const { said, confirmations } = wallOf([...replies]);
  confirmations.add('case-1', 31, 'ulnar-1');
  await expect.poll(() => said.length).toBe(count);
  await new Promise((resolve) => setTimeout(resolve, 0));
  expect(said).toEqual(Array.from({ length: count }, () => ({ caseId: 'case-1', seq: 31, alertId: 'ulnar-1', paintedAt: '2027-03-14T10:41:20.000Z' })));
  confirmations.sendAgain();
  await new Promise((resolve) => setTimeout(resolve, 0));
  expect(said.length).toBe(count);
});
