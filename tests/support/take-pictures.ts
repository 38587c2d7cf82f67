/*
 * The pictures of the README, made from the running product: npm run pictures. They go to public/pictures, and are
 * committed when a screen has changed.
 */
import { mkdir } from 'node:fs/promises';
import path from 'node:path';

import { launchChromium } from '@/tests/support/chromium';
import { takeSession } from '@/tests/support/demo-session';
import { DeskPerson } from '@/tests/support/desk-person';
import { beConnected, loseAtElbow, planFollowed, retest, stableCase, untestedCase } from '@/tests/support/followed-cases';
import { buildForTests, root } from '@/tests/support/product-build';
import { startProduct } from '@/tests/support/start-product';
import { WallScreen } from '@/tests/support/wall-screen';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';

const folder = path.join(root, 'public/pictures');
await mkdir(folder, { recursive: true });
await buildForTests();
const product = await startProduct({ ownCluster: true });
const browser = await launchChromium();
try {
  const untested = await untestedCase(product);
  const calm = await stableCase(product);
  await planFollowed(product, { ...ulnarAtElbow, theatre: 'Theatre 4' });
  const alert = await stableCase(product, { theatre: 'Theatre 3', side: 'left', title: 'Left ulnar nerve, transposition' });
  const wall = await WallScreen.open(browser, product.url);
  await alert.pair(await wall.code());
  const desk = await DeskPerson.open(browser, product.url);
  await takeSession(desk.watched.context, product, 'desk@demo.example');
  await desk.goTo(`/cases/${alert.caseId}/log`);
  await wall.waitForLead(/^Stable$/);
  await alert.step('nerve-lifted', { agoS: 30 });
  await loseAtElbow(alert);
  await wall.waitForLead(/Ulnar at 3\d/);
  await desk.page.getByText(/^Alert (for|since) /).waitFor();
  await desk.page.setViewportSize({ width: 1440, height: 900 });
  await desk.page.screenshot({ path: path.join(folder, 'log.png') });
  await wall.page.setViewportSize({ width: 1920, height: 1080 });
  await wall.page.waitForTimeout(500);
  await wall.page.screenshot({ path: path.join(folder, 'wall.png') });
  const present = [await beConnected(product, untested), await beConnected(product, calm)];
  await retest(calm, 5);
  const physician = await DeskPerson.openSignedIn(browser, product.url, 'physician@demo.example');
  await physician.page.setViewportSize({ width: 400, height: 860 });
  await physician.goTo('/today');
  await physician.page.getByText('Not told yet').first().waitFor();
  await physician.page.screenshot({ path: path.join(folder, 'today.png') });
  for (const viewer of present) viewer.close();
} finally {
  await browser.close();
  await product.stop();
}
