import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { revokeAccessToken } from '@/db/repositories/tokens/revoke-access-token';
import { newAccessToken } from '@/server/auth/access-token';
import { envelope, planCaseAs, planRequest, runCommand, send } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';

import { tokenOf } from './token-of';

const desk = 'desk@demo.example';
let house: TestHouse;
const logLines: string[] = [];
beforeAll(async () => void (house = await openTestHouse({ logLines })));
afterAll(() => house.close());

const asked = (token: string, method: string, path: string, body?: unknown, headers: Record<string, string> = {}) =>
  fetch(house.url + path, {
    method,
    headers: { authorization: `Bearer ${token}`, ...(body === undefined ? {} : { 'content-type': 'application/json' }), ...headers },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
  });

describe('a token of a program', () => {
  it('plans and logs in the name of its person, without a page, and never stands in a log line or in the database', async () => {
    const { id, token } = await tokenOf(house, desk);
    const planned = await asked(token, 'POST', '/api/cases', planRequest());
    expect(planned.status).toBe(200);
    const { caseId, entries } = (await planned.json()) as { caseId: string; entries: { author: { role: string; displayName: string } }[] };
    expect(entries[0]?.author).toMatchObject({ role: 'neurophysiologist' });
    expect((await asked(token, 'POST', `/api/cases/${caseId}/commands`, envelope(runCommand('wrist')))).status).toBe(200);
    expect(logLines.some((line) => line.includes(id))).toBe(true);
    expect(logLines.join('')).not.toContain(token);
    const kept = await house.admin('access_tokens').where({ id }).first<Record<string, unknown>>();
    expect(JSON.stringify(kept)).not.toContain(token.slice(10));
  });

  it.each([
    ['an unknown one', () => Promise.resolve(newAccessToken())],
    ['what is none', () => Promise.resolve('none')],
    ['an expired one', async () => {
      const { id, token } = await tokenOf(house, desk);
      await house.admin('access_tokens').where({ id }).update({ created_at: house.admin.raw(`now() - interval '2 hours'`), expires_at: house.admin.raw(`now() - interval '1 hour'`) });
      return token;
    }],
    ['a revoked one', async () => {
      const { id, token } = await tokenOf(house, desk);
      expect((await asked(token, 'GET', '/api/session')).status).toBe(200);
      expect(await revokeAccessToken(house.admin, id)).toBe(true);
      return token;
    }],
  ])('%s is nobody, also beside a good cookie', async (_name, make) => {
    const token = await make();
    const reply = await asked(token, 'GET', '/api/session', undefined, { cookie: await house.cookieOf(desk) });
    expect(reply.status).toBe(401);
    expect(await reply.json()).toMatchObject({ kind: 'not-signed-in', message: expect.stringMatching(/^Token not good/) as unknown });
  });

  it('opens nothing of another hospital and nothing that asks for the person again', async () => {
    const caseId = await planCaseAs(house, desk);
    const { token } = await tokenOf(house, 'desk@other.example');
    for (const path of [`/api/cases/${caseId}`, `/api/cases/${caseId}/entries`, `/api/cases/${caseId}/screens`]) {
      expect([path, (await asked(token, 'GET', path)).status]).toEqual([path, 404]);
    }
    expect((await asked(token, 'POST', '/api/reauthenticate', { password: 'x', code: '1' })).status).toBe(401);
  });

  it('does not let a foreign page write: with an Origin it is held to the rules of pages', async () => {
    const { token } = await tokenOf(house, desk);
    const reply = await asked(token, 'POST', '/api/cases', planRequest(), { origin: 'https://elsewhere.example' });
    expect(reply.status).toBe(400);
    expect((await send(house, 'POST', '/api/cases', { body: planRequest(), headers: { origin: '' } })).status).toBe(400);
  });
});

describe('people to choose a team from', () => {
  it('are those of the hospital where the person plans; a surgeon sees none', async () => {
    const reply = await asked((await tokenOf(house, desk)).token, 'GET', '/api/people');
    const { people } = (await reply.json()) as { people: { role: string; personId: string }[] };
    expect(people.map(({ role }) => role).sort()).toEqual(['neurophysiologist', 'physician', 'surgeon']);
    expect((await asked((await tokenOf(house, 'surgeon@demo.example')).token, 'GET', '/api/people')).status).toBe(404);
    const physician = people.find(({ role }) => role === 'physician')!;
    const planned = await asked((await tokenOf(house, desk)).token, 'POST', '/api/cases', { ...planRequest(), team: [{ personId: physician.personId, role: 'physician' }] });
    const { caseId } = (await planned.json()) as { caseId: string };
    expect((await asked((await tokenOf(house, 'physician@demo.example')).token, 'GET', `/api/cases/${caseId}`)).status).toBe(200);
    const wrong = await asked((await tokenOf(house, desk)).token, 'POST', '/api/cases', { ...planRequest(), team: [{ personId: physician.personId, role: 'surgeon' }] });
    expect(wrong.status).toBe(400);
    expect(await wrong.json()).toMatchObject({ field: 'team.0.personId' });
  });
});
