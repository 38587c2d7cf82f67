import { afterAll, beforeAll, expect, test } from 'vitest';

import { planCaseAs } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
});
afterAll(() => house.close());

const presenceIn = (viewer: Viewer) => viewer.pulses.at(-1)?.cases[0]?.deskConnected;

test('only someone who may write is a desk, whatever the page says of itself', async () => {
  const email = 'surgeon@demo.example';
  const person = await house.admin('people').where({ email }).first('id');
  const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
  await house.admin('case_assignments').insert({ hospital_id: hospitalId, case_id: caseId, person_id: person.id, role: 'surgeon' });
  const surgeon = await connectViewer(house, { cookie: await house.cookieOf(email), viewer: 'desk' });
  expect((await surgeon.follow(caseId)).kind).toBe('entries');
  await expect.poll(() => presenceIn(surgeon), { timeout: 5_000 }).toBe(false);
  const writer = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'desk' });
  await writer.follow(caseId);
  await expect.poll(() => presenceIn(surgeon), { timeout: 5_000 }).toBe(true);
  writer.close();
  await expect.poll(() => presenceIn(surgeon), { timeout: 5_000 }).toBe(false);
  surgeon.close();
});
