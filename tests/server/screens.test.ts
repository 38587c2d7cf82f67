import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import type { ScreenReply } from '@/lib/contracts/http/replies';

import { commit, planCaseAs, send } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
  await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
});
afterAll(() => house.close());

/** A wall that has just asked: its cookie and what it shows. */
async function askedWall() {
  const answer = await send(house, 'POST', '/api/screen');
  const line = answer.headers.get('set-cookie') ?? '';
  return { line, cookie: line.split(';')[0] ?? '', shown: answer.body as ScreenReply & { kind: 'waiting' } };
}

const statusOf = async (cookie: string) => (await send(house, 'GET', '/api/screen', { cookie })).body;
const pair = async (code: string, isConfirmed: boolean, email = desk, of = caseId) =>
  send(house, 'POST', `/api/cases/${of}/screens`, { cookie: await house.cookieOf(email), body: { code, isConfirmed } });

describe('pairing a wall', () => {
  test('gives it a code, two words and a cookie that scripts and other sites cannot use', async () => {
    const { line, shown, cookie } = await askedWall();
    expect(shown).toMatchObject({ kind: 'waiting', code: expect.stringMatching(/^[ACDEFHJKMNPRTUVWXY34679]{6}$/), words: expect.stringMatching(/^[a-z]+ [a-z]+$/) });
    expect(line).toMatch(/; HttpOnly; SameSite=Strict/);
    expect(await statusOf(cookie)).toEqual(shown);
    expect((await send(house, 'POST', '/api/screen', { cookie })).body).toEqual(shown);
  });

  test('shows the words first and binds only when they are confirmed', async () => {
    const { cookie, shown } = await askedWall();
    expect((await pair(shown.code, false)).body).toEqual({ screenId: shown.screenId, words: shown.words, isPaired: false });
    expect(await statusOf(cookie)).toMatchObject({ kind: 'waiting' });
    expect((await pair(shown.code, true)).body).toMatchObject({ isPaired: true });
    expect(await statusOf(cookie)).toEqual({ kind: 'paired', screenId: shown.screenId, caseId, timeZone: 'Europe/London' });
  });

  test('a code binds once, an unknown one and one over 10 min old never', async () => {
    const { shown } = await askedWall();
    expect((await pair(shown.code, true)).status).toBe(200);
    expect([(await pair(shown.code, true)).status, (await pair('AAAAAA', true)).status]).toEqual([409, 409]);
    const old = await askedWall();
    await house.admin('wall_screens').where({ id: old.shown.screenId }).update({ asked_at: new Date(Date.now() - 601_000) });
    expect((await pair(old.shown.code, false)).status).toBe(409);
    expect((await send(house, 'GET', '/api/screen', { cookie: old.cookie })).status).toBe(404);
  });

  test('a person of another hospital cannot bind a wall to this case', async () => {
    const { shown, cookie } = await askedWall();
    expect((await pair(shown.code, true, 'desk@other.example')).status).toBe(404);
    expect(await statusOf(cookie)).toMatchObject({ kind: 'waiting' });
  });

  test('a wall\'s cookie opens nothing over HTTP but its own status', async () => {
    const { cookie, shown } = await askedWall();
    await pair(shown.code, true);
    for (const path of ['/api/session', '/api/cases', `/api/cases/${caseId}`, `/api/cases/${caseId}/entries`]) expect((await send(house, 'GET', path, { cookie })).status).toBe(401);
  });

  test('revoked it says so, and a closed case ends the others', async () => {
    const [first, second] = [await askedWall(), await askedWall()];
    for (const wall of [first, second]) await pair(wall.shown.code, true);
    const revoked = await send(house, 'DELETE', `/api/cases/${caseId}/screens/${first.shown.screenId}`, { cookie: await house.cookieOf(desk) });
    expect([revoked.status, JSON.stringify(revoked.body).includes(first.shown.screenId)]).toEqual([200, false]);
    expect(await statusOf(first.cookie)).toMatchObject({ kind: 'ended', reason: 'revoked' });
    await commit(house, desk, caseId, { name: 'close-case', text: null });
    expect(await statusOf(second.cookie)).toMatchObject({ kind: 'ended', reason: 'case-closed', timeZone: 'Europe/London' });
    expect((await pair((await askedWall()).shown.code, true)).status).toBe(404);
  });
});
