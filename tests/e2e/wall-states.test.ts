import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { launchChromium } from '@/tests/support/chromium';
import { absent } from '@/tests/support/case-builder';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';
import { adm, apb, ulnarSites } from '@/tests/support/ulnar-case';
import { WallScreen } from '@/tests/support/wall-screen';

import { eventually } from './eventually';
import { oneJourney } from './one-journey';

let product: Product;
let browser: Browser;
let desk: HttpDesk;
let wall: WallScreen;
/** The shortest time for a repeat that the rules allow, so that its end can be waited for. */
const plan = { ...ulnarAtElbow, theatre: 'Theatre 3', rules: { ...ulnarAtElbow.rules, repeatWithinSeconds: 10 } };

oneJourney();
beforeAll(async () => {
  product = await startProduct();
  browser = await launchChromium();
  wall = await WallScreen.open(browser, product.url);
  desk = await HttpDesk.plan(product, plan);
});
afterAll(async () => {
  await browser.close();
  await product.stop();
});

/** The kinds of look that only an earned state may have. */
const isCalm = () => wall.page.locator('main.wall section.bg-raised h1').count();

describe('each state of the wall, in words, from commands alone', () => {
  test('not paired, then set-up', async () => {
    expect(await wall.waitForLead(/./)).toBe('Not paired');
    await desk.pair(await wall.code());
    expect(await wall.waitForLead(/^Set-up$/)).toBe('Set-up');
    expect(await wall.picture()).toMatch(/Theatre 3, left/);
    await desk.give({ name: 'open-case', clockOffsetMs: 0 });
    await eventually(() => wall.picture()).toMatch(/Set-up Since \d\d:\d\d\. Not monitored yet\./);
    expect(await isCalm()).toBe(0);
  });

  test('no baseline', async () => {
    await desk.give({ name: 'confirm-timeout', side: 'left', text: null });
    await desk.give({ name: 'change-phase', phase: 'baseline', reason: null });
    await wall.waitForLead(/^Ulnar: no baseline yet$/);
  });

  test('not tested since baseline, then stable', async () => {
    await desk.ulnarBaseline();
    await wall.waitForLead(/^Not tested since baseline$/);
    expect(await isCalm()).toBe(0);
    await desk.testUlnar(0.98);
    await desk.run('median-wrist', { apb: apb() });
    await wall.waitForLead(/^Stable$/);
    expect(await isCalm()).toBe(1);
  });

  test('improved and watch', async () => {
    await desk.testUlnar(1.42);
    await wall.waitForLead(/^Ulnar improved, 142 % of baseline$/);
    await desk.testUlnar(0.62, {}, [...ulnarSites].reverse());
    await wall.waitForLead(/^Ulnar at 62 % of baseline$/);
    expect(await isCalm()).toBe(0);
    await desk.testUlnar();
    await wall.waitForLead(/^Stable$/);
  });

  test('not compared, with the reason', async () => {
    await desk.run('above-elbow', { adm: adm('above-elbow', 0.7) }, { intensityMa: 9, isSupramaximal: false });
    await wall.waitForLead(/^Ulnar not compared since \d\d:\d\d$/);
    expect(await wall.picture()).toMatch(/Lower current than baseline|Current not supramaximal/i);
    await desk.testUlnar();
    await wall.waitForLead(/^Stable$/);
  });

  test('tourniquet up, with its minutes', async () => {
    await desk.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: true, pressureMmHg: 250 }, reportedBy: 'anaesthetist' }, { agoS: 125 });
    await wall.waitForLead(/^Tourniquet up 2 min$/);
    await desk.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: 'anaesthetist' });
    await wall.waitForLead(/^Stable$/);
  });

  test('paused, with the reason', async () => {
    await desk.give({ name: 'change-phase', phase: 'paused', reason: 'Cautery' });
    await wall.waitForLead(/^Paused$/);
    expect(await wall.picture()).toMatch(/Cautery, since \d\d:\d\d\. Not monitored\./);
    await desk.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    await wall.waitForLead(/^Stable$/);
  });

  test('not tested since the risk step', async () => {
    await desk.step('nerve-lifted');
    await wall.waitForLead(/^Not tested since nerve lifted$/);
    await desk.run('wrist', { adm: adm('wrist') });
    await wall.waitForLead(/^1 of 4 sites tested since nerve lifted$/);
    expect(await isCalm()).toBe(0);
  });

  test('notice, then alert until told, then back, then ended', async () => {
    await desk.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
    await wall.waitForLead(/^Ulnar at 40 % of baseline$/);
    expect(await wall.page.locator('[data-band="medium"]').count()).toBe(1);
    await desk.run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
    await wall.waitForLead(/^Ulnar at 38 % of baseline$/);
    expect(await wall.page.locator('[data-band="high"]').count()).toBe(1);
    expect(await wall.page.locator('.flashes').count()).toBe(1);
    await desk.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar at 38 per cent' });
    await eventually(() => wall.page.locator('.flashes').count()).toBe(0);
    for (let count = 0; count < 2; count += 1) await desk.testUlnar(0.92);
    await wall.waitForLead(/^Ulnar back at 92 % of baseline$/);
    await desk.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'full', cause: 'surgical', text: null });
    await wall.waitForLead(/^Stable$/);
  });

  test('not repeated in time, then withdrawn', async () => {
    const [logged] = await desk.run('axilla', { adm: adm('axilla', 0.3) });
    await expect.poll(() => wall.picture(), { timeout: 20_000 }).toMatch(/Not repeated/);
    expect(await wall.page.locator('[data-band="high"]').count()).toBe(1);
    await desk.give({ name: 'correct-run', runSeq: logged?.seq ?? 0, run: null, reason: 'Electrode had slipped' });
    await wall.waitForLead(/^Ulnar alert withdrawn$/);
  });

  test('muscle responses cannot be judged: the control is lost too', async () => {
    for (const site of ulnarSites) for (let count = 0; count < 2; count += 1) await desk.run(site, { adm: absent(30) }, { intensityMa: 20 });
    await wall.waitForLead(/^No ulnar response$/);
    for (let count = 0; count < 2; count += 1) await desk.run('median-wrist', { apb: absent(30) });
    await wall.waitForStatement(/^Muscle responses cannot be judged$/);
    expect(await wall.picture()).toMatch(/Control lost too\. Train-of-four needed/);
    expect(await isCalm()).toBe(0);
  });

  test('not live within 3 s of the server\'s end, the open alert in its size, and live again without a touch', async () => {
    wall.watched.expectError(/ERR_CONNECTION_REFUSED|WebSocket|ERR_CONNECTION_RESET|ERR_EMPTY_RESPONSE/);
    expect(await wall.isCovered()).toBe(false);
    await product.kill9();
    const endedAtMs = performance.now();
    await expect.poll(() => wall.isCovered(), { timeout: 5_000, interval: 50 }).toBe(true);
    expect(performance.now() - endedAtMs).toBeLessThan(3_200);
    const covered = await wall.page.getByRole('region', { name: 'Not live' }).innerText();
    expect(covered).toMatch(/Not live[\s\S]*Alert was open: no ulnar response/);
    await product.restart();
    await expect.poll(() => wall.isCovered(), { timeout: 20_000 }).toBe(false);
  });

  test('take-down and closed', async () => {
    await desk.give({ name: 'change-phase', phase: 'take-down', reason: null });
    await wall.waitForStatement(/^Take-down$/);
    expect((await wall.statements())[0]).toBe('No ulnar response');
    await desk.give({ name: 'end-alert', alertId: 'ulnar-3', outcome: 'none', cause: 'undetermined', text: null });
    // What could not be judged is still said first, and nothing looks calm.
    await wall.waitForStatement(/^Take-down$/);
    expect(await isCalm()).toBe(0);
    await desk.give({ name: 'close-case', text: null });
    await wall.waitForLead(/^Case closed \d\d:\d\d$/);
    expect(wall.watched.errors()).toEqual([]);
  });
});

describe('a baseline that scatters as much as the limit', () => {
  test('makes its nerve not monitorable by amplitude', async () => {
    const noisy = await HttpDesk.plan(product, plan);
    const screen = await WallScreen.open(browser, product.url);
    await noisy.pair(await screen.code());
    await noisy.openForBaseline();
    for (const site of ulnarSites) for (const share of [0.5, 1, 1.5]) await noisy.run(site, { adm: adm(site, share) }, { purpose: 'baseline' });
    await noisy.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Nothing better to be had' });
    await noisy.give({ name: 'change-phase', phase: 'monitoring', reason: null });
    await screen.waitForLead(/^Ulnar not monitorable by amplitude$/);
    expect(screen.watched.errors()).toEqual([]);
    await screen.close();
  });
});
