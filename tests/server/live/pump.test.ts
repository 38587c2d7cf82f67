import { afterAll, beforeAll, expect, test } from 'vitest';

import type { EntriesMessage } from '@/lib/contracts/channel/messages';
import type { LiveServer } from '@/server/live/live-socket';
import { makePump } from '@/server/live/pump';
import { commit, planCaseAs } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { openSecondServer, type SecondServer } from '@/tests/server/house/second-server';

const desk = 'desk@demo.example';
let house: TestHouse;
let server: SecondServer;

beforeAll(async () => {
  house = await openTestHouse();
  server = openSecondServer(house);
});
afterAll(async () => {
  await server.close();
  await house.close();
});

/** A pump whose messages to the people of a case are kept by their numbers. */
function keptPump() {
  const sent: number[] = [];
  const emit = (room: string, message: EntriesMessage) => void (room.startsWith('person ') && sent.push(...message.entries.map(({ seq }) => seq)));
  const io = { to: (room: string) => ({ emit: (_event: string, message: EntriesMessage) => emit(room, message) }) };
  return { sent, pump: makePump(server.context, io as unknown as LiveServer, () => undefined) };
}

test('someone who joins with the newest entry does not take it from those who were there', async () => {
  const caseId = await planCaseAs(house, desk);
  const { sent, pump } = keptPump();
  pump.watch(caseId, 1);
  const entries = await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
  // The log already holds entry 2, and a newcomer reads it before the writer of this process tells of it.
  pump.watch(caseId, 2);
  pump.publish(caseId, entries);
  expect(sent).toEqual([2]);
  await commit(house, desk, caseId, { name: 'send-message', text: 'From another process' });
  pump.watch(caseId, 3);
  await pump.reach(caseId, 3);
  expect(sent).toEqual([2, 3]);
});

test('each entry is sent once, however often and from wherever it is told of', async () => {
  const caseId = await planCaseAs(house, desk);
  const { sent, pump } = keptPump();
  pump.watch(caseId, 1);
  const [second] = await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
  const [third] = await commit(house, desk, caseId, { name: 'send-message', text: 'Third' });
  if (second === undefined || third === undefined) throw new Error('Two entries were written.');
  pump.publish(caseId, [third]);
  await expect.poll(() => sent).toEqual([2, 3]);
  pump.publish(caseId, [second]);
  pump.publish(caseId, [second, third]);
  await pump.reach(caseId, 3);
  expect(sent).toEqual([2, 3]);
  pump.unwatch(caseId);
  await pump.reach(caseId, 9);
  expect(sent).toEqual([2, 3]);
});
