import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { commit, envelope, give, planCaseAs, planRequest, send } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
});
afterAll(() => house.close());

const countEntries = async (of = caseId) => Number((await house.admin('entries').where({ case_id: of }).count('* as count').first())?.count);

describe('POST /api/cases/:id/commands', () => {
  test('401 for nobody, with a sentence and nothing written', async () => {
    const before = await countEntries();
    const answer = await send(house, 'POST', `/api/cases/${caseId}/commands`, { body: envelope({ name: 'send-message', text: 'Hello' }) });
    expect(answer.status).toBe(401);
    expect(answer.body).toMatchObject({ kind: 'not-signed-in', message: expect.stringMatching(/^Not signed in\. /) });
    expect(await countEntries()).toBe(before);
  });

  test('400 for an unknown field, named', async () => {
    const answer = await give(house, desk, caseId, { ...envelope({ name: 'send-message', text: 'Hello' }), extra: 1 } as never);
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ kind: 'bad-request', field: 'extra' });
  });

  test('400 for a time ahead of the server and for one too old', async () => {
    const ahead = await give(house, desk, caseId, envelope({ name: 'send-message', text: 'Hello' }, new Date(Date.now() + 70_000).toISOString()));
    expect([ahead.status, ahead.body]).toMatchObject([400, { code: 'time-ahead', field: 'eventAt' }]);
    const old = await give(house, desk, caseId, envelope({ name: 'send-message', text: 'Hello' }, new Date(Date.now() - 25 * 3_600_000).toISOString()));
    expect([old.status, old.body]).toMatchObject([400, { code: 'time-too-old', field: 'eventAt' }]);
  });

  test('409 for what the case refuses, then success', async () => {
    const refused = await give(house, desk, caseId, envelope({ name: 'change-phase', phase: 'monitoring', reason: null }));
    expect([refused.status, refused.body]).toMatchObject([409, { kind: 'refused', code: 'not-open' }]);
    const [opened] = await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: 12 });
    expect(opened).toMatchObject({ kind: 'case.opened', seq: 2, author: { role: 'neurophysiologist' } });
  });

  test('the same command twice is one row and one answer', async () => {
    const request = envelope({ name: 'send-message', text: 'Once only' });
    const first = await give(house, desk, caseId, request);
    const before = await countEntries();
    const second = await give(house, desk, caseId, request);
    expect(second).toMatchObject({ status: 200, body: first.body as object });
    expect(await countEntries()).toBe(before);
  });

  test('the same command twenty times side by side is one row', async () => {
    const request = envelope({ name: 'send-message', text: 'Side by side' });
    const before = await countEntries();
    const answers = await Promise.all(Array.from({ length: 20 }, () => give(house, desk, caseId, request)));
    for (const answer of answers) expect(answer).toMatchObject({ status: 200, body: answers[0]?.body as object });
    expect(await countEntries()).toBe(before + 1);
  });

  test('the same command id with another content is refused and writes nothing', async () => {
    const request = envelope({ name: 'send-message', text: 'First content' });
    await give(house, desk, caseId, request);
    const before = await countEntries();
    const other = await give(house, desk, caseId, { ...request, command: { name: 'send-message', text: 'Other content' } });
    expect([other.status, other.body]).toMatchObject([409, { kind: 'refused', code: 'command-id-used', field: 'commandId' }]);
    expect(await countEntries()).toBe(before);
  });

  test('a repeat is answered with its entries also when the case would refuse it now', async () => {
    const another = await planCaseAs(house, desk);
    const opening = envelope({ name: 'open-case', clockOffsetMs: null });
    const first = await give(house, desk, another, opening);
    const again = await give(house, desk, another, opening);
    expect(again).toMatchObject({ status: 200, body: first.body as object });
  });
});

describe('POST /api/cases', () => {
  test('keeps the patient out of the log and gives a reference with a check letter', async () => {
    const request = planRequest();
    const cookie = await house.cookieOf(desk);
    const { body } = await send(house, 'POST', '/api/cases', { cookie, body: request });
    expect(body).toMatchObject({ kind: 'committed', entries: [{ kind: 'case.planned', body: { reference: expect.stringMatching(/^\d{2}-\d{5}-[A-Z]$/), identityCommitment: expect.stringMatching(/^[0-9a-f]{64}$/) } }] });
    expect(JSON.stringify(body)).not.toMatch(/Invented patient|DEMO-1/);
  });

  test('the same planning twice is one case; with another patient it is refused', async () => {
    const request = planRequest();
    const cookie = await house.cookieOf(desk);
    const first = await send(house, 'POST', '/api/cases', { cookie, body: request });
    const again = await send(house, 'POST', '/api/cases', { cookie, body: request });
    expect(again.body).toEqual(first.body);
    const other = await send(house, 'POST', '/api/cases', { cookie, body: { ...request, identity: { patientLabel: 'Another', recordNumber: 'DEMO-2' } } });
    expect([other.status, other.body]).toMatchObject([409, { code: 'command-id-used' }]);
  });

  test('a plan that does not fit together is a 400 with a sentence', async () => {
    const request = planRequest();
    const plan = { ...request.plan, paths: [{ ...request.plan.paths[0], id: 'axilla/nowhere', channelId: 'nowhere' }] };
    const answer = await send(house, 'POST', '/api/cases', { cookie: await house.cookieOf(desk), body: { ...request, plan } });
    expect([answer.status, answer.body]).toMatchObject([400, { field: 'plan', message: expect.stringMatching(/\w+/) }]);
  });

  test('who plans no cases is told "not found"', async () => {
    for (const email of ['surgeon@demo.example', 'physician@demo.example', 'admin@demo.example']) {
      expect((await send(house, 'POST', '/api/cases', { cookie: await house.cookieOf(email), body: planRequest() })).status).toBe(404);
    }
  });
});
