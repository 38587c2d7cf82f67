import type { Browser, Page } from 'playwright-core';

import { send } from '@/tests/server/house/client';
import type { Product } from '@/tests/support/start-product';

/** What the wall looked like at one moment of the machine's clock. */
export interface WallSample {
  readonly atMs: number;
  /** Opacity of the "not live" layer, 0 to 1. */
  readonly cover: number;
  readonly isLoaded: boolean;
}

/** A theatre screen in a browser, sampled every 50 ms by the page itself. */
export interface WatchedWall {
  readonly page: Page;
  samples(): Promise<readonly WallSample[]>;
  /** Resolves when the wall shows its case uncovered; rejects after `withinMs`. */
  waitUntilLive(withinMs: number): Promise<void>;
  /** Resolves with the moment of the first covered sample at or after `sinceMs`; rejects after `withinMs`. */
  notLiveSince(sinceMs: number, withinMs: number): Promise<number>;
}

/** Opens a wall, pairs it with the case as the desk does, and starts sampling. */
export async function openWatchedWall(browser: Browser, product: Pick<Product, 'url'>, desk: { cookie: string; caseId: string }): Promise<WatchedWall> {
  const context = await browser.newContext({ viewport: { width: 1920, height: 1080 } });
  const page = await context.newPage();
  await page.goto(`${product.url}/screen`);
  const code = await pairingCode(page);
  const pair = (isConfirmed: boolean) => send(product, 'POST', `/api/cases/${desk.caseId}/screens`, { cookie: desk.cookie, body: { code, isConfirmed } });
  await pair(false);
  const paired = await pair(true);
  if (paired.status !== 200) throw new Error(`Pairing answered ${paired.status}: ${JSON.stringify(paired.body)}`);
  await page.waitForSelector('[data-live]', { state: 'attached' });
  await page.evaluate(() => {
    const samples: { atMs: number; cover: number; isLoaded: boolean }[] = [];
    Object.assign(window, { wallSamples: samples });
    setInterval(() => {
      const layer = document.querySelector('[data-live]');
      const isLoaded = document.querySelectorAll('.wall').length > 1;
      samples.push({ atMs: Date.now(), cover: layer === null ? 1 : Number(getComputedStyle(layer).opacity), isLoaded });
    }, 50);
  });
  const samples = () => page.evaluate(() => (window as unknown as { wallSamples: WallSample[] }).wallSamples);
  const waitUntilLive = async (withinMs: number) => {
    await page.waitForFunction(
      () => {
        const layer = document.querySelector('[data-live]');
        return layer !== null && document.querySelectorAll('.wall').length > 1 && Number(getComputedStyle(layer).opacity) === 0;
      },
      null,
      { timeout: withinMs, polling: 50 },
    );
  };
  const notLiveSince = async (sinceMs: number, withinMs: number) => {
    const covered = await page.waitForFunction(
      (since) => (window as unknown as { wallSamples: WallSample[] }).wallSamples.find((sample) => sample.atMs >= since && sample.cover === 1)?.atMs,
      sinceMs,
      { timeout: withinMs, polling: 50 },
    );
    return (await covered.jsonValue()) as number;
  };
  return { page, samples, waitUntilLive, notLiveSince };
}

/** The code is read from the wall's own text, as a person would read it aloud. */
async function pairingCode(page: Page): Promise<string> {
  await page.waitForFunction(() => /\b[A-Z0-9]{6}\b/.test(document.body.innerText.replace(/([A-Z0-9]{3})\s([A-Z0-9]{3})/g, '$1$2')), null, { timeout: 30_000 });
  const text = (await page.evaluate(() => document.body.innerText)).replace(/([A-Z0-9]{3})\s([A-Z0-9]{3})/g, '$1$2');
  return /\b(?=[A-Z0-9]*[0-9A-Z])[A-Z0-9]{6}\b/.exec(text)?.[0] ?? '';
}
