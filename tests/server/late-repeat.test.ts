import { afterAll, beforeAll, expect, test } from 'vitest';

import { readSessionById } from '@/server/auth/read-session';
import { giveCommand } from '@/server/commands/give-command';

import { envelope, give, planCaseAs } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';
import { openSecondServer, type SecondServer } from './house/second-server';

const desk = 'desk@demo.example';
const dayMs = 24 * 3_600_000;
let house: TestHouse;
let nextDay: SecondServer;

beforeAll(async () => {
  house = await openTestHouse();
  nextDay = openSecondServer(house, { nowMs: () => Date.now() + dayMs + 60_000 });
});
afterAll(async () => {
  await nextDay.close();
  await house.close();
});

test('a command that is in the log is answered as a repeat, even more than a day later', async () => {
  const caseId = await planCaseAs(house, desk);
  const request = envelope({ name: 'send-message', text: 'Its answer was lost' });
  const first = await give(house, desk, caseId, request);
  const signedIn = await readSessionById(nextDay.context, await house.sessionIdOf(desk));
  if (signedIn === null) throw new Error('The desk is signed in.');
  expect(await giveCommand(nextDay.context, signedIn, caseId, request)).toEqual(first.body);
  const other = { ...request, command: { name: 'send-message' as const, text: 'Other words' } };
  expect(await giveCommand(nextDay.context, signedIn, caseId, other)).toMatchObject({ kind: 'refused', code: 'command-id-used' });
  // The control: what is not in the log is too old.
  await expect(giveCommand(nextDay.context, signedIn, caseId, envelope({ name: 'send-message', text: 'Never sent' }))).rejects.toThrow(/^Time too old/);
});
