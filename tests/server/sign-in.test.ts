import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';

import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { DEMO_PASSWORD } from '@/db/seeds/demo-people';
import { checkCredentials, throttle } from '@/server/auth/check-credentials';
import { codeAt, nextCode, stepAt, stepOfCode } from '@/server/auth/second-factor';

import { send } from './house/client';
import { openTestHouse, sessionCookie, type TestHouse } from './house/open-test-house';
import { openSecondServer, type SecondServer } from './house/second-server';

let house: TestHouse;

beforeAll(async () => {
  house = await openTestHouse();
});
afterAll(() => house.close());
beforeEach(async () => {
  await house.admin('people').update({ second_factor_step: -1 });
});

const source = { cookie: null, authorization: null, address: '192.0.2.7' };
const signIn = (email: string, password: string, code: string, address = source.address) =>
  globalThis.fascicle.execute('sign-in', { email, password, code }, { ...source, address });

async function codeOf(email: string): Promise<string> {
  const credentials = await findCredentialsByEmail(house.admin, email);
  if (credentials === null) throw new Error(`There is no ${email}.`);
  return (await nextCode(credentials.secondFactorSecret, credentials.secondFactorStep, Date.now())).code;
}

describe('signing in', () => {
  test('takes the right three and begins a session that can be read', async () => {
    const answer = await signIn('Surgeon@Demo.example ', DEMO_PASSWORD, await codeOf('surgeon@demo.example'));
    if (!answer.isOk) throw new Error(answer.body.message);
    const cookie = await sessionCookie(answer.body.sessionId, house.database.secret);
    const { body } = await send(house, 'GET', '/api/session', { cookie });
    expect(body).toMatchObject({ email: 'surgeon@demo.example', memberships: [{ role: 'surgeon' }], theatres: expect.arrayContaining([expect.objectContaining({ name: 'Theatre 1' })]) });
  });

  test('says the same of a wrong password, a wrong code and an unknown person', async () => {
    const code = await codeOf('surgeon@demo.example');
    const answers = [
      await signIn('surgeon@demo.example', 'wrong', code),
      await signIn('surgeon@demo.example', DEMO_PASSWORD, code === '000000' ? '000001' : '000000'),
      await signIn('nobody@demo.example', DEMO_PASSWORD, code),
    ];
    for (const answer of answers) expect(answer).toEqual({ ...answers[0], status: 401 });
  });

  test('takes a code once, also when it is sent twice at the same time', async () => {
    const code = await codeOf('reviewer@demo.example');
    const answers = await Promise.all(Array.from({ length: 6 }, () => signIn('reviewer@demo.example', DEMO_PASSWORD, code)));
    expect(answers.filter((answer) => answer.isOk).length).toBe(1);
    expect(answers.find((answer) => !answer.isOk)?.body).toMatchObject({ code: 'code-used' });
  });

  test('lets an account rest after its failures, with a sentence, even with the right three', async () => {
    const email = 'admin@demo.example';
    const statuses: number[] = [];
    for (let attempt = 0; attempt < throttle.perAccount; attempt += 1) statuses.push((await signIn(email, 'wrong', '000000', `192.0.2.${attempt}`)).status);
    expect(new Set(statuses)).toEqual(new Set([401]));
    const answer = await signIn(email, DEMO_PASSWORD, await codeOf(email), '192.0.2.200');
    expect([answer.status, answer.body]).toMatchObject([429, { kind: 'too-many', message: expect.stringMatching(/^Too many: 10 failed attempts/) }]);
  });

  test('counts attempts side by side: of an account under any spelling, and of a machine under any account', async () => {
    const spellings = Array.from({ length: 24 }, (_, index) => `${' '.repeat(index)}${index % 2 === 0 ? 'spaced' : 'Spaced'}@demo.example `);
    const ofAccount = await Promise.all(spellings.map((email, index) => signIn(email, 'wrong', '000000', `198.51.100.${index}`)));
    const emails = Array.from({ length: throttle.perAddress + 8 }, (_, index) => `machine-${index}@demo.example`);
    const ofMachine = await Promise.all(emails.map((email) => signIn(email, 'wrong', '000000', '198.51.100.250')));
    const taken = (answers: readonly { readonly status: number }[]) => answers.filter(({ status }) => status === 401).length;
    expect([taken(ofAccount), taken(ofMachine)]).toEqual([throttle.perAccount, throttle.perAddress]);
  });

  test('counts an account in all processes together, also when they ask side by side', async () => {
    const servers = [openSecondServer(house), openSecondServer(house), openSecondServer(house)];
    const contextOf = (index: number) => (servers[index % servers.length] as SecondServer).context;
    const typed = { email: 'spread@demo.example', password: 'wrong', code: '000000', credentials: null };
    try {
      const answers = await Promise.all(
        Array.from({ length: 24 }, (_, index) => checkCredentials(contextOf(index), { ...typed, address: `203.0.113.${index}` }).catch((refused: unknown) => refused as { status: number })),
      );
      const statuses = answers.map((answer) => ('status' in answer ? answer.status : 200));
      expect([statuses.filter((status) => status === 401).length, statuses.filter((status) => status === 429).length]).toEqual([throttle.perAccount, 24 - throttle.perAccount]);
    } finally {
      await Promise.all(servers.map((server) => server.close()));
    }
  });

  test('takes as long for an unknown person as for a known one', async () => {
    const timeOf = async (email: string) => {
      const begin = performance.now();
      await signIn(email, 'wrong', '000000', '192.0.2.250');
      return performance.now() - begin;
    };
    const [known, unknown]: [number[], number[]] = [[], []];
    await timeOf('nobody-0@demo.example');
    for (let round = 1; round <= 9; round += 1) {
      known.push(await timeOf('physician@demo.example'));
      unknown.push(await timeOf(`nobody-${round}@demo.example`));
    }
    const median = (times: number[]) => times.sort((a, b) => a - b)[4] ?? 0;
    const ratio = median(unknown) / median(known);
    expect(ratio).toBeGreaterThan(0.5);
    expect(ratio).toBeLessThan(2);
  });

  test('bad texts are a 400 and never a fault', async () => {
    for (const email of ['a\u0000b', '\ud800', 'x'.repeat(300)]) expect((await signIn(email, 'p', '000000')).status).toBe(400);
    expect((await signIn('a@b.example', 'p', '12345678901')).status).toBe(400);
  });
});

describe('a session', () => {
  test('that was revoked is nobody at once, and a forged or foreign token is nobody', async () => {
    const email = 'desk@demo.example';
    const cookie = await house.cookieOf(email);
    expect((await send(house, 'GET', '/api/session', { cookie })).status).toBe(200);
    await globalThis.fascicle.execute('sign-out', { sessionId: await house.sessionIdOf(email) }, source);
    expect((await send(house, 'GET', '/api/session', { cookie })).status).toBe(401);
    const other = await sessionCookie(await house.sessionIdOf('surgeon@demo.example'), 'another secret that has nothing to do with ours');
    for (const forged of [other, 'next-auth.session-token=x', 'next-auth.session-token=%E0%A4%A', `${cookie}x`]) {
      expect((await send(house, 'GET', '/api/session', { cookie: forged })).status).toBe(401);
    }
  });

  test('is marked when password and code are given again, and only then', async () => {
    const email = 'desk@other.example';
    const cookie = await house.cookieOf(email);
    await house.admin('people').update({ second_factor_step: -1 });
    const marked = () => house.admin('sessions').where({ id: sessionId }).first('reauthenticated_at');
    const sessionId = await house.sessionIdOf(email);
    const wrong = await send(house, 'POST', '/api/reauthenticate', { cookie, body: { password: 'wrong', code: await codeOf(email) } });
    expect([wrong.status, (await marked()).reauthenticated_at]).toEqual([401, null]);
    const right = await send(house, 'POST', '/api/reauthenticate', { cookie, body: { password: DEMO_PASSWORD, code: await codeOf(email) } });
    expect([right.status, (await marked()).reauthenticated_at !== null]).toEqual([200, true]);
  });
});

describe('GET /api/demo-people', () => {
  test('gives people with codes that work, and only to this machine', async () => {
    const { body } = await send(house, 'GET', '/api/demo-people');
    const { people } = body as { people: { email: string; password: string; code: string }[] };
    const reviewer = people.find((person) => person.email === 'reviewer@demo.example');
    expect((await signIn(reviewer?.email ?? '', reviewer?.password ?? '', reviewer?.code ?? '')).isOk).toBe(true);
    expect((await globalThis.fascicle.query('demo-people', {}, source)).status).toBe(404);
  });
});

describe('second factor', () => {
  const secret = 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ';

  test('codeAt gives the last six digits of the vectors of RFC 6238, appendix B', async () => {
    for (const [second, code] of [[59, '287082'], [1_111_111_109, '081804'], [1_234_567_890, '005924'], [2_000_000_000, '279037']] as const) {
      expect(await codeAt(secret, stepAt(second * 1000))).toBe(code);
    }
  });

  test('stepOfCode takes one step to either side and no more', async () => {
    const nowMs = 1_234_567_890_000;
    for (const [offset, expected] of [[-2, null], [-1, stepAt(nowMs) - 1], [0, stepAt(nowMs)], [1, stepAt(nowMs) + 1], [2, null]] as const) {
      expect([offset, await stepOfCode(secret, await codeAt(secret, stepAt(nowMs) + offset), nowMs)]).toEqual([offset, expected]);
    }
  });
});
