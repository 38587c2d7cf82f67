import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { commit, envelope, planCaseAs, planRequest, runCommand, send } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;
let cookie: string;

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
  cookie = await house.cookieOf(desk);
  await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
});
afterAll(() => house.close());

const rows = async () => Number((await house.admin('entries').count('* as count').first())?.count);
const post = (path: string, body: unknown, headers: Record<string, string> = {}) => send(house, 'POST', path, { cookie, body, headers });

/** Values that a field of a run, a condition or a text never has. */
const wrongValue = fc.oneof(
  fc.constantFrom('', ' ', '\u0000', 'a\u0000b', '\ud800', 'x\udfff', '\u001b[2J', '__proto__', -1, -0.0001, 1e308, 1e9, '6.2', true, null, [], {}, [[[[]]]]),
  fc.string({ minLength: 501, maxLength: 900 }),
  fc.double({ min: 1e7, max: 1e300, noNaN: true }),
  fc.array(fc.anything({ maxDepth: 1 }), { maxLength: 3 }),
);

/** A right request with one field, at any depth, replaced by what it may not be. */
function spoilt(request: object, path: readonly string[], value: unknown): object {
  const [key = '', ...rest] = path;
  const present = (request as Record<string, unknown>)[key];
  const next = rest.length === 0 ? value : spoilt((present ?? {}) as object, rest, value);
  return Array.isArray(request) ? request.map((one, index) => (String(index) === key ? next : one)) : { ...request, [key]: next };
}

const runFields = ['siteId', 'electrodeId', 'family', 'purpose', 'intensityMa', 'pulseWidthUs', 'isSupramaximal', 'readings'] as const;
const paths = fc.oneof(
  fc.constantFrom(['commandId'], ['eventAt'], ['command'], ['command', 'name'], ['command', 'extra'], ['extra']),
  fc.constantFrom(...runFields).map((field) => ['command', 'run', field]),
  fc.constantFrom('onsetMs', 'amplitudeUv', 'durationMs', 'kind').map((field) => ['command', 'run', 'readings', '0', 'reading', field]),
);

describe('bad input', () => {
  test('300 spoilt commands: 400 with a sentence and nothing written, or a value that was right after all', async () => {
    const before = await rows();
    await fc.assert(
      fc.asyncProperty(paths, wrongValue, async (path, value) => {
        const request = spoilt(envelope(runCommand('wrist')), path, value);
        fc.pre(!isRightAfterAll(path, value));
        const { status, body } = await post(`/api/cases/${caseId}/commands`, request);
        expect({ path, value, status, body }).toMatchObject({ status: 400, body: { kind: 'bad-request', message: expect.stringMatching(/^[A-Z].{5,}/) } });
      }),
      { numRuns: 300 },
    );
    expect(await rows()).toBe(before);
  });

  test('100 random JSON values as a whole body', async () => {
    const before = await rows();
    await fc.assert(
      fc.asyncProperty(fc.json(), async (text) => {
        for (const path of ['/api/cases', `/api/cases/${caseId}/commands`, `/api/cases/${caseId}/screens`, '/api/reauthenticate']) {
          expect([path, text, (await post(path, text)).status]).toEqual([path, text, 400]);
        }
      }),
      { numRuns: 25 },
    );
    expect(await rows()).toBe(before);
  });

  test('broken JSON, NaN, bytes that are no UTF-8, a lone surrogate written as an escape, deep nesting', async () => {
    const right = JSON.stringify(envelope({ name: 'send-message', text: 'Hello' }));
    const bodies: unknown[] = ['', '{', `${right},`, 'NaN', right.replace('"Hello"', 'NaN'), right.replace('Hello', '\\ud800'), right.replace('Hello', '\\u0000'), Uint8Array.from([0x7b, 0xff, 0xfe, 0x7d]), '['.repeat(30_000)];
    for (const body of bodies) {
      const { status, body: answer } = await post(`/api/cases/${caseId}/commands`, body);
      expect([String(body).slice(0, 60), status]).toEqual([String(body).slice(0, 60), 400]);
      expect(answer).toMatchObject({ kind: 'bad-request' });
    }
  });

  test('a key called __proto__ or constructor is an unknown key', async () => {
    const right = JSON.stringify(envelope({ name: 'send-message', text: 'Hello' }));
    for (const key of ['__proto__', 'constructor', 'toString']) {
      expect([key, (await post(`/api/cases/${caseId}/commands`, right.replace('{', `{"${key}":{"isAdmin":true},`))).status]).toEqual([key, 400]);
    }
  });

  test('a body over 64 KiB is refused by its length, before it is read', async () => {
    const { status, body } = await post('/api/cases', JSON.stringify({ ...planRequest(), padding: 'x'.repeat(70_000) }));
    expect([status, body]).toMatchObject([413, { code: 'too-large', message: expect.stringContaining('65536') }]);
  });

  test('page numbers out of range name their field; ids that are none are not found', async () => {
    for (const query of ['after=-1', 'after=x', 'limit=0', 'limit=501', 'limit=1e3', `after=${'9'.repeat(40)}`]) {
      const { status, body } = await send(house, 'GET', `/api/cases/${caseId}/entries?${query}`, { cookie });
      expect([query, status, (body as { field: string }).field]).toEqual([query, 400, query.split('=')[0]]);
    }
    for (const id of ['%00', '..', "' or 1=1 --", 'x'.repeat(2_000)]) {
      expect((await send(house, 'GET', `/api/cases/${encodeURIComponent(id)}`, { cookie })).status).toBe(404);
    }
  });

  test('the control: the unspoilt request is taken', async () => {
    expect((await post(`/api/cases/${caseId}/commands`, envelope(runCommand('wrist')))).status).toBe(200);
  });
});

/** A few wrong-looking values are right in their place: null where nothing was read. */
function isRightAfterAll(path: readonly string[], value: unknown): boolean {
  const field = path.at(-1) ?? '';
  if (field === 'isSupramaximal') return value === true;
  return value === null && ['onsetMs', 'amplitudeUv', 'durationMs'].includes(field);
}
