import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { commit, planCaseAs, runCommand, send } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { pairedWall as pairWall } from '@/tests/server/house/paired-wall';
import { connectViewer } from '@/tests/server/house/viewer';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
  await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
});
afterAll(() => house.close());

const pairedWall = () => pairWall(house, desk, caseId);

/** How long after `act` the condition held. */
async function msUntil(act: () => Promise<unknown>, condition: () => boolean): Promise<number> {
  await act();
  const begin = performance.now();
  await expect.poll(condition, { timeout: 8_000, interval: 10 }).toBe(true);
  return performance.now() - begin;
}

describe('who is let in', () => {
  test('nobody without a session, no foreign origin, no wall without a binding, no unknown kind of viewer', async () => {
    const cookie = await house.cookieOf(desk);
    await expect(connectViewer(house, { cookie: '', viewer: 'desk' })).rejects.toThrow('not-signed-in');
    for (const origin of ['https://evil.example', 'null', `${house.url}.evil.example`, 'http://127.0.0.1:1']) await expect(connectViewer(house, { cookie, viewer: 'desk', origin })).rejects.toThrow();
    await expect(connectViewer(house, { cookie, viewer: 'wall' })).rejects.toThrow('not-signed-in');
    await expect(connectViewer(house, { cookie, viewer: 'spy' as 'desk' })).rejects.toThrow('bad-request');
    const waiting = (await send(house, 'POST', '/api/screen')).headers.get('set-cookie')?.split(';')[0] ?? '';
    await expect(connectViewer(house, { cookie: waiting, viewer: 'wall' })).rejects.toThrow('not-signed-in');
  });
});

describe('a wall', () => {
  test('gets every number and hash, and nothing of the patient, of people or of what is not for walls', async () => {
    const { cookie } = await pairedWall();
    const wall = await connectViewer(house, { cookie, viewer: 'wall' });
    await wall.follow(caseId);
    await commit(house, desk, caseId, { name: 'send-message', text: 'Between colleagues' });
    await commit(house, desk, caseId, { ...runCommand('wrist'), run: { ...(runCommand('wrist') as { run: object }).run, note: 'A note of the desk' } } as never);
    const person = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'desk' });
    await person.follow(caseId);
    await expect.poll(() => wall.got.length).toBe(person.got.length);
    expect(wall.got.map(({ seq, hash, previousHash }) => [seq, hash, previousHash])).toEqual(person.got.map(({ seq, hash, previousHash }) => [seq, hash, previousHash]));
    const onTheWall = JSON.stringify(wall.got) + wall.raw.join();
    const people = await house.admin('people').select('id', 'display_name', 'email');
    for (const word of ['Invented patient', 'DEMO-1', 'Between colleagues', 'A note of the desk', ...people.flatMap((one) => [one.id, one.email, `"displayName":"${one.display_name}"`])]) {
      expect(onTheWall).not.toContain(word);
    }
    // The control: the person's stream holds what the wall's must not.
    expect(JSON.stringify(person.got)).toContain('Between colleagues');
    for (const viewer of [wall, person]) viewer.close();
  });

  test('reads its own case only, writes nothing, and confirms what it painted', async () => {
    const other = await planCaseAs(house, desk);
    const { cookie } = await pairedWall();
    const wall = await connectViewer(house, { cookie, viewer: 'wall' });
    expect(await wall.follow(other)).toMatchObject({ kind: 'refused', code: 'not-found' });
    expect(await wall.ask('command', { caseId, commandId: '0192f0c1-0000-7000-8000-000000000000', eventAt: new Date().toISOString(), command: { name: 'send-message', text: 'From the wall' } })).toMatchObject({ kind: 'refused', code: 'not-signed-in' });
    expect(await wall.ask('painted', { caseId, seq: 2, alertId: null, paintedAt: new Date().toISOString() })).toEqual({ kind: 'noted' });
    expect(await wall.ask('painted', { caseId: other, seq: 2, alertId: null, paintedAt: new Date().toISOString() })).toMatchObject({ kind: 'refused' });
    wall.close();
  });
});

describe('a right that is lost', () => {
  test('a session revoked in the database closes its socket within 2 s', async () => {
    const email = 'desk@demo.example';
    const viewer = await connectViewer(house, { cookie: await house.cookieOf(email), viewer: 'desk' });
    await viewer.follow(caseId);
    const other = await connectViewer(house, { cookie: (await pairedWall()).cookie, viewer: 'wall' });
    const sessionId = await house.sessionIdOf(email);
    const tookMs = await msUntil(() => house.admin('sessions').where({ id: sessionId }).update({ revoked_at: house.admin.fn.now() }), () => !viewer.socket.connected);
    expect(tookMs).toBeLessThan(2_000);
    expect(viewer.ended).toEqual([{ caseId, reason: 'signed-out' }]);
    // The control: someone else's socket stays.
    expect(other.socket.connected).toBe(true);
    other.close();
    await house.admin('sessions').where({ id: sessionId }).update({ revoked_at: null });
  });

  test('an assignment or a membership that ended stops the case within 2 s', async () => {
    const email = 'physician@demo.example';
    const person = await house.admin('people').where({ email }).first('id');
    const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
    await house.admin('case_assignments').insert({ hospital_id: hospitalId, case_id: caseId, person_id: person.id, role: 'physician' });
    const viewer = await connectViewer(house, { cookie: await house.cookieOf(email), viewer: 'follow' });
    expect((await viewer.follow(caseId)).kind).toBe('entries');
    const tookMs = await msUntil(() => house.admin('case_assignments').where({ person_id: person.id }).update({ to_at: house.admin.fn.now() }), () => viewer.ended.length > 0);
    expect(tookMs).toBeLessThan(2_000);
    const before = viewer.got.length;
    await commit(house, desk, caseId, { name: 'send-message', text: 'After the end' });
    expect(await viewer.follow(caseId)).toMatchObject({ kind: 'refused', code: 'not-found' });
    expect(viewer.got.length).toBe(before);
    viewer.close();
  });

  test('a wall that is revoked, and one whose case closes, are told and cut within 2 s', async () => {
    const [first, second] = [await pairedWall(), await pairedWall()];
    const walls = await Promise.all([first, second].map(({ cookie }) => connectViewer(house, { cookie, viewer: 'wall' })));
    for (const wall of walls) await wall.follow(caseId);
    const [one, two] = walls;
    if (one === undefined || two === undefined) throw new Error('Two walls were asked for.');
    const revoke = async () => send(house, 'DELETE', `/api/cases/${caseId}/screens/${first.screenId}`, { cookie: await house.cookieOf(desk) });
    expect(await msUntil(revoke, () => !one.socket.connected)).toBeLessThan(2_000);
    expect([one.ended, two.socket.connected]).toEqual([[{ caseId, reason: 'revoked' }], true]);
    expect(await msUntil(() => commit(house, desk, caseId, { name: 'close-case', text: null }), () => !two.socket.connected)).toBeLessThan(2_000);
    expect(two.ended).toEqual([{ caseId, reason: 'case-closed' }]);
    expect(two.got.at(-1)?.kind).toBe('case.closed');
  });
});
