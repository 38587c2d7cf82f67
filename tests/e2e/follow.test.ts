import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { loseAtElbow, planFollowed } from '@/tests/support/followed-cases';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { WallScreen } from '@/tests/support/wall-screen';

import { oneJourney } from './one-journey';

let product: Product;
let browser: Browser;
let http: HttpDesk;
let desk: DeskPerson;
let physician: DeskPerson;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  http = await planFollowed(product, { ...ulnarAtElbow, theatre: 'Theatre 3' });
  await http.openForBaseline({ agoS: 1200 });
  await http.ulnarBaseline({ agoS: 900 });
  await http.testUlnar(0.98, { agoS: 20 });
  desk = await DeskPerson.openSignedIn(browser, product.url);
  await desk.goTo(`/cases/${http.caseId}/log`);
  await desk.focusSites();
  physician = await DeskPerson.openSignedIn(browser, product.url, 'physician@demo.example');
  await physician.goTo(`/cases/${http.caseId}/follow`);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});
oneJourney();

test('the case is there live, with its state as on the wall and the desk that is connected', async () => {
  await physician.page.getByRole('heading', { name: 'Stable' }).waitFor();
  await physician.page.getByText('Live', { exact: true }).waitFor();
  await physician.page.getByText(/^Desk connected since/).waitFor();
  await physician.page.getByRole('img', { name: /axilla/i }).waitFor();
});

test('the physician accepts the provisional baseline, once', async () => {
  await physician.page.getByText(', provisional').waitFor();
  await physician.page.getByRole('button', { name: /^Accept baseline/ }).click();
  await physician.page.getByText(', provisional').waitFor({ state: 'detached' });
  expect(await physician.page.getByRole('button', { name: /^Accept baseline/ }).count()).toBe(0);
  await desk.page.getByText(/Baseline accepted by the physician/).first().waitFor();
});

test('a message and its answer stand on both sides', async () => {
  await physician.page.getByLabel('To the desk').fill('Which electrode');
  await physician.page.keyboard.press('Enter');
  await desk.page.getByRole('region', { name: 'Messages' }).getByText('Which electrode').waitFor();
  await desk.page.keyboard.press('m');
  await desk.page.keyboard.type('Surface');
  await desk.page.keyboard.press('Enter');
  await physician.page.getByRole('complementary').getByText('Surface').waitFor();
  expect(await physician.page.getByLabel('To the desk').inputValue()).toBe('');
});

test('advice stands at the desk until one key confirms it, and the physician sees that', async () => {
  await physician.page.getByLabel('To the desk').fill('Test the axilla next');
  await physician.button('Give advice').click();
  await physician.page.getByText('Not confirmed by the desk yet').waitFor();
  await desk.page.getByRole('region', { name: 'Advice of the physician' }).getByText('Test the axilla next').waitFor();
  await desk.focusSites();
  await desk.page.keyboard.press('v');
  await desk.page.getByRole('region', { name: 'Advice of the physician' }).waitFor({ state: 'detached' });
  await physician.page.getByText(/^Confirmed by the desk \d\d:\d\d$/).waitFor();
});

test('an alert comes with its moments; a paired wall that does not paint it is named at the desk within 5 s', async () => {
  const wall = await WallScreen.open(browser, product.url);
  await http.pair(await wall.code());
  await wall.waitForLead(/^Stable$/);
  await desk.page.getByText('Wall live').waitFor();
  // The wall's machine is gone: it is bound to the case and shows nothing.
  await wall.watched.context.close();
  await loseAtElbow(http);
  const raisedAt = performance.now();
  await desk.page.getByText('Wall not confirmed', { exact: true }).waitFor();
  expect(performance.now() - raisedAt).toBeLessThan(6000);
  await physician.page.getByRole('heading', { name: /^Alert: Ulnar at 36/ }).waitFor();
  const moments = physician.page.getByRole('article').filter({ hasText: 'First bad' });
  expect((await moments.locator('dl > div').allTextContents()).map((text) => text.replace(/\d\d:\d\d:\d\d/, 'time'))).toEqual([
    'Last goodtime', 'First badtime', 'Raisedtime', 'Painted on a wallnot yet', 'Toldnot yet', 'Read backnot yet', 'Surgeon’s actionnot yet', 'Retestnot yet',
  ]);
});

test('a wall that comes back confirms, and both sides read when', async () => {
  const wall = await WallScreen.open(browser, product.url);
  await http.pair(await wall.code());
  await wall.waitForLead(/^Ulnar at 36/);
  await desk.page.getByText(/On the wall \d\d:\d\d:\d\d/).first().waitFor();
  await desk.page.getByText('Wall not confirmed', { exact: true }).waitFor({ state: 'detached' });
  await physician.page.getByText('Painted on a wall').locator('..').getByText(/^\d\d:\d\d:\d\d$/).waitFor();
  await wall.watched.context.close();
});

test('without the server the picture is covered in the past tense, what is written waits, and goes up by itself', async () => {
  await product.stopServer();
  for (const person of [desk, physician]) person.watched.expectError(/./);
  await physician.page.waitForFunction(() => Number(getComputedStyle(document.querySelector('[data-live]')!).opacity) === 1);
  await physician.page.getByText(/^Alert was open: ulnar (was )?at 3\d/).waitFor();
  await physician.page.getByText(/^State at \d\d:\d\d:\d\d\. It may have changed\.$/).waitFor();
  await physician.page.getByText(/^Not live since \d\d:\d\d:\d\d$/).waitFor();
  await physician.page.getByLabel('To the desk').fill('Written without a link');
  await physician.page.keyboard.press('Enter');
  await physician.page.getByText('Waits in this browser, not sent yet').waitFor();
  await product.restart();
  await physician.page.getByText('Waits in this browser, not sent yet').waitFor({ state: 'detached', timeout: 20_000 });
  await desk.page.getByRole('region', { name: 'Messages' }).getByText('Written without a link').waitFor({ timeout: 20_000 });
  await physician.page.getByText('Live', { exact: true }).waitFor();
});

test('the surgeon and strangers: who is not in the team does not find the case', async () => {
  const surgeon = await DeskPerson.openSignedIn(browser, product.url, 'surgeon@demo.example');
  surgeon.watched.expectError(/status of 404/);
  await surgeon.goTo(`/cases/${http.caseId}/follow`);
  expect(await surgeon.page.getByRole('heading', { name: 'Stable' }).count()).toBe(0);
  expect(await surgeon.page.getByLabel('To the desk').count()).toBe(0);
  await surgeon.close();
});

test('nothing was printed to the consoles', () => {
  expect([...desk.watched.errors(), ...physician.watched.errors()]).toEqual([]);
});
