import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import type { DeskPerson } from '@/tests/support/desk-person';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import type { EntriesReply } from '@/lib/contracts/http/replies';

import { eventually } from './eventually';
import { openMonitoredDesk } from './monitored-desk';
import { typedAdm } from './ulnar-keys';

let product: Product;
let browser: Browser;
let desk: DeskPerson;
let http: HttpDesk;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  ({ desk, http } = await openMonitoredDesk(browser, product));
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

/** Enter as a hand that rests on it: the keyboard repeats it 30 times a second, for 1.5 s. */
async function holdEnter(): Promise<void> {
  for (let count = 0; count < 45; count += 1) {
    await desk.page.keyboard.down('Enter');
    await desk.page.waitForTimeout(33);
  }
  await desk.page.keyboard.up('Enter');
}

/** Entries of the case by kind, as the server has them. */
async function committed(kind: string): Promise<number> {
  const { entries } = (await http.ask('GET', '/entries?after=0&limit=500')).body as EntriesReply;
  return entries.filter((entry) => entry.kind === kind).length;
}

describe('Enter held down', () => {
  test('in a field of the run logs one run', async () => {
    const before = await committed('run.logged');
    await desk.focusSites();
    await desk.typeRun('4', [typedAdm('wrist', 0.99)]);
    await holdEnter();
    await eventually(() => committed('run.logged')).toBe(before + 1);
  });

  test('on "Log run" logs one run', async () => {
    const before = await committed('run.logged');
    await desk.focusSites();
    await desk.typeRun('4', [typedAdm('wrist', 0.98)]);
    await desk.button('Log run').focus();
    await holdEnter();
    await eventually(() => committed('run.logged')).toBe(before + 1);
  });

  test('on a step logs one step', async () => {
    const before = await committed('step.logged');
    await desk.button('Incision').focus();
    await holdEnter();
    await eventually(() => committed('step.logged')).toBe(before + 1);
  });

  test('on "Accept baseline" opens its question once and accepts nothing', async () => {
    const before = await committed('baseline.accepted');
    await desk.button('Accept baseline').focus();
    await holdEnter();
    expect(await desk.page.getByRole('dialog', { name: 'Accept baseline' }).count()).toBe(1);
    expect(await committed('baseline.accepted')).toBe(before);
    await desk.page.keyboard.press('Escape');
  });

  test('on "Close case" closes nothing, nor does a second press of the same hand; one more does', async () => {
    await desk.button('Close case').focus();
    await desk.page.keyboard.press('Enter');
    await desk.page.keyboard.press('Enter');
    await desk.page.keyboard.press('Escape');
    await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    await desk.button('Close case').focus();
    await holdEnter();
    expect(await committed('case.closed')).toBe(0);
    await desk.page.getByRole('dialog', { name: 'Close case' }).waitFor();
    await desk.page.keyboard.press('Enter');
    await eventually(() => committed('case.closed')).toBe(1);
    expect(desk.watched.errors()).toEqual([]);
  });
});
