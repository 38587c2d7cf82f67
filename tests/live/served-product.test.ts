import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { request } from 'node:http';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { buildEnvironment } from '@/server/setup/build-folders';
import { serverEnvironment } from '@/server/setup/server-environment';
import { chooseFreePort } from '@/server/setup/free-port';
import { parseSettings } from '@/server/settings/settings';
import { root, testBuildFolders } from '@/tests/support/product-build';
import { startProduct, type Product } from '@/tests/support/start-product';

import { signInAs, signInAsDemo } from './sign-in-as';

let product: Product;

beforeAll(async () => {
  product = await startProduct();
});
afterAll(() => product.stop());

const get = (path: string, headers: Record<string, string> = {}) => fetch(product.url + path, { headers, redirect: 'manual' });

describe('signing in over next-auth', () => {
  test('gives a token that holds no name and no role, and ends with the sign-out', async () => {
    const jar = await signInAsDemo(product, 'desk@demo.example');
    expect((await get('/api/session', { cookie: jar.header })).status).toBe(200);
    expect(await (await get('/api/auth/session', { cookie: jar.header })).json()).toEqual({ expires: expect.any(String) });
    const csrfToken = decodeURIComponent(jar.cookies.get('next-auth.csrf-token') ?? '').split('|')[0] ?? '';
    const body = new URLSearchParams({ csrfToken, json: 'true' });
    const headers = { origin: product.url, 'content-type': 'application/x-www-form-urlencoded', cookie: jar.header };
    await fetch(`${product.url}/api/auth/signout`, { method: 'POST', headers, body, redirect: 'manual' });
    // The old cookie is still a well-formed token; the session behind it is over.
    expect((await get('/api/session', { cookie: jar.header })).status).toBe(401);
  });

  test('answers a wrong password with 401 and the sentence', async () => {
    const { response } = await signInAs(product, { email: 'surgeon@demo.example', password: 'wrong', code: '000000' });
    expect(response.status).toBe(401);
    expect(decodeURIComponent(await response.text())).toMatch(/Not accepted: e-mail, password or code is wrong/);
  });

  test('opens no other door of next-auth', async () => {
    for (const path of ['/api/auth/signin', '/api/auth/signout', '/api/auth/error', '/api/auth/callback/credentials', '/api/auth/verify-request']) {
      expect([path, (await get(path)).status]).toEqual([path, 404]);
    }
  });

  test('asks for no other origin\'s form', async () => {
    const response = await fetch(`${product.url}/api/auth/callback/credentials`, { method: 'POST', headers: { origin: 'https://evil.example', 'content-type': 'application/x-www-form-urlencoded' }, body: 'a=b' });
    expect(response.status).toBe(400);
  });
});

describe('every page', () => {
  test('carries a new nonce in its policy and on each of its scripts, no inline style attribute, and is not stored', async () => {
    const nonces = new Set<string>();
    for (const path of ['/sign-in', '/screen', '/nowhere-at-all']) {
      const response = await get(path);
      const html = await response.text();
      const nonce = /'nonce-([^']+)'/.exec(response.headers.get('content-security-policy') ?? '')?.[1] ?? '';
      nonces.add(nonce);
      const scripts = html.match(/<script\b[^>]*>/g) ?? [];
      expect([path, scripts.length > 0, scripts.filter((script) => !script.includes(`nonce="${nonce}"`))]).toEqual([path, true, []]);
      expect([path, html.match(/<[a-z][^>]* style="[^"]*"/g)]).toEqual([path, null]);
      expect([path, response.headers.get('cache-control'), response.headers.get('x-powered-by')]).toEqual([path, 'no-store', null]);
    }
    expect(nonces.size).toBe(3);
  });

  test('lets its own hashed files be stored', async () => {
    const html = await (await get('/sign-in')).text();
    const file = /\/_next\/static\/[^"]+\.js/.exec(html)?.[0] ?? '';
    expect((await get(file)).headers.get('cache-control')).toMatch(/immutable/);
  });

  test('an upgrade to any other path is refused at once', async () => {
    const status = await new Promise<number | undefined>((resolve, reject) => {
      const asked = request(`${product.url}/other`, { headers: { connection: 'Upgrade', upgrade: 'websocket', 'sec-websocket-version': '13', 'sec-websocket-key': 'AAAAAAAAAAAAAAAAAAAAAA==' } });
      asked.on('response', (answer) => resolve(answer.statusCode));
      asked.on('upgrade', () => reject(new Error('An upgrade to /other was accepted.')));
      asked.on('error', reject);
      asked.end();
    });
    expect(status).toBe(404);
  });
});

/** The built server as a program of the test's own, on this port and the product's database. */
function startProgram(port: number) {
  const settings = parseSettings({ PORT: String(port), FASCICLE_DEMO: 'on' });
  const environment = { ...serverEnvironment(settings, product.database.secret, product.database), ...buildEnvironment(testBuildFolders) };
  return spawn(process.execPath, [testBuildFolders.serverFile], { cwd: root, env: environment, stdio: ['ignore', 'ignore', 'pipe', 'ipc'] });
}

describe('the server program', () => {
  test('on a taken port says so in one sentence and ends with status 4', async () => {
    const child = startProgram(product.port);
    const said: string[] = [];
    child.stderr?.on('data', (chunk: Buffer) => said.push(chunk.toString()));
    const [status] = (await once(child, 'close')) as [number];
    expect([status, said.join('').trim()]).toEqual([4, `Port ${product.port} is taken by another program.`]);
  });

  test('says that it listens, and ends with status 0 when it is told to', async () => {
    const port = await chooseFreePort();
    const child = startProgram(port);
    const [message] = (await once(child, 'message')) as [unknown];
    expect(message).toEqual({ kind: 'listening', port });
    const ended = once(child, 'exit');
    child.kill('SIGTERM');
    expect(await ended).toEqual([0, null]);
  });
});
