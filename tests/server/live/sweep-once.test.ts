import { afterAll, beforeAll, expect, test } from 'vitest';

import { readSessionById } from '@/server/auth/read-session';
import type { Departures } from '@/server/live/departures';
import type { LiveServer, LiveSocket } from '@/server/live/live-socket';
import { sweepOnce } from '@/server/live/sweep-once';
import { planCaseAs } from '@/tests/server/house/client';
import { appendNewerEntry } from '@/tests/server/house/newer-entry';
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

/** An open socket of a person who follows these cases. */
async function socketOf(email: string, caseIds: readonly string[]): Promise<LiveSocket> {
  const signedIn = await readSessionById(server.context, await house.sessionIdOf(email));
  if (signedIn === null) throw new Error(`${email} is signed in.`);
  const { actor, session } = signedIn;
  return { id: email, connected: true, data: { visitor: actor, sessionId: session.sessionId, isDesk: false, caseIds: new Set(caseIds) } } as unknown as LiveSocket;
}

/** What one sweep over these sockets ends. */
async function sweep(sockets: readonly LiveSocket[]): Promise<string[]> {
  const ended: string[] = [];
  const departures = {
    endCase: (socket: LiveSocket, caseId: string, reason: string) => void ended.push(`${socket.id} ${caseId} ${reason}`),
    cut: (socket: LiveSocket, reason: string) => void ended.push(`${socket.id} ${reason}`),
  } as unknown as Departures;
  await sweepOnce(server.context, { of: () => ({ sockets: new Map(sockets.map((socket) => [socket.id, socket])) }) } as unknown as LiveServer, departures);
  return ended;
}

test('a case that only a newer program can read keeps no right alive in other cases', async () => {
  const [unread, other] = [await planCaseAs(house, desk), await planCaseAs(house, desk)];
  await appendNewerEntry(house, server, unread);
  await expect(server.context.memory.load(unread)).rejects.toThrow(/kind\.not-known/);
  const writer = await socketOf(desk, [unread, other]);
  const stranger = await socketOf('physician@demo.example', [unread, other]);
  expect(await sweep([writer, stranger])).toEqual([`physician@demo.example ${unread} revoked`, `physician@demo.example ${other} revoked`]);
  // The control: with the case that can be read alone, the same is ended and kept.
  for (const socket of [writer, stranger]) socket.data.caseIds = new Set([other]);
  expect(await sweep([writer, stranger])).toEqual([`physician@demo.example ${other} revoked`]);
});
