import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import type { DeskPerson } from '@/tests/support/desk-person';
import type { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';

import { eventually } from './eventually';
import { openMonitoredDesk } from './monitored-desk';
import { logUlnarByKeys, typedAdm } from './ulnar-keys';

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

const press = (...keys: string[]) => keys.reduce((before, key) => before.then(() => desk.page.keyboard.press(key)), Promise.resolve());
/** The sentence beside a field or under the form; empty text when there is none. */
const sentences = async () => (await desk.page.getByRole('form', { name: 'Next run' }).locator('[role=alert], [role=status]').allInnerTexts()).join(' | ');

/** Begins anew: nothing typed, focus on the sites. */
async function anew(): Promise<void> {
  await desk.page.reload();
  await desk.focusSites();
}

describe('slips of the hand', () => {
  test('Enter three times logs once', async () => {
    const before = await desk.runCount();
    await desk.typeRun('4', [typedAdm('wrist', 0.99)]);
    await press('Enter', 'Enter', 'Enter');
    await desk.waitForRuns(before + 1);
    await logUlnarByKeys(desk, 'wrist', 0.98);
    expect(await desk.runCount()).toBe(before + 2);
  });

  test('a digit outside the site group chooses nothing', async () => {
    await desk.button('Log run').focus();
    const chosen = () => desk.page.getByRole('radio', { checked: true }).first().innerText();
    const before = await chosen();
    await press('1', '2', '3');
    expect(await chosen()).toBe(before);
    await desk.page.getByLabel('Note').fill('');
    await desk.page.getByLabel('Note').focus();
    await desk.page.keyboard.type('2 turns, let go');
    expect([await chosen(), await desk.page.getByLabel('Note').inputValue(), await desk.page.getByRole('dialog').count()]).toEqual([before, '2 turns, let go', 0]);
    await anew();
  });

  test('a letter inside a half-typed number does nothing and says why', async () => {
    const steps = async () => (await desk.page.getByRole('region', { name: 'Log' }).innerText()).match(/Nerve lifted/g)?.length ?? 0;
    const before = await steps();
    await press('4');
    await desk.page.keyboard.type('2.9');
    await press('l');
    await eventually(async () => desk.page.getByRole('main').innerText()).toMatch(/Key L not taken/);
    expect([await steps(), await desk.page.getByLabel('Onset of ADM, ms').inputValue()]).toEqual([before, '2.9']);
    await anew();
  });

  test('a velocity that no nerve has is asked back with the likely cause, and logs only when confirmed', async () => {
    const before = await desk.runCount();
    // Distances typed in cm: 46 mm from axilla to wrist instead of 460.
    await desk.inDialog('Measure distances', async (dialog) => {
      for (const [name, position] of [['Axilla', '0'], ['Above elbow', '15'], ['Below elbow', '25'], ['Wrist', '46']] as const) await dialog.getByLabel(name, { exact: true }).fill(position);
      await dialog.getByRole('button', { name: 'Log distances' }).click();
    });
    await desk.focusSites();
    // The run at the wrist makes a pair with the fresh one from below the elbow.
    await desk.typeRun('4', [typedAdm('wrist')]);
    await press('Enter');
    const question = desk.page.getByRole('alertdialog', { name: 'Unlikely value' });
    // 21 mm in 3.56 ms are 5.9 m/s.
    expect(await question.innerText()).toMatch(/5\.9 m\/s between below elbow and wrist over 21 mm\. Under 10 m\/s: is a distance in centimetres typed as millimetres\?/);
    await press('Enter');
    await question.waitFor({ state: 'detached' });
    expect(await desk.runCount()).toBe(before);
    await press('Enter');
    await question.getByRole('button', { name: 'Log as typed' }).click();
    await desk.waitForRuns(before + 1);
  });

  test('0 mV is refused with what to do instead', async () => {
    await anew();
    const before = await desk.runCount();
    await desk.typeRun('4', [['2.90', '0']]);
    await press('Enter');
    await eventually(sentences).toMatch(/no response/i);
    expect(await desk.runCount()).toBe(before);
    await anew();
  });

  test.each([
    ['onset', '290', 'Onset of ADM, ms', /290 ms is out of range: 0\.1 to 100 ms is allowed\. .*later than 100 ms is no direct response/],
    ['onset', '-2.9', 'Onset of ADM, ms', /-2\.9 ms is out of range/],
    ['amplitude', '9400', 'Amplitude of ADM, mV', /9400 mV is out of range: 0 to 100 mV is allowed/],
    ['current', '150', 'Intensity', /150 mA is out of range: 0 to 100 mA is allowed\. Nerve stimulators deliver up to 100 mA/],
    ['pulse width', '5', 'Pulse width', /5 µs is out of range: 10 to 2000 µs is allowed/],
    ['half a number', '2..9', 'Onset of ADM, ms', /“2\.\.9” is no number/],
  ])('an out-of-range %s of %s gets a sentence at its field and logs nothing', async (_, typed, label, sentence) => {
    await anew();
    const before = await desk.runCount();
    await desk.typeRun('4', [typedAdm('wrist')]);
    await desk.page.getByLabel(label, { exact: true }).fill(typed);
    await press('Enter');
    await eventually(sentences).toMatch(sentence);
    expect(await desk.page.getByLabel(label, { exact: true }).getAttribute('aria-invalid')).toBe('true');
    expect(await desk.runCount()).toBe(before);
  });

  test('latencies exchanged are asked back', async () => {
    const fresh = await openMonitoredDesk(browser, product);
    await fresh.desk.logRunByKeys('4', [typedAdm('wrist')]);
    await fresh.desk.typeRun('3', [['2.10', '9.2']]);
    await fresh.desk.page.keyboard.press('Enter');
    expect(await fresh.desk.page.getByRole('alertdialog').innerText()).toMatch(/Latencies exchanged, or a wrong site chosen\?/);
    expect(fresh.desk.watched.errors()).toEqual([]);
    await fresh.desk.close();
  });

  test('none of it was an error to Chromium, and the log holds what was confirmed', async () => {
    expect(desk.watched.errors()).toEqual([]);
    expect((await http.ask('GET', '/entries?after=0&limit=5')).status).toBe(200);
  });
});
