import { afterAll, beforeAll, expect, test, vi } from 'vitest';

import { requireCase } from '@/app/(desk)/require-person';

import { planCaseAs, send } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const asked = vi.hoisted(() => ({ headers: new Headers() }));
vi.mock('next/headers', () => ({ headers: async () => asked.headers }));

let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, 'desk@demo.example');
});
afterAll(() => house.close());

const reads = async () => (await house.admin('read_audit').where({ case_id: caseId }).orderBy('id').select('what', 'outcome')).map(({ what, outcome }) => `${what} ${outcome}`);
const sendPageTo = async (email: string) => {
  asked.headers = new Headers({ cookie: await house.cookieOf(email), host: new URL(house.url).host });
  await requireCase(caseId);
};

test('a page is sent, and fetched again to be kept, without a read; what it asks for is the read, noted once', async () => {
  const email = 'desk@demo.example';
  await sendPageTo(email);
  await sendPageTo(email);
  expect(await reads()).toEqual([]);
  await send(house, 'GET', `/api/cases/${caseId}`, { cookie: await house.cookieOf(email) });
  expect(await reads()).toEqual(['case allowed', 'identity allowed']);
});

test('a page that is refused is noted', async () => {
  const before = await reads();
  await expect(sendPageTo('desk@other.example')).rejects.toThrow(/NEXT_HTTP_ERROR_FALLBACK;404/);
  expect(await reads()).toEqual([...before, 'see-case denied']);
});

test('nobody is sent to the sign-in page', async () => {
  asked.headers = new Headers();
  await expect(requireCase(caseId)).rejects.toThrow(/NEXT_REDIRECT/);
});
