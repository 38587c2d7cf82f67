import path from 'node:path';
import type { Browser, Page } from 'playwright-core';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { DeskPerson } from '@/tests/support/desk-person';
import { alertCase, beConnected, planFollowed, retest, stableCase, untestedCase } from '@/tests/support/followed-cases';
import type { Product } from '@/tests/support/start-product';
import { chooseTheme } from '@/tests/support/theme-cookie';

const themes = ['theatre', 'paper'] as const;
type Shoot = (page: Page, name: string, theme: string) => Promise<void>;

/** The physician's pages: three cases on a telephone and on every size, one case followed quiet, with an alert, and not live. */
export async function shootToday(browser: Browser, product: Product, folder: string, shoot: Shoot): Promise<void> {
  const [alert, untested, stable] = [await alertCase(product), await untestedCase(product), await stableCase(product)];
  await planFollowed(product, { ...ulnarAtElbow, theatre: 'Theatre 4' });
  await untested.give({ name: 'send-message', text: 'Reduction done. Shall I test the fibular part first' });
  const desks = await Promise.all([alert, untested, stable].map((http) => beConnected(product, http)));
  const people = await Promise.all(
    themes.map(async (theme) => {
      const person = await DeskPerson.openSignedIn(browser, product.url, 'physician@demo.example');
      await chooseTheme(person.watched.context, product.url, theme);
      return { theme, person };
    }),
  );
  const each = async (name: string, act: (person: DeskPerson) => Promise<unknown>) => {
    for (const { theme, person } of people) {
      await act(person);
      await shoot(person.page, name, theme);
      for (const [kind, widthPx, heightPx] of [['phone', 360, 780], ['tablet', 820, 1180]] as const) {
        await person.page.setViewportSize({ width: widthPx, height: heightPx });
        await person.page.waitForTimeout(200);
        await person.page.screenshot({ path: path.join(folder, `${name}-${theme}-${kind}.png`) });
        await person.page.screenshot({ path: path.join(folder, `${name}-${theme}-${kind}-whole.png`), fullPage: true });
      }
    }
  };
  await retest(stable, 5);
  await each('today', async (person) => (await person.goTo('/today'), person.page.getByText('Not told yet').first().waitFor()));
  await retest(stable, 5);
  await each('follow-quiet', async (person) => (await person.goTo(`/cases/${stable.caseId}/follow`), person.page.getByRole('heading', { name: 'Stable' }).waitFor()));
  const physician = await alert.as('physician@demo.example');
  await physician.give({ name: 'give-advice', text: 'Release traction and test the axilla again' });
  await each('follow-alert', async (person) => (await person.goTo(`/cases/${alert.caseId}/follow`), person.page.getByRole('heading', { name: /Ulnar at 36/ }).first().waitFor()));
  await each('follow-untested', async (person) => (await person.goTo(`/cases/${untested.caseId}/follow`), person.page.getByRole('button', { name: /^Accept baseline/ }).waitFor()));
  for (const { person } of people) {
    await person.goTo(`/cases/${alert.caseId}/follow`);
    await person.page.getByRole('heading', { name: /Ulnar at 36/ }).first().waitFor();
  }
  await product.stopServer();
  for (const { person } of people) person.watched.expectError(/./);
  await each('follow-not-live', (person) => person.page.waitForFunction(() => Number(getComputedStyle(document.querySelector('[data-live]')!).opacity) === 1));
  await product.restart();
  for (const desk of desks) desk.close();
  process.stdout.write(people.flatMap(({ person }) => person.watched.errors()).map((error) => `${error}\n`).join(''));
}
