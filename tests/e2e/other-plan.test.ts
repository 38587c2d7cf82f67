import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';

import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson, type TypedReading } from '@/tests/support/desk-person';
import { startProduct, type Product } from '@/tests/support/start-product';
import { WallScreen } from '@/tests/support/wall-screen';

import { eventually } from './eventually';
import { oneJourney } from './one-journey';

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

/** Another arm: the radial nerve past the spiral groove, 120 and 100 mm apart. 61.9 m/s and 62.5 m/s from the onsets below. */
const sites = [
  { old: 'Axilla', name: 'Upper arm', positionMm: '0', key: '7', first: '12', typed: ['5.60', '6.0'] },
  { old: 'Above elbow', name: 'Spiral groove', positionMm: '120', key: '8', first: '12', typed: ['3.66', '6.2'] },
  { old: 'Below elbow', name: 'Elbow crease', positionMm: '220', key: '9', first: '10', typed: ['2.06', '6.5'] },
] as const;

/** Replaces nerve, sites, channels, step keys: everything by its label on the page. */
async function replaceNerve({ page, button }: Pick<DeskPerson, 'page'> & { button: (name: string) => ReturnType<DeskPerson['button']> }): Promise<void> {
  const fill = (label: string, value: string) => page.getByLabel(label, { exact: true }).fill(value);
  await page.getByRole('radio', { name: 'Right' }).check();
  await page.getByLabel('Theatre').selectOption('Theatre 5');
  await fill('Procedure', 'Radial nerve at the humerus');
  await fill('Title of the case', 'Right radial nerve, plate removal');
  await page.getByRole('group', { name: 'Nerve 1' }).getByLabel('Nerve', { exact: true }).fill('Radial');
  await button('Remove site Wrist').click();
  for (const site of sites) {
    await fill(`Position of ${site.old}`, site.positionMm);
    await fill(`Key of ${site.old}`, site.key);
    await fill(`First current at ${site.old}`, site.first);
    await fill(`Name of ${site.old}`, site.name);
  }
  await fill('Key of Wrist, median', '0');
  await button('Remove channel FDI').click();
  await fill('Full name of ADM', 'Extensor indicis');
  await fill('Position of ADM', '360');
  await fill('Short name of ADM', 'EI');
  await fill('Key of Nerve lifted', 'z');
  await fill('Nerve lifted after the word since', 'plate lifted');
  await fill('Name of Nerve lifted', 'Plate lifted');
}

const logSite = (index: 0 | 1 | 2, share = 1, isFirst = false) => {
  const { key, typed } = sites[index];
  const reading: TypedReading = [typed[0], (Number(typed[1]) * share).toFixed(2)];
  return desk.logRunByKeys(key, [reading], { tickSupramaximal: isFirst });
};

test('nerve, sites, distances, channel, side, theatre and keys are replaced on the plan page', async () => {
  await desk.signIn();
  await desk.planCase('Ulnar nerve at the elbow, transposition', (person) => replaceNerve({ page: person.page, button: (name) => person.button(name) }));
  await desk.openCase();
  await desk.confirmTimeout('Right');
  await desk.changePhase('Baseline');
  await desk.pairWall(await wall.code(), async (words) => expect(words).toBe(await wall.words()));
  await wall.waitForLead(/^Radial: no baseline yet$/);
  expect(await wall.picture()).toMatch(/Theatre 5, right/);
  const names = await desk.page.getByRole('radiogroup', { name: 'Site' }).getByRole('radio').allInnerTexts();
  expect(names.map((name) => name.replace(/\s+/g, ' '))).toEqual(['Upper arm 7', 'Spiral groove 8', 'Elbow crease 9', 'Wrist, median 0']);
});

test('its own digits log its baseline, its velocities are its own', async () => {
  await desk.focusSites();
  for (const index of [0, 1, 2] as const) for (let count = 0; count < 3; count += 1) await logSite(index, 1, count === 0);
  await desk.acceptBaseline('Train-of-four not at hand');
  await desk.changePhase('Monitoring');
  await desk.focusSites();
  for (const index of [2, 1, 0] as const) await logSite(index);
  await wall.waitForLead(/^Stable$/);
  const velocities = (await desk.runLines()).slice(0, 2).map((cells) => cells[8]);
  expect(velocities.map((text) => text?.split(' ')[0])).toEqual(['62', '63']);
});

test('the old keys do nothing, the new one logs the step', async () => {
  await desk.page.keyboard.press('l');
  await desk.page.keyboard.press('z');
  await wall.waitForLead(/^Not tested since plate lifted$/);
  expect((await desk.page.getByRole('region', { name: 'Log' }).innerText()).match(/Plate lifted/g)).toHaveLength(1);
});

test('notice and alert name the nerve, the muscle and the place of this plan', async () => {
  await desk.focusSites();
  await logSite(0, 0.35);
  await wall.waitForLead(/^Radial at 35 % of baseline$/);
  await logSite(0, 0.33);
  await wall.waitForLead(/^Radial at 33 % of baseline$/);
  await logSite(1, 0.98);
  await logSite(2, 0.98);
  await eventually(() => wall.picture()).toMatch(/Between upper arm and spiral groove/);
  expect(await desk.page.getByText(/^Say this/).locator('..').innerText()).toMatch(/Radial, EI, at 33 per cent of baseline, between upper arm and spiral groove, since plate lifted\./);
  const shown = `${await wall.picture()} ${await desk.picture()}`;
  expect(shown).not.toMatch(/ulnar|ADM|axilla|nerve lifted/i);
  expect([...desk.watched.errors(), ...wall.watched.errors()]).toEqual([]);
});
