import path from 'node:path';
import type { Browser } from 'playwright-core';

import { DeskPerson } from '@/tests/support/desk-person';
import { recordCase } from '@/tests/support/record-case';
import type { Product } from '@/tests/support/start-product';
import { storeCase } from '@/tests/support/stored-case';
import { chooseTheme } from '@/tests/support/theme-cookie';

const sizes = [[390, 844], [1440, 900], [1920, 1080], [3840, 2160]] as const;

/** The record of a whole closed case as its reviewer reads it: the first window at each size, the whole page at most, and on paper. */
export async function shootRecord(browser: Browser, product: Product, folder: string): Promise<void> {
  const { caseId } = await storeCase(product, recordCase());
  const reviewer = await DeskPerson.openSignedIn(browser, product.url, 'reviewer@demo.example');
  await chooseTheme(reviewer.watched.context, product.url, 'paper');
  const { page } = reviewer;
  for (const [widthPx, heightPx] of sizes) {
    await page.setViewportSize({ width: widthPx, height: heightPx });
    await reviewer.goTo(`/cases/${caseId}/record`);
    await page.getByRole('heading', { name: 'Entries' }).waitFor();
    await page.evaluate(() => document.fonts.ready);
    const cutPx = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    if (cutPx > 0) process.stdout.write(`record-closed-${widthPx}: cut by ${cutPx} px\n`);
    await page.screenshot({ path: path.join(folder, `record-closed-${widthPx}.png`) });
    // The whole page at 3,840 px is a picture of a hundred million points: it outlasts the patience of a page.
    if (widthPx < 3840) await page.screenshot({ path: path.join(folder, `record-closed-whole-${widthPx}.png`), fullPage: true });
  }
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.pdf({ path: path.join(folder, 'record-closed.pdf'), preferCSSPageSize: true, printBackground: true });
  process.stdout.write(reviewer.watched.errors().map((error) => `${error}\n`).join(''));
  await reviewer.close();
}
