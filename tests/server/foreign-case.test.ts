import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { envelope, planCaseAs, send, type HttpAnswer } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, 'desk@demo.example');
});
afterAll(() => house.close());

/** Every route that names a case, with a request that would be right for its owner. */
const routes: readonly (readonly [string, string, () => unknown])[] = [
  ['GET', '', () => undefined],
  ['GET', '/entries', () => undefined],
  ['POST', '/commands', () => envelope({ name: 'send-message', text: 'Hello' })],
  ['GET', '/screens', () => undefined],
  ['POST', '/screens', () => ({ code: 'ACDEFH', isConfirmed: false })],
  ['DELETE', `/screens/${newId()}`, () => undefined],
];

async function ask(email: string, id: string, [method, path, body]: (typeof routes)[number]): Promise<HttpAnswer> {
  const content = body();
  return send(house, method, `/api/cases/${id}${path}`, { cookie: await house.cookieOf(email), ...(content === undefined ? {} : { body: content }) });
}

const visible = ({ status, body, headers }: HttpAnswer) => ({ status, body, type: headers.get('content-type'), cache: headers.get('cache-control') });

describe('a case that is not theirs', () => {
  for (const email of ['desk@other.example', 'admin@demo.example', 'surgeon@demo.example', 'physician@demo.example', 'reviewer@demo.example']) {
    test(`looks to ${email} exactly like one that is not there, on every route`, async () => {
      for (const route of routes) {
        const foreign = visible(await ask(email, caseId, route));
        expect([route[0], route[1], foreign.status]).toEqual([route[0], route[1], 404]);
        expect(foreign).toEqual(visible(await ask(email, newId(), route)));
        expect(foreign).toEqual(visible(await ask(email, 'no-case-at-all', route)));
      }
    });
  }

  test('is not in their list, and is in its owner\'s', async () => {
    for (const [email, count] of [['desk@other.example', 0], ['physician@demo.example', 0], ['admin@demo.example', 0], ['desk@demo.example', 1]] as const) {
      const { body } = await send(house, 'GET', '/api/cases', { cookie: await house.cookieOf(email) });
      const { cases, total } = body as { cases: unknown[]; total: number };
      expect([email, cases.length, total]).toEqual([email, count, count]);
    }
  });

  test('the control: its owner is let in on every reading route', async () => {
    for (const route of routes.filter(([method]) => method === 'GET')) expect((await ask('desk@demo.example', caseId, route)).status).toBe(200);
  });

  test('opens to a person who is assigned, and closes at once when the membership is revoked', async () => {
    const email = 'physician@demo.example';
    const person = await house.admin('people').where({ email }).first('id');
    const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
    await house.admin('case_assignments').insert({ hospital_id: hospitalId, case_id: caseId, person_id: person.id, role: 'physician' });
    const [read, write] = [['GET', '', () => undefined] as const, ['POST', '/commands', () => envelope({ name: 'open-case', clockOffsetMs: null })] as const];
    expect((await ask(email, caseId, read)).body).toMatchObject({ role: 'physician', mayWrite: false, patientLabel: 'Invented patient' });
    expect((await ask(email, caseId, write)).status).toBe(404);
    await house.admin('memberships').where({ person_id: person.id }).update({ revoked_at: house.admin.fn.now() });
    expect((await ask(email, caseId, read)).status).toBe(404);
  });
});

describe('the list of cases', () => {
  test('ends with the role that opened a case, also for someone who has another role there', async () => {
    const email = 'surgeon@demo.example';
    const person = await house.admin('people').where({ email }).first('id');
    const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
    const listed = async () => ((await send(house, 'GET', '/api/cases', { cookie: await house.cookieOf(email) })).body as { cases: unknown[] }).cases.length;
    await house.admin('case_assignments').insert({ hospital_id: hospitalId, case_id: caseId, person_id: person.id, role: 'surgeon' });
    expect([await listed(), (await ask(email, caseId, ['GET', '', () => undefined])).status]).toEqual([1, 200]);
    await house.admin('memberships').insert({ hospital_id: hospitalId, person_id: person.id, role: 'reviewer' });
    await house.admin('memberships').where({ person_id: person.id, role: 'surgeon' }).update({ revoked_at: house.admin.fn.now() });
    expect([await listed(), (await ask(email, caseId, ['GET', '', () => undefined])).status]).toEqual([0, 404]);
  });
});

describe('the audit of reads', () => {
  const count = async (where: object) => Number((await house.admin('read_audit').where(where).count('* as count').first())?.count);

  test('has one row for each page read, with the rule', async () => {
    const before = await count({ case_id: caseId, what: 'entries', outcome: 'allowed', rule: 'neurophysiologist-of-the-case' });
    for (let read = 0; read < 5; read += 1) await ask('desk@demo.example', caseId, ['GET', '/entries', () => undefined]);
    expect(await count({ case_id: caseId, what: 'entries', outcome: 'allowed', rule: 'neurophysiologist-of-the-case' })).toBe(before + 5);
  });

  test('has one row for each list of cases, in each hospital whose cases it may name', async () => {
    const listed = { what: 'cases', outcome: 'allowed', case_id: null };
    const before = await count(listed);
    for (let read = 0; read < 3; read += 1) await send(house, 'GET', '/api/cases', { cookie: await house.cookieOf('desk@demo.example') });
    expect(await count({ ...listed, rule: 'neurophysiologist-of-the-hospital' })).toBeGreaterThanOrEqual(3);
    expect(await count(listed)).toBe(before + 3);
    await send(house, 'GET', '/api/cases', { cookie: await house.cookieOf('admin@demo.example') });
    expect(await count(listed)).toBe(before + 3);
  });

  test('has a row for the identity and for each refusal', async () => {
    const identities = await count({ case_id: caseId, what: 'identity' });
    await ask('desk@demo.example', caseId, ['GET', '', () => undefined]);
    expect(await count({ case_id: caseId, what: 'identity' })).toBe(identities + 1);
    const denied = await count({ case_id: caseId, outcome: 'denied', rule: 'no-rule' });
    await ask('desk@other.example', caseId, ['GET', '', () => undefined]);
    expect(await count({ case_id: caseId, outcome: 'denied', rule: 'no-rule' })).toBe(denied + 1);
  });
});
