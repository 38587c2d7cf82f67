import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import type { EntriesReply, WireEntry } from '@/lib/contracts/http/replies';
import { launchChromium } from '@/tests/support/chromium';
import type { DeskPerson } from '@/tests/support/desk-person';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';

import { openMonitoredDesk } from './monitored-desk';
import { oneJourney } from './one-journey';
import { logUlnarByKeys } from './ulnar-keys';

let product: Product;
let browser: Browser;
let desk: DeskPerson;
let http: HttpDesk;
/** What Chromium says while there is no server to answer. */
const noServer = /ERR_CONNECTION_REFUSED|ERR_CONNECTION_RESET|ERR_EMPTY_RESPONSE|ERR_INTERNET_DISCONNECTED|WebSocket connection|ERR_FAILED/;

oneJourney();
beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  ({ desk, http } = await openMonitoredDesk(browser, product));
  desk.watched.expectError(noServer);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

/** Runs that were logged after this entry, oldest first. */
async function runsAfter(seq: number): Promise<readonly WireEntry[]> {
  const { body } = await http.ask('GET', `/entries?after=${seq}&limit=200`);
  return (body as EntriesReply).entries.filter((entry) => entry.kind === 'run.logged');
}

async function headSeq(): Promise<number> {
  return ((await http.ask('GET', '/entries?after=0&limit=1')).body as EntriesReply).headSeq;
}

const waiting = (person: DeskPerson, words: string) => person.page.getByText(words, { exact: true }).waitFor();
const amplitudes = (runs: readonly WireEntry[]) => runs.map((entry) => (entry.body as { run?: unknown; readings: readonly { reading: { amplitudeUv?: number } }[] }).readings[0]?.reading.amplitudeUv);
let before = 0;

describe('a desk without its server', () => {
  test('loads its page and its case from this browser', async () => {
    await desk.page.waitForFunction(async () => (await caches.match(location.pathname)) !== undefined && navigator.serviceWorker.controller !== null);
    before = await headSeq();
    await product.stopServer();
    await waiting(desk, 'No link');
    await desk.page.reload();
    await desk.page.getByRole('radiogroup', { name: 'Site' }).waitFor();
    expect(await desk.runCount()).toBe(19);
  });

  test('takes runs by keyboard and shows them as waiting, also after another reload', async () => {
    await desk.focusSites();
    await logUlnarByKeys(desk, 'wrist', 0.96);
    await logUlnarByKeys(desk, 'below-elbow', 0.95);
    await waiting(desk, 'No link, 2 waiting');
    expect((await desk.runLines()).slice(0, 2).map((cells) => cells[9]?.startsWith('waiting'))).toEqual([true, true]);
    await desk.page.reload();
    await waiting(desk, 'No link, 2 waiting');
  });

  test('loses nothing when the browser tab dies without a word', async () => {
    const crash = await desk.watched.context.newCDPSession(desk.page);
    const isGone = desk.page.waitForEvent('crash');
    void crash.send('Page.crash').catch(() => undefined);
    await isGone;
    desk.watched.expectError(/the page crashed/);
    desk = await desk.openTab();
    desk.watched.expectError(noServer);
    await desk.goTo(`/cases/${http.caseId}/log`);
    await waiting(desk, 'No link, 2 waiting');
    await desk.focusSites();
    await logUlnarByKeys(desk, 'axilla', 0.94);
    await waiting(desk, 'No link, 3 waiting');
  });

  test('sends each once, in order, with the time it was logged', async () => {
    const startedAgainAt = new Date().toISOString();
    await product.restart();
    await desk.page.getByText(/^Saved, entry \d+$/).waitFor();
    const runs = await runsAfter(before);
    expect(amplitudes(runs)).toEqual([9020, 8740, 8080]);
    expect(runs.every((entry) => entry.eventAt < startedAgainAt && entry.recordedAt > startedAgainAt)).toBe(true);
    expect(await desk.runCount()).toBe(22);
    expect(desk.watched.errors()).toEqual([]);
  });
});

describe('what waits belongs to its person', () => {
  test('another person of the same browser neither sees nor sends it; its own person\'s next sign-in does', async () => {
    before = await headSeq();
    await desk.page.route('**/socket.io/**', (route) => route.abort());
    await product.stopServer();
    await waiting(desk, 'No link');
    await desk.focusSites();
    await logUlnarByKeys(desk, 'wrist', 0.9);
    await waiting(desk, 'No link, 1 waiting');
    await desk.page.close();
    await product.restart();
    await desk.watched.context.clearCookies();
    const other = await desk.openTab();
    other.watched.expectError(/status of 404/);
    // The page closes its own socket when the signed-in person changes, be it still connecting.
    other.watched.expectError(/WebSocket is closed before the connection is established/);
    await other.signIn('Neurophysiologist, other hospital');
    await other.goTo(`/cases/${http.caseId}/log`);
    await other.page.getByRole('heading', { name: 'Not found' }).waitFor();
    await other.goTo('/cases');
    await other.page.getByRole('heading', { name: 'No case yet' }).waitFor();
    expect(await runsAfter(before)).toEqual([]);
    await other.signOut();
    await other.signIn();
    await other.goTo(`/cases/${http.caseId}/log`);
    await other.page.getByText(/^Saved, entry \d+$/).waitFor();
    await expect.poll(async () => amplitudes(await runsAfter(before)), { timeout: 10_000 }).toEqual([8460]);
    expect(other.watched.errors()).toEqual([]);
  });
});
