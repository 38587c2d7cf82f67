import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import type { DeskPerson } from '@/tests/support/desk-person';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { adm } from '@/tests/support/ulnar-case';

import { eventually } from './eventually';
import { openMonitoredDesk } from './monitored-desk';

let product: Product;
let browser: Browser;
let desk: DeskPerson;
let http: HttpDesk;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  ({ desk, http } = await openMonitoredDesk(browser, product));
  for (let count = 0; count < 2; count += 1) await http.run('above-elbow', { adm: adm('above-elbow', 0.4) });
  await desk.page.getByText(/^Alert (for|since) /).waitFor();
});
beforeEach(() => desk.page.setViewportSize({ width: 1440, height: 900 }));
afterAll(async () => {
  await browser.close();
  await product.stop();
});

const headline = /Ulnar at 40\s% of baseline/;

/** Words of an open alert that nothing is painted over: the topmost thing at the ends and the middle of each line is the alert's own. */
async function readableAlerts(): Promise<string[]> {
  return desk.page.evaluate(() => {
    const before = document.body.style.pointerEvents;
    document.body.style.pointerEvents = 'auto';
    const isUncovered = (line: Element) => {
      const box = line.getBoundingClientRect();
      const inside = box.width > 0 && box.top >= 0 && box.bottom <= innerHeight && box.right <= innerWidth;
      const points = [0.02, 0.5, 0.98].map((share) => document.elementFromPoint(box.left + box.width * share, box.top + box.height / 2));
      return inside && points.every((top) => top !== null && line.closest('[data-band="high"]')?.contains(top) === true);
    };
    const lines = [...document.querySelectorAll('[data-band="high"] h2, [data-band="high"] p')].filter(isUncovered).map((line) => line.textContent ?? '');
    document.body.style.pointerEvents = before;
    return lines;
  });
}

const questions = ['Told', 'End', 'Phase', 'Accept baseline', 'Measure distances', 'Pair a wall', 'Close case', 'Keys', 'Correct last run', 'Other step', 'Condition'];

describe('an open alert', () => {
  test.each([[1440, 900], [1920, 1080], [1024, 768], [760, 900]] as const)('stays readable at full strength while a question is open, %i × %i', async (width, height) => {
    await desk.page.setViewportSize({ width, height });
    for (const question of questions) {
      await desk.button(question).click();
      await desk.page.getByRole('dialog').waitFor();
      expect({ question, lines: await readableAlerts() }).toEqual({ question, lines: expect.arrayContaining([expect.stringMatching(headline)]) });
      await desk.page.keyboard.press('Escape');
      await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    }
  });

  test('is named where the case would be closed, and one Enter goes on to ending it', async () => {
    await desk.button('Close case').focus();
    await desk.page.keyboard.press('Enter');
    const dialog = desk.page.getByRole('dialog', { name: 'Close case: an alert is open' });
    expect(await dialog.innerText()).toMatch(headline);
    await desk.page.keyboard.press('Enter');
    await desk.page.getByRole('dialog', { name: 'End: how it came out' }).waitFor();
    await desk.page.keyboard.press('Escape');
    await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    expect(await desk.button('Close case').count()).toBe(1);
  });
});

describe('the focus after a question', () => {
  const focused = () => desk.page.evaluate(() => document.activeElement?.textContent ?? '');

  test.each([
    ['its button', async () => desk.button('Phase').focus(), 'Enter', /^Phase/],
    ['the site, when a key opened it', async () => desk.focusSites(), 't', /^(Axilla|Above elbow|Below elbow|Wrist)/],
  ])('goes back to %s', async (_what, stand, key, name) => {
    await stand();
    await desk.page.keyboard.press(key);
    await desk.page.getByRole('dialog').waitFor();
    await desk.page.keyboard.press('Escape');
    await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    await eventually(focused).toMatch(name);
  });

  test('the log goes on by keyboard after the surgeon was told', async () => {
    await desk.focusSites();
    await desk.page.keyboard.press('t');
    await desk.page.getByRole('dialog').waitFor();
    await desk.page.keyboard.press('Enter');
    await desk.page.getByRole('dialog').waitFor({ state: 'detached' });
    await desk.logRunByKeys('4', [['2.90', '9.3']]);
    expect(desk.watched.errors()).toEqual([]);
  });
});
