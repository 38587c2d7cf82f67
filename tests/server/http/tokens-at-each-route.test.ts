import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { apiTable, type ApiOperation } from '@/lib/contracts/http/api-table';
import { openapiDocument } from '@/lib/contracts/http/openapi-document';
import { envelope, planCaseAs, planRequest, runCommand } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { tokenOf } from '@/tests/server/machine/token-of';

const desk = 'desk@demo.example';
const logLines: string[] = [];
let house: TestHouse;
let caseId: string;
const described = openapiDocument().paths as Record<string, Record<string, { responses: Record<string, unknown> }>>;

beforeAll(async () => {
  house = await openTestHouse({ logLines });
  caseId = await planCaseAs(house, desk);
});
afterAll(() => house.close());

const bodies: Readonly<Record<string, () => object>> = {
  PlanCaseRequest: () => planRequest(),
  CommandRequest: () => envelope(runCommand('wrist')),
  PairScreenRequest: () => ({ code: 'AAAAAA', isConfirmed: false }),
};

/** Asks, and holds the status of the answer against the description. */
async function ask({ method, path, request }: ApiOperation, headers: Record<string, string>): Promise<Response> {
  const address = house.url + path.replace('{caseId}', caseId).replace('{screenId}', '0192f0c1-0000-7000-8000-000000000000');
  const body = request === null ? null : JSON.stringify(bodies[request]?.());
  const answer = await fetch(address, { method: method.toUpperCase(), body, headers: { ...(body === null ? {} : { 'content-type': 'application/json' }), ...headers } });
  expect(Object.keys(described[path]?.[method]?.responses ?? {})).toContain(String(answer.status));
  return answer;
}

const operations = apiTable.filter(({ isOpen }) => !isOpen).map((operation) => [operation.operationId, operation] as const);

describe('every route for programs', () => {
  test.each(operations)('%s takes a token without cookie and Origin', async (_name, operation) => {
    const { token } = await tokenOf(house, desk);
    const { status } = await ask(operation, { authorization: `Bearer ${token}` });
    // No wall waits with that code, and no wall has that id.
    expect(status).toBe({ pairScreen: 409, revokeScreen: 404 }[operation.operationId] ?? 200);
  });

  test.each(operations)('%s is closed to a token that is not good, whatever cookie and Origin come with it', async (_name, operation) => {
    const { status } = await ask(operation, { authorization: `Bearer fascicle_${'A'.repeat(43)}`, cookie: await house.cookieOf(desk), origin: house.url });
    expect(status).toBe(401);
  });

  test.each(operations)('%s knows only the person of the token, not the one of the cookie beside it', async (_name, operation) => {
    const { token } = await tokenOf(house, 'desk@other.example');
    const answer = await ask(operation, { authorization: `Bearer ${token}`, cookie: await house.cookieOf(desk) });
    if (operation.path.includes('{caseId}')) expect(answer.status).toBe(404);
    else expect(await answer.text()).not.toContain('Larkmoor');
  });

  test('without token and cookie it answers 401, and one that is open answers anybody', async () => {
    for (const operation of apiTable) {
      const { status } = await ask(operation, operation.method === 'get' ? {} : { origin: house.url });
      expect([operation.operationId, status]).toEqual([operation.operationId, operation.isOpen ? 200 : 401]);
    }
  });
});

test('a token beside a good cookie does not give password and code again', async () => {
  const { token } = await tokenOf(house, desk);
  const headers = { authorization: `Bearer ${token}`, cookie: await house.cookieOf(desk), 'content-type': 'application/json' };
  const answer = await fetch(`${house.url}/api/reauthenticate`, { method: 'POST', headers, body: JSON.stringify({ password: 'x', code: '1' }) });
  expect([answer.status, await answer.json()]).toEqual([401, expect.objectContaining({ code: 'not-with-a-token', message: expect.stringMatching(/^Not with a token: /) })]);
});

test('a log line says what was asked with which token, and never the token', async () => {
  const { id, token } = await tokenOf(house, desk);
  await fetch(`${house.url}/api/people`, { headers: { authorization: `Bearer ${token}` } });
  const lines = logLines.filter((line) => line.includes(id)).map((line) => JSON.parse(line) as object);
  expect(lines).toEqual([expect.objectContaining({ door: 'people', tokenId: id })]);
  expect(logLines.join('')).not.toContain(token);
});

test('an Authorization of another scheme, as a proxy asks it of browsers, leaves the session what it is', async () => {
  const answer = await fetch(`${house.url}/api/session`, { headers: { authorization: 'Basic eDp5', cookie: await house.cookieOf(desk) } });
  expect(answer.status).toBe(200);
});

test('what was done with a token is audited as done by its person', async () => {
  const { token } = await tokenOf(house, desk);
  const person = await house.admin('people').where({ email: desk }).first('id');
  const before = Number((await house.admin('read_audit').where({ person_id: person.id, case_id: caseId, what: 'entries' }).count('* as count').first())?.count);
  expect((await fetch(`${house.url}/api/cases/${caseId}/entries`, { headers: { authorization: `Bearer ${token}` } })).status).toBe(200);
  const after = Number((await house.admin('read_audit').where({ person_id: person.id, case_id: caseId, what: 'entries' }).count('* as count').first())?.count);
  expect(after).toBe(before + 1);
});
