import { afterAll, beforeAll, expect, test } from 'vitest';

import { contractVersion } from '@/lib/contracts/contract-version';
import { readSessionById } from '@/server/auth/read-session';
import { makePresence } from '@/server/cases/presence';
import { makeDepartures } from '@/server/live/departures';
import { follow } from '@/server/live/follow';
import type { LiveServer, LiveSocket } from '@/server/live/live-socket';
import { makePump } from '@/server/live/pump';
import { planCaseAs } from '@/tests/server/house/client';
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

test('a viewer that leaves while it asks again stays in no room, and nobody reads the log for it', async () => {
  const caseId = await planCaseAs(house, desk);
  const signedIn = await readSessionById(server.context, await house.sessionIdOf(desk));
  if (signedIn === null) throw new Error('The desk is signed in.');
  const rooms = new Map<string, Set<string>>();
  const io = { of: () => ({ adapter: { rooms } }) } as unknown as LiveServer;
  const pump = makePump(server.context, io, () => undefined);
  const unwatched: string[] = [];
  const presence = makePresence(Date.now);
  const departures = makeDepartures(io, presence, { unwatch: (id) => void unwatched.push(id) });
  const socket = {
    id: 'gone',
    connected: false,
    data: { visitor: signedIn.actor, sessionId: signedIn.session.sessionId, displayName: 'Neurophysiologist', isDesk: true, caseIds: new Set([caseId]) },
    join: (room: string) => rooms.set(room, new Set(['gone'])),
    leave: (room: string) => rooms.delete(room),
  } as unknown as LiveSocket;
  const reply = await follow({ context: server.context, pump, presence, departures }, socket, { contractVersion, caseId, after: 0 });
  expect(reply).toMatchObject({ kind: 'refused', code: 'not-saved' });
  expect([[...rooms.keys()], unwatched, [...socket.data.caseIds]]).toEqual([[], [caseId], []]);
});
