import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { WallScreen } from '@/tests/support/wall-screen';

let product: Product;
let browser: Browser;
let http: HttpDesk;
let desk: DeskPerson;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  http = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 1' });
  await http.openForBaseline();
  desk = await DeskPerson.open(browser, product.url);
  await desk.signIn();
  await desk.goTo(`/cases/${http.caseId}/log`);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

/** What the service worker holds, by cache. */
const heldByWorker = (page: Page) =>
  page.evaluate(async () => {
    const names = await caches.keys();
    const urls = await Promise.all(names.map(async (name) => (await (await caches.open(name)).keys()).map((request) => new URL(request.url).pathname)));
    return urls.flat();
  });

const say = async (text: string) => {
  const line = desk.page.getByRole('textbox', { name: 'Message' });
  await line.fill(text);
  await line.press('Enter');
};

async function committedTexts(): Promise<unknown[]> {
  const { body } = await http.ask('GET', '/entries?after=0&limit=500');
  return (body as { entries: { kind: string; body: { text?: string } | null }[] }).entries.filter((entry) => entry.kind === 'message.sent').map((entry) => entry.body?.text);
}

describe('a desk whose server goes away', () => {
  test('its page is kept, without anything of the interface and of the case', async () => {
    const path = `/cases/${http.caseId}/log`;
    await desk.waitFor(async () => (await heldByWorker(desk.page)).includes(path), 20_000, 'the page is kept');
    const held = await heldByWorker(desk.page);
    expect(held.filter((url) => !url.startsWith('/_next/static/') && url !== path)).toEqual([]);
    const html = await desk.page.evaluate(async (url) => (await (await caches.open('fascicle-pages-1')).match(url))?.text() ?? '', path);
    expect(html).toContain('nonce=');
    for (const word of ['Invented patient', 'DEMO-1', 'Ulnar', 'Theatre 1', 'Neurophysiologist']) expect(html).not.toContain(word);
  });

  test('reloaded without a server it shows the case, not live, and takes entries; they go up once and in order', async () => {
    await say('Before');
    await desk.page.getByText(/^Saved, entry/).waitFor();
    for (const pattern of [/ERR_CONNECTION_REFUSED|WebSocket|Failed to fetch|Failed to load resource|ERR_FAILED/]) desk.watched.expectError(pattern);
    await product.stopServer();
    await desk.page.getByText('No link', { exact: true }).waitFor();
    await desk.page.reload();
    await desk.page.getByRole('heading', { level: 1, name: ulnarAtElbow.title }).waitFor();
    await desk.page.getByText('No link', { exact: true }).waitFor();
    await say('First without link');
    await say('Second without link');
    await desk.page.getByText('No link, 2 waiting').waitFor();
    await desk.page.reload();
    await desk.page.getByText('No link, 2 waiting').waitFor();
    await product.restart();
    await desk.page.getByText(/^Saved, entry/).waitFor({ timeout: 15_000 });
    expect(await committedTexts()).toEqual(['Before', 'First without link', 'Second without link']);
    expect(desk.watched.errors()).toEqual([]);
  });

  test('forgets page and case at sign-out', async () => {
    await desk.goTo('/cases');
    await desk.signOut();
    await desk.waitFor(async () => (await heldByWorker(desk.page)).filter((url) => url.startsWith('/cases/')).length === 0, 10_000, 'no page is kept');
    const rows = await desk.page.evaluate(
      () =>
        new Promise<number[]>((resolve) => {
          const opening = indexedDB.open('fascicle-live');
          opening.onsuccess = () => {
            const stores = ['entries', 'cases', 'heads', 'session'];
            const transaction = opening.result.transaction(stores);
            const counts = stores.map((name) => transaction.objectStore(name).count());
            transaction.oncomplete = () => resolve(counts.map((count) => count.result));
          };
        }),
    );
    expect(rows).toEqual([0, 0, 0, 0]);
  });
});

describe('a wall whose server goes away', () => {
  test('is covered within 3 s and uncovered by itself when the server is back', async () => {
    const wall = await WallScreen.open(browser, product.url);
    await http.pair(await wall.code());
    await wall.waitForLead(/^Ulnar: no baseline yet$/);
    await desk.waitFor(async () => !(await wall.isCovered()), 10_000, 'the wall is live');
    wall.watched.expectError(/./);
    await product.kill9();
    const killedAtMs = performance.now();
    await desk.waitFor(() => wall.isCovered(), 3_200, 'the wall is covered');
    expect(performance.now() - killedAtMs).toBeGreaterThan(1_000);
    await product.restart();
    await desk.waitFor(async () => !(await wall.isCovered()), 15_000, 'the wall is live again');
  });
});
