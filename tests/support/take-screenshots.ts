/*
 * Pictures of every page and every state of the wall, played through the real product, for the eye:
 * node --import tsx tests/support/take-screenshots.ts [desk|wall|today] [--width=1440]. They go to tests/.out/screens.
 */
import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import type { Browser, Page } from 'playwright-core';

import { sciaticAtHip } from '@/lib/reference/templates/sciatic-at-hip';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';
import { launchChromium } from '@/tests/support/chromium';
import { DeskPerson } from '@/tests/support/desk-person';
import { takeSession } from '@/tests/support/demo-session';
import { HttpDesk } from '@/tests/support/http-desk';
import { shootRecord } from '@/tests/support/shoot-record';
import { buildForTests, root } from '@/tests/support/product-build';
import { startProduct, type Product } from '@/tests/support/start-product';
import { chooseTheme } from '@/tests/support/theme-cookie';
import { shootToday } from '@/tests/support/today-pictures';
import { adm, apb } from '@/tests/support/ulnar-case';
import { wallCourse } from '@/tests/support/wall-course';
import { WallScreen } from '@/tests/support/wall-screen';

const folder = path.join(root, 'tests/.out/screens');
const words = process.argv.slice(2);
const width = words.find((word) => word.startsWith('--width='))?.slice('--width='.length);
const sizes = ([[1440, 900], [1920, 1080], [3840, 2160]] as const).filter(([size]) => width === undefined || String(size) === width);
const themes = ['theatre', 'paper'] as const;
const wants = (part: string) => !words.some((word) => !word.startsWith('--')) || words.includes(part);

/** One picture for each size. What does not fit the window is named, so that nobody has to find it by eye. */
async function shoot(page: Page, name: string, theme: string): Promise<void> {
  for (const [widthPx, heightPx] of sizes) {
    await page.setViewportSize({ width: widthPx, height: heightPx });
    await page.evaluate(() => document.fonts.ready);
    // A wall sets its type anew after each change of size; what is still cut after that is named below.
    await page.waitForFunction(() => (document.querySelector('main.wall')?.scrollHeight ?? 0) <= window.innerHeight + 1, null, { timeout: 3000 }).catch(() => undefined);
    await page.waitForTimeout(150);
    const cut = await page.evaluate(() => {
      const wall = document.querySelector('main.wall') ?? document.documentElement;
      return [wall.scrollWidth - wall.clientWidth, document.querySelector('main.wall') === null ? 0 : wall.scrollHeight - wall.clientHeight];
    });
    if (cut.some((px) => px > 0)) process.stdout.write(`${name}-${theme}-${widthPx}: cut by ${cut.join(', ')} px\n`);
    await page.screenshot({ path: path.join(folder, `${name}-${theme}-${widthPx}.png`) });
  }
}

const lesion = async (http: HttpDesk) => {
  await http.run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) }, {}, { agoS: 3 });
  await http.run('axilla', { adm: adm('axilla', 0.36, 1.38) }, {}, { agoS: 2 });
  await http.run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01) }, {}, { agoS: 1 });
  await http.run('wrist', { adm: adm('wrist', 0.99) }, {});
};

/** The case of the design, up to the step after which the nerve fails. */
async function quietCase(product: Product): Promise<HttpDesk> {
  const http = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 3' });
  await http.openForBaseline({ agoS: 3600 });
  await http.ulnarBaseline({ agoS: 3000 });
  await http.step('incision', { agoS: 2400 });
  await http.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: 'nurse' }, { agoS: 2300 });
  await http.give({ name: 'log-condition', condition: { kind: 'limb-temperature', temperatureC: 32.4 }, reportedBy: null }, { agoS: 2200 });
  await http.give({ name: 'log-condition', condition: { kind: 'mean-pressure', pressureMmHg: 78 }, reportedBy: 'anaesthetist' }, { agoS: 420 });
  await http.step('nerve-lifted', { agoS: 380 });
  await http.testUlnar(0.98, { agoS: 200 });
  await http.run('median-wrist', { apb: apb(0.99) }, {}, { agoS: 190 });
  return http;
}

/** Cases beside the one that is monitored: one planned, one closed. */
async function fillList(product: Product): Promise<void> {
  await HttpDesk.plan(product, { ...sciaticAtHip, title: sciaticAtHip.title.replace('Left', 'Right'), theatre: 'Theatre 1', side: 'right' });
  const closed = await HttpDesk.plan(product, { ...ulnarAtElbow, title: 'Right ulnar nerve, decompression', side: 'right', theatre: 'Theatre 5' });
  await closed.give({ name: 'open-case', clockOffsetMs: 0 }, { agoS: 900 });
  await closed.give({ name: 'close-case', text: null }, { agoS: 600 });
}

async function shootDesk(browser: Browser, product: Product): Promise<void> {
  const http = await quietCase(product);
  const desks = await Promise.all(
    themes.map(async (theme) => {
      const desk = await DeskPerson.open(browser, product.url);
      await chooseTheme(desk.watched.context, product.url, theme);
      return { theme, desk };
    }),
  );
  const each = async (name: string, act: (desk: DeskPerson) => Promise<unknown>) => {
    for (const { theme, desk } of desks) {
      await act(desk);
      await shoot(desk.page, name, theme);
    }
  };
  await each('sign-in', async (desk) => (await desk.goTo('/sign-in'), desk.button('Surgeon').waitFor()));
  await fillList(product);
  // One code signs in once: both browsers take the session of the desk that planned.
  await each('cases', async (desk) => (await takeSession(desk.watched.context, product, 'desk@demo.example'), await desk.goTo('/cases'), desk.page.getByRole('link', { name: /^Log of/ }).first().waitFor()));
  await each('plan', async (desk) => (await desk.goTo('/plan'), desk.button('Plan case').waitFor()));
  for (const { theme, desk } of desks) await desk.page.screenshot({ path: path.join(folder, `plan-whole-${theme}.png`), fullPage: true });
  const toLog = async (desk: DeskPerson) => (await desk.goTo(`/cases/${http.caseId}/log`), desk.focusSites());
  await each('log-quiet', toLog);
  await http.step('nerve-lifted', { agoS: 30 });
  await http.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) }, {}, { agoS: 3 });
  await each('log-notice', async (desk) => desk.page.getByText(/^Notice (for|since) /).waitFor());
  await lesion(http);
  await each('log-alert', async (desk) => desk.page.getByText(/^Alert (for|since) /).waitFor());
  const questions = ['Told', 'Surgeon’s action', 'End', 'Phase', 'Accept baseline', 'Measure distances', 'Pair a wall', 'Close case', 'Keys', 'Correct last run', 'Other step'];
  for (const question of questions) {
    const name = `log-${question.toLowerCase().replace(/[^a-z]+/g, '-')}`;
    await each(name, async (desk) => {
      if ((await desk.page.getByRole('dialog').count()) > 0) await desk.page.keyboard.press('Escape');
      await desk.button(question).click();
      await desk.page.getByRole('dialog').waitFor();
    });
  }
  await each('log-wrong-value', async (desk) => {
    await toLog(desk);
    await desk.typeRun('4', [['290', '9400']]);
    await desk.page.keyboard.press('Enter');
  });
  await each('record', async (desk) => (await desk.goTo(`/cases/${http.caseId}/record`), desk.page.getByRole('heading', { name: 'Entries' }).waitFor()));
  for (const { theme, desk } of desks) await desk.page.screenshot({ path: path.join(folder, `record-whole-${theme}.png`), fullPage: true });
  process.stdout.write(desks.flatMap(({ desk }) => desk.watched.errors()).map((error) => `${error}\n`).join(''));
}

async function shootWall(browser: Browser, product: Product): Promise<void> {
  const walls = await Promise.all(themes.map(async (theme) => ({ theme, wall: await WallScreen.open(browser, product.url, `?theme=${theme}`) })));
  const each = async (name: string) => {
    for (const { theme, wall } of walls) await shoot(wall.page, `wall-${name}`, theme);
  };
  const http = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 3' });
  for (const { wall } of walls) await wall.code();
  await each('not-paired');
  for (const { wall } of walls) await http.pair(await wall.code());
  let present = await beAtTheDesk(product, http);
  for (const { name, lead, play } of wallCourse) {
    await play(http);
    for (const { wall } of walls) await wall.waitForLead(lead);
    await each(name);
    if (name !== 'alert' && name !== 'stable') continue;
    present.close();
    await shootNotLive(product, walls, name);
    present = await beAtTheDesk(product, http);
  }
  present.close();
  await shootTwoNerves(browser, product);
  process.stdout.write(walls.flatMap(({ wall }) => wall.watched.errors()).map((error) => `${error}\n`).join(''));
}

/** A desk that is connected, so that the wall has nothing to say about it. */
async function beAtTheDesk(product: Product, http: HttpDesk): Promise<Viewer> {
  const viewer = await connectViewer(product, { cookie: http.cookie, viewer: 'desk' });
  await viewer.follow(http.caseId);
  return viewer;
}

async function shootNotLive(product: Product, walls: readonly { theme: string; wall: WallScreen }[], name: string): Promise<void> {
  await product.stopServer();
  for (const { wall } of walls) {
    wall.watched.expectError(/./);
    await wall.page.waitForFunction(() => Number(getComputedStyle(document.querySelector('[data-live]')!).opacity) === 1);
  }
  for (const { theme, wall } of walls) await shoot(wall.page, `wall-not-live-${name}`, theme);
  await product.restart();
  for (const { wall } of walls) await wall.page.waitForFunction(() => Number(getComputedStyle(document.querySelector('[data-live]')!).opacity) === 0, null, { timeout: 20_000 });
}

/** Two nerves at risk and one alert: the wall with the most on it. */
async function shootTwoNerves(browser: Browser, product: Product): Promise<void> {
  const http = await HttpDesk.plan(product, { ...sciaticAtHip, theatre: 'Theatre 1', side: 'right' });
  await http.openForBaseline({ agoS: 3000 });
  const onsets: Readonly<Record<string, number>> = { 'fibular-above-field': 14.9, 'fibular-below-field': 12.6, 'fibular-head': 6.2, 'tibial-above-field': 14.1, 'tibial-below-field': 11.8, 'popliteal-fossa': 6.0 };
  const channelOf = (siteId: string) => sciaticAtHip.paths.find((one) => one.siteId === siteId && one.isRequired)?.channelId ?? '';
  const runAll = async (purpose: 'baseline' | 'check', agoS: number, shares: Readonly<Record<string, number>> = {}) => {
    for (const [siteId, onsetMs] of Object.entries(onsets)) {
      await http.run(siteId, { [channelOf(siteId)]: { kind: 'measured', onsetMs, amplitudeUv: 7000 * (shares[siteId] ?? 1), durationMs: null } }, { purpose }, { agoS });
    }
  };
  for (let count = 0; count < 3; count += 1) await runAll('baseline', 2400);
  await http.give({ name: 'accept-baseline', family: sciaticAtHip.defaultFamily, electrodeId: sciaticAtHip.electrodes[0]?.id ?? '', reason: 'Read by the desk alone' }, { agoS: 2000 });
  await http.give({ name: 'change-phase', phase: 'monitoring', reason: null }, { agoS: 1900 });
  await http.step('reduction', { agoS: 120 });
  for (const agoS of [60, 30]) await runAll('check', agoS, { 'fibular-above-field': 0.33 });
  const present = await beAtTheDesk(product, http);
  const walls = await Promise.all(themes.map(async (theme) => ({ theme, wall: await WallScreen.open(browser, product.url, `?theme=${theme}`) })));
  for (const { theme, wall } of walls) {
    await http.pair(await wall.code());
    await wall.waitForLead(/common fibular/i);
    await shoot(wall.page, 'wall-two-nerves', theme);
  }
  present.close();
}

await mkdir(folder, { recursive: true });
await buildForTests();
const product = await startProduct({ ownCluster: true });
const browser = await launchChromium();
try {
  if (wants('desk')) await shootDesk(browser, product);
  if (wants('wall')) await shootWall(browser, product);
  if (wants('record')) await shootRecord(browser, product, folder);
  if (wants('today')) await shootToday(browser, product, folder, shoot);
} finally {
  await browser.close();
  await product.stop();
}
