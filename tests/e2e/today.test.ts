import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { alertCase, beConnected, loseAtElbow, retest, stableCase, untestedCase } from '@/tests/support/followed-cases';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import type { Viewer } from '@/tests/server/house/viewer';
import { plain } from '@/tests/support/wall-screen';

import { axeViolations } from './axe-violations';
import { oneJourney } from './one-journey';

const phone = { viewport: { width: 360, height: 780 } };
let product: Product;
let browser: Browser;
let alert: HttpDesk;
let untested: HttpDesk;
let stable: HttpDesk;
let desks: Viewer[];
let physician: DeskPerson;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  [alert, untested, stable] = [await alertCase(product), await untestedCase(product), await stableCase(product)];
  desks = await Promise.all([alert, untested, stable].map((http) => beConnected(product, http)));
  physician = await DeskPerson.openSignedIn(browser, product.url, 'physician@demo.example', phone);
});
afterAll(async () => {
  for (const desk of desks) desk.close();
  await browser.close();
  await product.stop();
});
oneJourney();

const titles = async () => (await physician.page.getByRole('list', { name: 'Live cases' }).getByRole('heading', { level: 2 }).allTextContents()).map(plain);
const rowOf = (title: string) => physician.page.getByRole('listitem').filter({ has: physician.page.getByRole('heading', { name: title }) });

test('the start leads the physician to Today, and the worst case stands first with its reason, above the fold of a telephone', async () => {
  await physician.goTo('/');
  await physician.page.waitForURL('**/today');
  await physician.page.getByText('Not told yet').first().waitFor();
  expect((await titles())[0]).toBe('Left ulnar nerve, transposition');
  const why = physician.page.getByText(/^Between above and below elbow\. Last good \d\d:\d\d, first seen \d\d:\d\d, after nerve lifted\. Not told yet\.$/).first();
  expect((await why.boundingBox())!.y + (await why.boundingBox())!.height).toBeLessThan(780);
  expect(await physician.page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(360);
  expect(await axeViolations(physician.page)).toEqual([]);
});

test('each case says its state, the age of its last test and who sits at the desk', async () => {
  await retest(stable, 1);
  await rowOf('Right ulnar nerve').getByText('Stable', { exact: true }).first().waitFor();
  await rowOf('Right ulnar nerve').getByText(/^Theatre 2\. Last test \d+\ss ago$/).waitFor();
  await rowOf('Right hip').getByText('Common fibular: not tested since hip reduced').first().waitFor();
  await rowOf('Right hip').getByText(/^Baseline of \d\d:\d\d provisional, waits for you$/).first().waitFor();
  await rowOf('Right hip').getByText(/^Desk connected since \d\d:\d\d\./).waitFor();
  expect(await titles()).toEqual(['Left ulnar nerve, transposition', 'Right hip replacement, sciatic nerve', 'Right ulnar nerve, transposition']);
});

test('a case that turns bad climbs while it is looked at, and the focus stays with its case', async () => {
  await physician.page.keyboard.press('ArrowDown');
  for (let press = 0; press < 2; press += 1) await physician.page.keyboard.press('ArrowDown');
  const focused = () => physician.page.evaluate(() => document.activeElement?.textContent ?? '');
  expect(await focused()).toMatch(/^Follow Right ulnar nerve/);
  await alert.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar at 36 per cent of baseline' });
  await loseAtElbow(stable);
  await physician.waitFor(async () => (await titles())[0] === 'Right ulnar nerve, transposition', 5000, 'the new alert on top');
  expect(await focused()).toMatch(/^Follow Right ulnar nerve/);
  await rowOf('Left ulnar nerve').getByText(/^Told \d\d:\d\d\.$/).first().waitFor();
});

test('a case whose desk leaves says since when', async () => {
  desks[2]!.close();
  await rowOf('Right ulnar nerve').getByText(/^Desk not connected since \d\d:\d\d\./).waitFor();
});

test('without the server every case is covered within 3 s, in the past tense, and an open alert keeps its mark', async () => {
  await product.stopServer();
  physician.watched.expectError(/./);
  const stoppedAt = performance.now();
  await physician.page.waitForFunction(() => [...document.querySelectorAll('[data-live]')].length === 3 && [...document.querySelectorAll('[data-live]')].every((layer) => Number(getComputedStyle(layer).opacity) === 1));
  expect(performance.now() - stoppedAt).toBeLessThan(3500);
  await rowOf('Right ulnar nerve').locator('[data-live]').getByText(/^Alert was open: ulnar (was )?at 3\d\s%/).waitFor();
  await rowOf('Right hip').locator('[data-live]').getByText(/^Not live\. State at \d\d:\d\d:\d\d\. It may have changed\./).waitFor();
  expect(await axeViolations(physician.page)).toEqual([]);
  await product.restart();
  await physician.page.waitForFunction(() => [...document.querySelectorAll('[data-live]')].every((layer) => Number(getComputedStyle(layer).opacity) === 0), null, { timeout: 20_000 });
});

test('Enter follows the case that has the focus', async () => {
  await physician.page.getByRole('link', { name: /^Follow Left ulnar nerve/ }).focus();
  await physician.page.keyboard.press('Enter');
  await physician.page.waitForURL(`**/cases/${alert.caseId}/follow`);
  await physician.page.getByRole('heading', { name: /^Ulnar at 36/ }).first().waitFor();
});

test('a case planned with the physician in its team stands below the live ones, and its examination is recorded before it is opened', async () => {
  const desk = await DeskPerson.openSignedIn(browser, product.url);
  await desk.planCase('Ulnar nerve at the elbow, transposition', async (person) => {
    await person.page.getByLabel('Supervising physician').selectOption({ label: 'Supervising physician' });
  });
  await desk.inDialog('Examination', async (dialog) => {
    await dialog.getByLabel('Examined by, as a role').fill('surgeon');
    await dialog.getByLabel('First dorsal interosseous').selectOption('4');
    await dialog.getByLabel('Little finger').selectOption('reduced');
    await dialog.getByRole('button', { name: 'Log examination' }).click();
  });
  await desk.page.getByText(/^Examination before the operation, by surgeon: First dorsal interosseous 4 of 5\. Little finger reduced/).waitFor();
  await physician.goTo('/today');
  await physician.page.getByRole('region', { name: 'Planned, not opened' }).getByRole('link', { name: 'Left ulnar nerve, transposition' }).waitFor();
  expect(desk.watched.errors()).toEqual([]);
  await desk.close();
});
