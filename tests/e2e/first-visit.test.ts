import type { Browser } from 'playwright-core';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { startProduct, type Product } from '@/tests/support/start-product';
import { ulnarSites } from '@/tests/support/ulnar-case';
import { WallScreen } from '@/tests/support/wall-screen';

import { eventually } from './eventually';
import { oneJourney } from './one-journey';
import { logBaselineByKeys, logUlnarByKeys } from './ulnar-keys';

let product: Product;
let browser: Browser;
let desk: DeskPerson;
let wall: WallScreen;

oneJourney();
beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  desk = await DeskPerson.open(browser, product.url);
  wall = await WallScreen.open(browser, product.url);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

/** The question of the README, with the columns it gives. */
async function storedAlerts(): Promise<readonly (readonly [kind: string, alert: string, percent: string | null])[]> {
  const client = new Client({ connectionString: product.database.adminUrl });
  await client.connect();
  const { rows } = await client.query<{ kind: string; alert: string; percent_of_baseline: string | null }>(
    `select c.reference, e.seq, e.kind, e.event_at, e.body->>'alertId' as alert, e.body->>'worstPercentOfBaseline' as percent_of_baseline
     from entries e join cases c on c.id = e.case_id
     where e.kind in ('notice.raised', 'alert.raised', 'alert.worsened', 'alert.told', 'alert.ended')
     order by e.case_id, e.seq`,
  );
  await client.end();
  return rows.map((row) => [row.kind, row.alert, row.percent_of_baseline] as const);
}

describe('a first visit, from the sign-in to the closed case', () => {
  test('a newcomer is in with two clicks, plans from the template, and opens the case', async () => {
    await desk.signIn();
    await desk.planCase('Ulnar nerve at the elbow, transposition');
    await desk.openCase();
    await desk.confirmTimeout('Left');
    await desk.changePhase('Baseline');
    expect(await desk.page.getByRole('heading', { level: 1 }).textContent()).toBe('Left ulnar nerve, transposition');
  });

  test('a wall is paired: the same two words on both sides', async () => {
    expect(await wall.waitForLead(/^Not paired$/)).toBe('Not paired');
    const code = await wall.code();
    expect(code).toMatch(/^[A-Z0-9]{6}$/);
    await desk.pairWall(code, async (words) => expect(words).toBe(await wall.words()));
    await wall.waitForLead(/^Ulnar: no baseline yet$/);
    await desk.page.getByText('Wall live', { exact: true }).waitFor();
  });

  test('three baseline runs at each site by keyboard alone, accepted, monitoring begun', async () => {
    await desk.focusSites();
    await logBaselineByKeys(desk);
    expect(await desk.runCount()).toBe(15);
    await desk.page.keyboard.press('c');
    await desk.answerDialog(async (dialog) => {
      await dialog.getByLabel('Count of 4').fill('4');
      await dialog.getByRole('button', { name: 'Log condition' }).click();
    });
    await desk.acceptBaseline();
    await desk.changePhase('Monitoring');
    await wall.waitForLead(/^Not tested since baseline$/);
  });

  test('check runs at every site earn "Stable"', async () => {
    await desk.focusSites();
    for (const site of ulnarSites) await logUlnarByKeys(desk, site, 0.98);
    await desk.logRunByKeys('5', [['3.30', '10.9']]);
    await wall.waitForLead(/^Stable$/);
  });

  test('a risk step takes it back', async () => {
    await desk.page.keyboard.press('l');
    await wall.waitForLead(/^Not tested since nerve lifted$/);
  });

  test('a fall is a notice, its repeat an alert, and both are in the database', async () => {
    await desk.focusSites();
    await logUlnarByKeys(desk, 'above-elbow', 0.4, 1.33);
    await wall.waitForLead(/^Ulnar at 40 % of baseline$/);
    await desk.page.getByText(/^Notice (for|since) /).waitFor();
    await logUlnarByKeys(desk, 'above-elbow', 0.38, 1.38);
    await wall.waitForLead(/^Ulnar at 38 % of baseline$/);
    await desk.page.getByText(/^Alert (for|since) /).waitFor();
    await logUlnarByKeys(desk, 'axilla', 0.36, 1.38);
    await logUlnarByKeys(desk, 'below-elbow', 0.98);
    await eventually(() => wall.picture()).toMatch(/Between above and below elbow/);
    const stored = await storedAlerts();
    expect(stored.map(([kind]) => kind).slice(0, 2)).toEqual(['notice.raised', 'alert.raised']);
    expect(stored[0]).toEqual(['notice.raised', 'ulnar-1', '40']);
    expect(stored[1]).toEqual(['alert.raised', 'ulnar-1', '38']);
  });

  test('a reload of either shows the same', async () => {
    for (const screen of [desk, wall]) {
      await eventually(() => wall.picture()).not.toMatch(/Desk not connected/);
      const before = await screen.picture();
      await screen.page.reload();
      await expect.poll(() => screen.picture().catch(() => ''), { timeout: 10_000 }).toBe(before);
    }
  });

  test('told, read back, action, two good runs, end: each by its key', async () => {
    for (const [key, action] of [['t', 'Told'], ['b', 'Read back']] as const) {
      await desk.page.keyboard.press(key);
      await desk.answerDialog((dialog) => dialog.getByRole('button', { name: action }).click());
    }
    await desk.page.keyboard.press('a');
    await desk.answerDialog(async (dialog) => {
      await dialog.getByRole('button', { name: 'Traction released' }).click();
      await dialog.getByRole('button', { name: 'Log surgeon’s action' }).click();
    });
    await eventually(() => wall.picture()).toMatch(/Told \d\d:\d\d/);
    await desk.focusSites();
    for (const site of ['above-elbow', 'above-elbow', 'axilla', 'axilla'] as const) await logUlnarByKeys(desk, site, 0.93, 0.05);
    await wall.waitForLead(/^Ulnar back at 93 % of baseline$/);
    await desk.page.keyboard.press('e');
    await desk.answerDialog(async (dialog) => {
      await dialog.getByRole('radio', { name: 'Full recovery' }).check();
      await dialog.getByLabel('Cause').selectOption({ label: 'Surgical' });
      await dialog.getByRole('button', { name: 'End' }).click();
    });
    await desk.page.keyboard.press('s');
    await logUlnarByKeys(desk, 'wrist', 0.97);
    await wall.waitForLead(/^Stable$/);
    expect((await storedAlerts()).map(([kind]) => kind)).toContain('alert.ended');
  });

  test('closing ends the wall in words', async () => {
    await desk.changePhase('Take-down');
    await wall.waitForLead(/^Take-down$/);
    await desk.inDialog('Close case', (dialog) => dialog.getByRole('button', { name: 'Close case' }).click());
    await wall.waitForLead(/^Case closed \d\d:\d\d$/);
    expect(await wall.picture()).toMatch(/Not monitored/);
    await desk.page.getByText('Case closed. Not monitored.').waitFor();
  });

  test('nothing of it was an error to Chromium', () => {
    expect([...desk.watched.errors(), ...wall.watched.errors()]).toEqual([]);
  });
});
