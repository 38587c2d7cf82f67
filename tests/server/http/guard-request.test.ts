import { request } from 'node:http';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';

let house: TestHouse;

beforeAll(async () => {
  house = await openTestHouse();
});
afterAll(() => house.close());

interface Raw {
  readonly status: number;
  readonly headers: NodeJS.Dict<string | string[]>;
  readonly body: string;
}

/** A request whose headers are exactly these: `fetch` would set Host and Origin itself. */
function raw(method: string, path: string, headers: Record<string, string>, body?: string): Promise<Raw> {
  return new Promise((resolve, reject) => {
    const { hostname, port, host } = new URL(house.url);
    const sent = request({ hostname, port, method, path, headers: { host, ...headers } }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () => resolve({ status: answer.statusCode ?? 0, headers: answer.headers, body: Buffer.concat(chunks).toString() }));
    });
    sent.on('error', reject);
    sent.end(body);
  });
}

const write = { 'content-type': 'application/json', 'content-length': '2' };

describe('what the guard lets through', () => {
  test('no write without an origin, and none from a foreign, null, sub-domain, suffix or other-port one', async () => {
    const { host } = new URL(house.url);
    const foreign = ['https://evil.example', 'null', `http://sub.${host}`, `http://${host}.evil.example`, 'http://127.0.0.1:1', `https://${host}`, `${house.url}/path`];
    expect((await raw('POST', '/api/screen', write, '{}')).status).toBe(400);
    for (const origin of foreign) {
      const { status, body } = await raw('POST', '/api/screen', { ...write, origin }, '{}');
      expect([origin, status]).toEqual([origin, 400]);
      expect(JSON.parse(body)).toMatchObject({ kind: 'bad-request', code: 'foreign-origin', message: expect.stringMatching(/^Foreign origin: /) });
    }
    expect((await raw('POST', '/api/screen', { ...write, origin: house.url, 'sec-fetch-site': 'cross-site' }, '{}')).status).toBe(400);
    expect((await raw('POST', '/api/screen', { ...write, origin: house.url }, '{}')).status).toBe(200);
  });

  test('a write of a program without an origin, but none at the sign-in, none with another scheme, and none from a foreign page', async () => {
    const authorization = `Bearer fascicle_${'A'.repeat(43)}`;
    const passed = await raw('POST', '/api/cases', { ...write, authorization }, '{}');
    expect([passed.status, JSON.parse(passed.body)]).toEqual([400, expect.objectContaining({ code: 'bad-request' })]);
    const refused = [
      ['/api/auth/callback/credentials', { authorization, 'content-type': 'application/x-www-form-urlencoded' }, 'no-origin'],
      ['/api/cases', { authorization: 'Basic eDp5' }, 'no-origin'],
      ['/api/cases', { authorization, origin: 'https://evil.example' }, 'foreign-origin'],
    ] as const;
    for (const [path, headers, code] of refused) {
      const { status, body } = await raw('POST', path, { ...write, ...headers }, '{}');
      expect([path, status, JSON.parse(body)]).toEqual([path, 400, expect.objectContaining({ code })]);
    }
  });

  test('no host but its own', async () => {
    for (const host of ['evil.example', '127.0.0.1', '127.0.0.1:1']) expect([host, (await raw('GET', '/api/health', { host })).status]).toEqual([host, 400]);
    expect((await raw('GET', '/api/health', { host: `localhost:${new URL(house.url).port}` })).status).toBe(200);
  });

  test('no form, no plain text, no body of unknown length, no other method, no write to a page', async () => {
    const origin = house.url;
    for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x']) {
      expect([type, (await raw('POST', '/api/screen', { ...write, origin, 'content-type': type }, '{}')).status]).toEqual([type, 400]);
    }
    expect((await raw('POST', '/api/screen', { origin, 'content-type': 'application/json', 'transfer-encoding': 'chunked' }, '{}')).status).toBe(411);
    for (const method of ['PUT', 'PATCH', 'OPTIONS', 'TRACE']) expect([method, (await raw(method, '/api/cases', { origin })).status]).toEqual([method, 405]);
    expect((await raw('POST', '/sign-in', { ...write, origin }, '{}')).status).toBe(405);
  });

  test('every answer carries the headers, a nonce of its own, and may not be stored', async () => {
    const answers = [await raw('GET', '/api/health', {}), await raw('GET', '/nowhere', {}), await raw('POST', '/api/cases', {}), await raw('GET', '/api/health', { host: 'evil.example' })];
    const nonces = answers.map(({ headers }) => /'nonce-([^']+)'/.exec(String(headers['content-security-policy']))?.[1]);
    expect(new Set(nonces).size).toBe(answers.length);
    for (const { headers } of answers) {
      expect(headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'no-referrer', 'cross-origin-opener-policy': 'same-origin', 'cross-origin-resource-policy': 'same-origin', 'cache-control': 'no-store' });
      expect(headers['content-security-policy']).toMatch(/frame-ancestors 'none'/);
      expect(headers['content-security-policy']).not.toMatch(/unsafe/);
    }
  });

  test('a client cannot name its own address', async () => {
    const { status } = await raw('GET', '/api/demo-people', { 'x-fascicle-address': '203.0.113.9', 'x-forwarded-for': '203.0.113.9' });
    expect(status).toBe(200);
  });
});
