import { readFileSync } from 'node:fs';
import path from 'node:path';
import vm from 'node:vm';

import { describe, expect, it } from 'vitest';

const source = readFileSync(path.join(import.meta.dirname, '../../../public/service-worker.js'), 'utf8');
const origin = 'http://desk.test';

/** The cache of a browser, as far as the worker uses it. */
class FakeCache {
  readonly held = new Map<string, Response>();
  private key = (one: string | { url: string }) => new URL(typeof one === 'string' ? one : one.url, origin).href;
  match = async (one: string | { url: string }) => this.held.get(this.key(one))?.clone();
  put = async (one: string | { url: string }, response: Response) => void this.held.set(this.key(one), response);
  delete = async (one: string | { url: string }) => this.held.delete(this.key(one));
  keys = async () => [...this.held.keys()].map((url) => ({ url }));
}

function startWorker() {
  const caches = new Map<string, FakeCache>();
  const listeners = new Map<string, (event: Record<string, unknown>) => void>();
  const told: unknown[] = [];
  const network = { isUp: true, answers: new Map<string, () => Response | Promise<Response>>(), asked: [] as string[] };
  const open = async (name: string) => {
    const cache = caches.get(name) ?? new FakeCache();
    caches.set(name, cache);
    return cache;
  };
  const fetchIt = async (one: string | { url: string }) => {
    const { pathname, search } = new URL(typeof one === 'string' ? one : one.url, origin);
    network.asked.push(pathname + search);
    const answer = network.answers.get(pathname + search);
    if (!network.isUp) throw new TypeError('Failed to fetch');
    return answer === undefined ? new Response('none', { status: 404 }) : answer();
  };
  const self = { location: { origin }, clients: { claim: async () => undefined }, skipWaiting: () => undefined, addEventListener: (name: string, listener: never) => listeners.set(name, listener) };
  const cachesOfBrowser = { open, keys: async () => [...caches.keys()], delete: async (name: string) => caches.delete(name) };
  vm.runInNewContext(source, { self, caches: cachesOfBrowser, fetch: fetchIt, URL, Response, Promise, setTimeout, Set, Date, JSON });
  const fire = async (name: string, event: Record<string, unknown>) => {
    const work: unknown[] = [];
    listeners.get(name)?.({ ...event, waitUntil: (one: unknown) => work.push(one), respondWith: (one: unknown) => work.push(one) });
    return (await Promise.all(work))[0] as Response | undefined;
  };
  return {
    caches,
    network,
    told,
    navigate: (to: string) => fire('fetch', { request: { url: origin + to, method: 'GET', mode: 'navigate' } }),
    load: (to: string, method = 'GET') => fire('fetch', { request: { url: origin + to, method, mode: 'no-cors' } }),
    tell: (message: unknown) => fire('message', { data: message, source: { postMessage: (answer: unknown) => told.push(answer) } }),
    activate: () => fire('activate', {}),
  };
}

const html = (nonce: string, script: string) => () =>
  new Response(`<html><script nonce="${nonce}" src="/_next/static/chunks/${script}.js"></script><link href="/_next/static/css/a.css"></html>`, {
    headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': `script-src 'nonce-${nonce}' 'strict-dynamic'` },
  });

async function workerWithPage() {
  const worker = startWorker();
  worker.network.answers.set('/cases/a/log', html('n1', 'main'));
  worker.network.answers.set('/_next/static/chunks/main.js', () => new Response('main'));
  worker.network.answers.set('/_next/static/chunks/lazy.js', () => new Response('lazy'));
  worker.network.answers.set('/_next/static/css/a.css', () => new Response('@font-face{src:url(../media/f.woff2)}'));
  worker.network.answers.set('/_next/static/media/f.woff2', () => new Response('font'));
  await worker.tell({ kind: 'keep-page', path: '/cases/a/log', assets: ['/_next/static/chunks/lazy.js', '/api/cases/a'] });
  return worker;
}

describe('service worker', () => {
  it('serves a kept page, its scripts, styles and fonts without a network, and the page with its own nonce', async () => {
    const worker = await workerWithPage();
    expect(worker.told).toEqual([{ kind: 'page-kept', path: '/cases/a/log', isKept: true }]);
    worker.network.isUp = false;
    const page = await worker.navigate('/cases/a/log');
    expect(page?.headers.get('content-security-policy')).toContain("'nonce-n1'");
    expect(await page?.text()).toContain('nonce="n1"');
    const files = ['chunks/main.js', 'chunks/lazy.js', 'css/a.css', 'media/f.woff2'];
    const bodies = await Promise.all(files.map(async (file) => (await worker.load(`/_next/static/${file}`))?.text()));
    expect(bodies).toEqual(['main', 'lazy', '@font-face{src:url(../media/f.woff2)}', 'font']);
  });

  it('prefers the network for a page', async () => {
    const worker = await workerWithPage();
    worker.network.answers.set('/cases/a/log', html('n2', 'main'));
    expect((await worker.navigate('/cases/a/log'))?.headers.get('content-security-policy')).toContain("'nonce-n2'");
  });

  it('shows the kept page within 2 s when the network hangs, and when the server answers 503', async () => {
    const worker = await workerWithPage();
    worker.network.answers.set('/cases/a/log', () => new Promise<Response>(() => undefined));
    const startMs = performance.now();
    expect(await (await worker.navigate('/cases/a/log'))?.text()).toContain('nonce="n1"');
    expect(performance.now() - startMs).toBeLessThan(2200);
    worker.network.answers.set('/cases/a/log', () => new Response('down', { status: 503 }));
    expect(await (await worker.navigate('/cases/a/log'))?.text()).toContain('nonce="n1"');
  });

  it('never answers for another case, and says so in a sentence', async () => {
    const worker = await workerWithPage();
    worker.network.isUp = false;
    const page = await worker.navigate('/cases/b/log');
    expect(page?.status).toBe(503);
    expect(await page?.text()).toContain('No link to the server');
  });

  it.each(['/api/cases/a', '/api/session', '/socket.io/?EIO=4&transport=websocket', '/icon.svg'])('leaves %s alone', async (url) => {
    const worker = await workerWithPage();
    const asked = worker.network.asked.length;
    expect(await worker.load(url)).toBeUndefined();
    expect(await worker.navigate(url === '/icon.svg' ? '/api/x' : url)).toBeUndefined();
    expect(worker.network.asked).toHaveLength(asked);
  });

  it('leaves what is not a GET alone, and keeps no answer of the API when asked to', async () => {
    const worker = await workerWithPage();
    expect(await worker.load('/_next/static/chunks/main.js', 'POST')).toBeUndefined();
    worker.network.answers.set('/api/cases/a', html('n3', 'main'));
    await worker.tell({ kind: 'keep-page', path: '/api/cases/a', assets: [] });
    expect(worker.told.at(-1)).toEqual({ kind: 'page-kept', path: '/api/cases/a', isKept: false });
    const kept = [...worker.caches.values()].flatMap((cache) => [...cache.held.keys()]);
    expect(kept.filter((url) => url.includes('/api/'))).toEqual([]);
  });

  it('says that a page is not kept when one of its files is missing and no copy was there', async () => {
    const worker = await workerWithPage();
    worker.network.answers.set('/cases/b/log', html('n4', 'gone'));
    await worker.tell({ kind: 'keep-page', path: '/cases/b/log', assets: [] });
    expect(worker.told.at(-1)).toEqual({ kind: 'page-kept', path: '/cases/b/log', isKept: false });
  });

  it('after a reload without a network the page is said to be kept, for the older copy answers', async () => {
    const worker = await workerWithPage();
    worker.network.isUp = false;
    await worker.tell({ kind: 'keep-page', path: '/cases/a/log', assets: [] });
    expect(worker.told.at(-1)).toEqual({ kind: 'page-kept', path: '/cases/a/log', isKept: true });
  });

  it('serves the older copy on when a file of the newer page is missing', async () => {
    const worker = await workerWithPage();
    worker.network.answers.set('/cases/a/log', html('n4', 'gone'));
    await worker.tell({ kind: 'keep-page', path: '/cases/a/log', assets: [] });
    expect(worker.told.at(-1)).toEqual({ kind: 'page-kept', path: '/cases/a/log', isKept: true });
    worker.network.isUp = false;
    expect(await (await worker.navigate('/cases/a/log'))?.text()).toContain('nonce="n1"');
  });

  it('drops files that no kept page needs after a new build', async () => {
    const worker = await workerWithPage();
    worker.network.answers.set('/cases/a/log', html('n5', 'newer'));
    worker.network.answers.set('/_next/static/chunks/newer.js', () => new Response('newer'));
    await worker.tell({ kind: 'keep-page', path: '/cases/a/log', assets: [] });
    worker.network.isUp = false;
    expect(await (await worker.load('/_next/static/chunks/newer.js'))?.text()).toBe('newer');
    await expect(worker.load('/_next/static/chunks/main.js')).rejects.toThrow('Failed to fetch');
  });

  it('forgets pages at sign-out and caches of other versions when it starts', async () => {
    const worker = await workerWithPage();
    worker.caches.set('fascicle-pages-0', new FakeCache());
    await worker.activate();
    expect([...worker.caches.keys()]).not.toContain('fascicle-pages-0');
    await worker.tell({ kind: 'forget-pages' });
    worker.network.isUp = false;
    expect((await worker.navigate('/cases/a/log'))?.status).toBe(503);
  });
});
