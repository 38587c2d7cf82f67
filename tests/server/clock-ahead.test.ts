import { afterAll, beforeAll, expect, test } from 'vitest';

import { readCommandReply } from '@/app/_live/read-command-reply';
import { readSessionById } from '@/server/auth/read-session';
import { giveCommandMessage } from '@/server/live/give-command-message';
import type { LiveSocket } from '@/server/live/live-socket';

import { commit, envelope, planCaseAs, runCommand } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';
import { openSecondServer, type SecondServer } from './house/second-server';

const desk = 'desk@demo.example';
let house: TestHouse;
let server: SecondServer;
let laterMs = 0;

beforeAll(async () => {
  house = await openTestHouse();
  server = openSecondServer(house, { nowMs: () => Date.now() + laterMs });
});
afterAll(async () => {
  await server.close();
  await house.close();
});

test('a run of a desk whose clock is a little ahead is asked for again, and committed once with its own time when that has come', async () => {
  const caseId = await planCaseAs(house, desk);
  await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
  const sessionId = await house.sessionIdOf(desk);
  expect(await readSessionById(server.context, sessionId)).not.toBeNull();
  const socket = { data: { sessionId } } as LiveSocket;
  const count = async () => Number((await house.admin('entries').where({ case_id: caseId, kind: 'run.logged' }).count('* as count').first())?.count);

  const message = { caseId, ...envelope(runCommand('wrist'), new Date(Date.now() + 20_000).toISOString()) };
  const early = await giveCommandMessage(server.context, socket, message);
  expect(early).toMatchObject({ kind: 'refused', message: expect.stringMatching(/^Not saved yet: .+ is \d+ s later than the server's clock/) });
  expect(readCommandReply(early), 'the desk reads it as "send the same again"').toBeNull();
  expect(await count()).toBe(0);

  laterMs = 19_000;
  const inTime = readCommandReply(await giveCommandMessage(server.context, socket, message));
  expect(inTime).toMatchObject({ kind: 'committed', entries: [{ kind: 'run.logged', eventAt: message.eventAt }, { kind: 'run.judged' }] });
  expect(readCommandReply(await giveCommandMessage(server.context, socket, message))).toEqual(inTime);
  expect(await count()).toBe(1);
});

test('one far ahead is refused for good: it would make every true run after it look older', async () => {
  const caseId = await planCaseAs(house, desk);
  const socket = { data: { sessionId: await house.sessionIdOf(desk) } } as LiveSocket;
  const message = { caseId, ...envelope({ name: 'send-message', text: 'From tomorrow' }, new Date(Date.now() + 86_400_000).toISOString()) };
  expect(readCommandReply(await giveCommandMessage(server.context, socket, message))).toMatchObject({ kind: 'refused', code: 'time-ahead', field: 'eventAt' });
});
