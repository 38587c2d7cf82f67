import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { DEMO_HOSPITALS } from '@/db/seeds/demo-people';
import type { SessionReply } from '@/lib/contracts/http/replies';

import { planRequest, send } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
const single = 'desk@other.example';
let house: TestHouse;
/** Ids of the two demo hospitals; the desk plans in both, their theatres have the same names. */
let own: string;
let other: string;

beforeAll(async () => {
  house = await openTestHouse();
  const idOf = async (index: number) => String((await house.admin('hospitals').where({ slug: DEMO_HOSPITALS[index]?.slug }).first('id'))?.id);
  [own, other] = [await idOf(0), await idOf(1)];
  const personId = String((await house.admin('people').where({ email: desk }).first('id'))?.id);
  await house.admin('memberships').insert({ hospital_id: other, person_id: personId, role: 'neurophysiologist' });
});
afterAll(() => house.close());

const plan = async (body: object, email = desk) => send(house, 'POST', '/api/cases', { cookie: await house.cookieOf(email), body });
const countCases = async () => Number((await house.admin('cases').count('* as count').first())?.count);
const hospitalOf = async (caseId: string) => String((await house.admin('cases').where({ id: caseId }).first('hospital_id'))?.hospital_id);
const caseIdOf = (body: unknown) => (body as { caseId: string }).caseId;

describe('planning for a person of two hospitals', () => {
  test('400 when two of them have a theatre of that name and none is named; nothing is written', async () => {
    const before = await countCases();
    const answer = await plan(planRequest());
    expect([answer.status, answer.body]).toMatchObject([400, { code: 'which-hospital', field: 'hospitalId', message: expect.stringContaining('"Theatre 1" stands in more than one hospital') }]);
    expect(await countCases()).toBe(before);
  });

  test('the case is planned in the hospital that is named', async () => {
    for (const hospitalId of [own, other]) {
      const answer = await plan({ ...planRequest(), hospitalId });
      expect(answer.status).toBe(200);
      expect(await hospitalOf(caseIdOf(answer.body))).toBe(hospitalId);
    }
  });

  test('404 with the same words for a hospital of others and for one that is not there', async () => {
    const before = await countCases();
    const absentId = newId();
    const foreign = await plan({ ...planRequest(), hospitalId: own }, single);
    const absent = await plan({ ...planRequest(), hospitalId: absentId }, single);
    const words = (body: unknown, id: string) => JSON.stringify(body).replace(id, 'ID');
    expect([foreign.status, absent.status]).toEqual([404, 404]);
    expect(words(foreign.body, own)).toBe(words(absent.body, absentId));
    expect(await countCases()).toBe(before);
  });

  test('400 for what is no id', async () => {
    const answer = await plan({ ...planRequest(), hospitalId: 'larkmoor' });
    expect([answer.status, answer.body]).toMatchObject([400, { kind: 'bad-request', field: 'hospitalId' }]);
  });

  test('the same command twice is one case; with the other hospital it is refused', async () => {
    const request = { ...planRequest(), hospitalId: own };
    const first = await plan(request);
    const again = await plan(request);
    expect(caseIdOf(again.body)).toBe(caseIdOf(first.body));
    const moved = await plan({ ...request, hospitalId: other });
    expect([moved.status, moved.body]).toMatchObject([409, { kind: 'refused', code: 'command-id-used' }]);
  });

  test('a person of one hospital names none', async () => {
    expect((await plan(planRequest(), single)).status).toBe(200);
    const { body } = await send(house, 'GET', '/api/session', { cookie: await house.cookieOf(desk) });
    expect(new Set((body as SessionReply).memberships.map(({ hospitalName }) => hospitalName))).toEqual(new Set(DEMO_HOSPITALS.map(({ name }) => name)));
  });
});
