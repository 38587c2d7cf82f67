import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';

import { holdPresence, type HeldViewer } from '@/db/repositories/presence/hold-presence';
import { planCaseAs, send } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { openSecondServer, type SecondServer } from '@/tests/server/house/second-server';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';

const desk = 'desk@demo.example';
const logLines: string[] = [];
let house: TestHouse;
let second: SecondServer;
let caseId: string;
let viewer: Viewer;

beforeAll(async () => {
  house = await openTestHouse({ logLines });
  second = openSecondServer(house);
  caseId = await planCaseAs(house, desk);
  viewer = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'follow' });
  await viewer.follow(caseId);
});
afterAll(async () => {
  viewer.close();
  await second.close();
  await house.close();
});

const lastOf = (of: Viewer) => of.pulses.at(-1)?.cases[0];

async function heldElsewhere(changes: Partial<HeldViewer>): Promise<HeldViewer> {
  const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
  const { id: personId } = await house.admin('people').where({ email: desk }).first('id');
  return { viewerId: 'far', hospitalId, caseId, personId, screenId: null, role: 'neurophysiologist', displayName: 'Neurophysiologist', isDesk: true, since: new Date().toISOString(), ...changes };
}

test('a pulse names who follows here, and the desk and the wall of another process until that falls silent', async () => {
  await expect.poll(() => lastOf(viewer), { timeout: 5_000 }).toMatchObject({
    deskConnected: false,
    deskSince: null,
    wallsConnected: 0,
    peopleConnected: [{ role: 'neurophysiologist', displayName: 'Neurophysiologist' }],
  });
  const screenId = randomUUID();
  const held = [await heldElsewhere({}), await heldElsewhere({ viewerId: 'wall', personId: null, screenId, role: 'screen', displayName: '', isDesk: false })];
  await holdPresence(second.context.database.app, randomUUID(), held);
  await expect.poll(() => lastOf(viewer), { timeout: 5_000 }).toMatchObject({ deskConnected: true, deskSince: held[0]?.since, wallsConnected: 1 });
  // It never says a second time that they are there.
  await expect.poll(() => lastOf(viewer), { timeout: 8_000 }).toMatchObject({ deskConnected: false, wallsConnected: 0 });
  expect(Date.parse(lastOf(viewer)?.deskSince ?? '')).toBeGreaterThan(Date.parse(held[0]?.since ?? ''));
}, 20_000);

test('the list of walls at the desk knows a wall of another process', async () => {
  const asked = await send(house, 'POST', '/api/screen');
  const { screenId, code } = asked.body as { screenId: string; code: string };
  const cookie = await house.cookieOf(desk);
  await send(house, 'POST', `/api/cases/${caseId}/screens`, { cookie, body: { code, isConfirmed: true } });
  const isConnected = async () => ((await send(house, 'GET', `/api/cases/${caseId}/screens`, { cookie })).body as { screens: { isConnected: boolean }[] }).screens.map((screen) => screen.isConnected);
  expect(await isConnected()).toEqual([false]);
  await holdPresence(second.context.database.app, randomUUID(), [await heldElsewhere({ personId: null, screenId, role: 'screen', displayName: '', isDesk: false })]);
  expect(await isConnected()).toEqual([true]);
});

test('this process tells the table who is here, and that they left', async () => {
  const rows = () => house.admin('case_presence').where({ case_id: caseId, is_desk: true, display_name: 'Neurophysiologist' }).whereNot({ viewer_id: 'far' }).select('left_at');
  const writer = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'desk' });
  await writer.follow(caseId);
  await expect.poll(rows, { timeout: 5_000 }).toEqual([{ left_at: null }]);
  writer.close();
  await expect.poll(rows, { timeout: 5_000 }).toEqual([{ left_at: expect.any(String) }]);
});

test('without the table pulses go on, and tell of this process what it knows itself', async () => {
  await house.admin.raw('alter table case_presence rename to case_presence_away');
  const from = viewer.pulses.length;
  await expect.poll(() => viewer.pulses.length, { timeout: 5_000 }).toBeGreaterThan(from + 2);
  const writer = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'desk' });
  await writer.follow(caseId);
  await expect.poll(() => lastOf(viewer)?.deskConnected, { timeout: 5_000 }).toBe(true);
  writer.close();
  await expect.poll(() => lastOf(viewer)?.deskConnected, { timeout: 5_000 }).toBe(false);
  await house.admin.raw('alter table case_presence_away rename to case_presence');
  expect(logLines.some((line) => line.includes('Who is connected elsewhere could not be read'))).toBe(true);
  expect(logLines.some((line) => line.includes('Other processes were not told who is connected here'))).toBe(true);
}, 20_000);
