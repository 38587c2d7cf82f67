import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { alertCase, stableCase } from '@/tests/support/followed-cases';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { chooseTheme } from '@/tests/support/theme-cookie';
import { adm } from '@/tests/support/ulnar-case';
import { wallCourse } from '@/tests/support/wall-course';
import { WallScreen } from '@/tests/support/wall-screen';

import { axeViolations } from './axe-violations';
import { openMonitoredDesk } from './monitored-desk';

let product: Product;
let browser: Browser;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

const themes = ['theatre', 'paper'] as const;
/** Questions of the log by the button that opens them; the alert's own need an open alert. */
const questions = ['Phase', 'Accept baseline', 'Measure distances', 'Pair a wall', 'Close case', 'Keys', 'Correct last run', 'Other step', 'Told', 'Surgeon’s action', 'End'];

test('the control: axe finds a button without a name', async () => {
  const page = await browser.newPage();
  await page.setContent('<html lang="en"><title>x</title><main><h1>x</h1><button></button></main></html>');
  expect((await axeViolations(page)).join()).toMatch(/button-name/);
  await page.close();
});

describe.each(themes)('in the theme "%s"', (theme) => {
  test('every page outside the log: 0', async () => {
    const desk = await DeskPerson.open(browser, product.url);
    await chooseTheme(desk.watched.context, product.url, theme);
    desk.watched.expectError(/status of 404/);
    const found: (readonly [string, readonly string[]])[] = [];
    const look = async (name: string) => void found.push([name, await axeViolations(desk.page)]);
    await desk.goTo('/sign-in');
    await desk.button('Surgeon').waitFor();
    await look('sign-in');
    await desk.signIn();
    await desk.page.getByRole('heading', { name: 'Cases' }).waitFor();
    await look('cases');
    for (const template of ['Ulnar nerve at the elbow, transposition', 'Sciatic nerve']) {
      await desk.goTo('/plan');
      const option = await desk.page.getByLabel('Template').locator('option').filter({ hasText: template.slice(0, 13) }).first().getAttribute('value');
      await desk.page.getByLabel('Template').selectOption(option);
      await look(`plan, ${template}`);
    }
    await desk.goTo('/nothing-here');
    await look('not found');
    expect(found.filter(([, violations]) => violations.length > 0)).toEqual([]);
    await desk.close();
  });

  test('the log, quiet, with an alert and with each of its questions, and the record: 0', async () => {
    const { desk, http } = await openMonitoredDesk(browser, product, {});
    await chooseTheme(desk.watched.context, product.url, theme);
    await desk.page.reload();
    await desk.focusSites();
    const found: (readonly [string, readonly string[]])[] = [];
    const look = async (name: string) => void found.push([name, await axeViolations(desk.page)]);
    await look('quiet');
    await http.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
    await desk.page.getByText(/^Notice (for|since) /).waitFor();
    await look('notice');
    await http.run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
    await desk.page.getByText(/^Alert (for|since) /).waitFor();
    await look('alert');
    for (const question of questions) {
      await desk.button(question).click();
      await desk.page.getByRole('dialog').waitFor();
      await look(question);
      await desk.page.keyboard.press('Escape');
      await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    }
    await desk.goTo(`/cases/${http.caseId}/record`);
    await desk.page.getByRole('heading', { name: 'Entries' }).waitFor();
    await look('record');
    expect(found.filter(([, violations]) => violations.length > 0)).toEqual([]);
    await desk.close();
  });
});

test.each(themes)('the physician’s pages, several cases, quiet and with an alert, in the theme "%s": 0', async (theme) => {
  const [alert, stable] = [await alertCase(product), await stableCase(product)];
  const physician = await DeskPerson.openSignedIn(browser, product.url, 'physician@demo.example');
  await chooseTheme(physician.watched.context, product.url, theme);
  const found: (readonly [string, readonly string[]])[] = [];
  const look = async (name: string) => void found.push([name, await axeViolations(physician.page)]);
  await physician.goTo('/today');
  await physician.page.getByText('Not told yet').first().waitFor();
  await look('today');
  for (const http of [alert, stable]) {
    await physician.goTo(`/cases/${http.caseId}/follow`);
    await physician.page.getByText('Live', { exact: true }).waitFor();
    await look('follow');
  }
  expect(found.filter(([, violations]) => violations.length > 0)).toEqual([]);
  expect(physician.watched.errors()).toEqual([]);
  await physician.close();
});

test('every state of the wall in both themes: 0', async () => {
  const walls = await Promise.all(themes.map(async (theme) => [theme, await WallScreen.open(browser, product.url, `?theme=${theme}`)] as const));
  const found: (readonly [string, string, readonly string[]])[] = [];
  const look = async (name: string) => {
    for (const [theme, wall] of walls) found.push([name, theme, await axeViolations(wall.page)]);
  };
  const http = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 3' });
  for (const [, wall] of walls) await wall.code();
  await look('not-paired');
  for (const [, wall] of walls) await http.pair(await wall.code());
  for (const { name, lead, play } of wallCourse) {
    await play(http);
    for (const [, wall] of walls) await wall.waitForLead(lead);
    await look(name);
  }
  expect(found).toHaveLength(2 * (wallCourse.length + 1));
  expect(found.filter(([, , violations]) => violations.length > 0)).toEqual([]);
});
