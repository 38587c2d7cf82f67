import { afterAll, beforeAll, expect, test } from 'vitest';

import { readSessionById } from '@/server/auth/read-session';
import { giveCommand } from '@/server/commands/give-command';

import { envelope, give, planCaseAs, runCommand } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';
import { openSecondServer, type SecondServer } from './house/second-server';

const desk = 'desk@demo.example';
const dayMs = 24 * 3_600_000;
let house: TestHouse;
let inAWeek: SecondServer;

beforeAll(async () => {
  house = await openTestHouse();
  inAWeek = openSecondServer(house, { nowMs: () => Date.now() + 7 * dayMs });
});
afterAll(async () => {
  await inAWeek.close();
  await house.close();
});

test('a command that is in the log is answered as a repeat, even more than a day later', async () => {
  const caseId = await planCaseAs(house, desk);
  const request = envelope({ name: 'send-message', text: 'Its answer was lost' });
  const first = await give(house, desk, caseId, request);
  const signedIn = await readSessionById(inAWeek.context, await house.sessionIdOf(desk));
  if (signedIn === null) throw new Error('The desk is signed in.');
  expect(await giveCommand(inAWeek.context, signedIn, caseId, request)).toEqual(first.body);
  const other = { ...request, command: { name: 'send-message' as const, text: 'Other words' } };
  expect(await giveCommand(inAWeek.context, signedIn, caseId, other)).toMatchObject({ kind: 'refused', code: 'command-id-used' });
});

test('a run that waited in the browser for days is committed with its own time; one from before its case was planned is not', async () => {
  const caseId = await planCaseAs(house, desk);
  const signedIn = await readSessionById(inAWeek.context, await house.sessionIdOf(desk));
  if (signedIn === null) throw new Error('The desk is signed in.');
  const [opening, run] = [envelope({ name: 'open-case', clockOffsetMs: null }), envelope(runCommand('wrist'))];
  for (const request of [opening, run]) {
    expect(await giveCommand(inAWeek.context, signedIn, caseId, request)).toMatchObject({ kind: 'committed', entries: expect.arrayContaining([expect.objectContaining({ commandId: request.commandId, eventAt: request.eventAt })]) as unknown });
  }
  const before = envelope(runCommand('wrist'), new Date(Date.now() - 3_600_000).toISOString());
  await expect(giveCommand(inAWeek.context, signedIn, caseId, before)).rejects.toThrow(/^Time too old/);
});
