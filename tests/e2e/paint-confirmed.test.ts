import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import type { EntriesReply, WireEntry } from '@/lib/contracts/http/replies';
import { launchChromium } from '@/tests/support/chromium';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { adm } from '@/tests/support/ulnar-case';
import { WallScreen } from '@/tests/support/wall-screen';

let product: Product;
let browser: Browser;
let desk: HttpDesk;
const walls: WallScreen[] = [];

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  desk = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 1' });
  for (let count = 0; count < 2; count += 1) {
    const wall = await WallScreen.open(browser, product.url);
    await desk.pair(await wall.code());
    walls.push(wall);
  }
  await desk.openForBaseline();
  await desk.ulnarBaseline();
  await desk.testUlnar();
  for (const wall of walls) await wall.waitForLead(/./);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

const entriesOf = async (kind: string): Promise<readonly WireEntry[]> =>
  ((await desk.ask('GET', '/entries?after=0&limit=500')).body as EntriesReply).entries.filter((entry) => entry.kind === kind);

test('an alert on two walls is confirmed as painted once, within 3 s of its entry, in the name of a wall of this case', async () => {
  for (let count = 0; count < 2; count += 1) await desk.run('above-elbow', { adm: adm('above-elbow', 0.3) });
  for (const wall of walls) await wall.waitForStatement(/Ulnar/);
  const [raised] = await entriesOf('alert.raised');
  if (raised === undefined) throw new Error('The second run raised no alert.');
  // The notice before it was painted too: what counts here is what was painted since the alert.
  const since = async () => (await entriesOf('alert.painted')).filter((entry) => entry.seq > raised.seq);
  await expect.poll(async () => (await since()).length, { timeout: 5_000 }).toBe(1);
  const [painted] = await since();
  const screens = ((await desk.ask('GET', '/screens')).body as { screens: { screenId: string }[] }).screens.map(({ screenId }) => screenId);
  expect(painted?.author).toMatchObject({ role: 'screen', displayName: 'Theatre screen' });
  expect(screens).toContain(painted?.author.id);
  expect(painted?.body).toMatchObject({ alertId: 'ulnar-1', screenId: painted?.author.id });
  const tookMs = Date.parse(String(painted?.body?.['paintedAt'])) - Date.parse(raised.recordedAt);
  expect(tookMs).toBeGreaterThanOrEqual(-50);
  expect(tookMs).toBeLessThan(3_000);
  // Both walls show it and say so at every further entry; the log takes one.
  await desk.give({ name: 'send-message', text: 'Looking at the electrode' });
  await desk.run('wrist', { adm: adm('wrist') });
  for (const wall of walls) await expect.poll(() => wall.page.locator('main.wall').innerText(), { timeout: 5_000 }).toMatch(/Ulnar/);
  await new Promise((resolve) => setTimeout(resolve, 1_500));
  expect((await since()).length).toBe(1);
  for (const wall of walls) expect(wall.watched.errors()).toEqual([]);
});
