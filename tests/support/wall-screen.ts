import type { Browser, BrowserContextOptions, Page } from 'playwright-core';

import { openWatchedPage, watchPage, type WatchedPage } from '@/tests/support/watched-page';

/** A theatre screen in a browser of its own, read as a person in the room reads it. */
export class WallScreen {
  private constructor(readonly watched: WatchedPage) {}

  /** Opens the screen; its address may say how it hangs: "?theme=paper". */
  static async open(browser: Browser, url: string, search = '', options: BrowserContextOptions = {}): Promise<WallScreen> {
    const watched = await openWatchedPage(browser, { viewport: { width: 1920, height: 1080 }, ...options });
    await watched.page.goto(`${url}/screen${search}`);
    return new WallScreen(watched);
  }

  /** A second look from the same browser: what a reload would show, beside what stands there. */
  async openAgain(url: string): Promise<WallScreen> {
    const page = await this.watched.context.newPage();
    await page.goto(`${url}/screen`);
    return new WallScreen(watchPage(page));
  }

  get page(): Page {
    return this.watched.page;
  }

  /** The code while it is not paired. */
  async code(): Promise<string> {
    const text = await this.page.locator('dt:text-is("Code") + dd').textContent({ timeout: 30_000 });
    return (text ?? '').replace(/\s/g, '');
  }

  /** The two words to be compared aloud. */
  async words(): Promise<string> {
    return (await this.page.locator('dt:text-is("Words") + dd').textContent()) ?? '';
  }

  /** Every statement on the live picture, the lead first, with no-break spaces as plain ones. */
  async statements(): Promise<string[]> {
    const lines = await this.page.locator('main.wall').locator('h1, ul li strong').allTextContents();
    return lines.map(plain);
  }

  /** Waits until the lead reads like this. Fails with what stands there instead. */
  async waitForLead(wanted: RegExp, withinMs = 10_000): Promise<string> {
    return waitForText(this.page.locator('main.wall h1'), wanted, withinMs);
  }

  /** Waits until some statement, lead or not, reads like this. */
  async waitForStatement(wanted: RegExp, withinMs = 10_000): Promise<string> {
    return waitForText(this.page.locator('main.wall').locator('h1, ul li strong'), wanted, withinMs);
  }

  /** The whole live picture as text, without what runs with the clock: times of day to the minute stay. */
  async picture(): Promise<string> {
    const text = await this.page.locator('main.wall').innerText();
    return withoutRunningTime(text);
  }

  /** Whether the layer that says "not live" covers the picture now. */
  async isCovered(): Promise<boolean> {
    return this.page.evaluate(() => {
      const layer = document.querySelector('[data-live]');
      return layer !== null && Number(getComputedStyle(layer).opacity) === 1;
    });
  }

  close(): Promise<void> {
    return this.watched.context.close();
  }
}

/** Text as typed on a keyboard: plain spaces. */
export function plain(text: string): string {
  return text.replace(/[\u00a0\u202f]/g, ' ').trim();
}

/** Clock with seconds and ages change by themselves; everything else on a picture may not. */
export function withoutRunningTime(text: string): string {
  return plain(text)
    .replace(/\b\d\d:\d\d:\d\d\b/g, 'clock')
    .replace(/\b\d+ (s|min|h)\b/g, 'age')
    .replace(/\s+/g, ' ');
}

async function waitForText(locator: ReturnType<Page['locator']>, wanted: RegExp, withinMs: number): Promise<string> {
  const until = performance.now() + withinMs;
  let seen: string[] = [];
  while (performance.now() < until) {
    seen = (await locator.allTextContents()).map(plain);
    const found = seen.find((text) => wanted.test(text));
    if (found !== undefined) return found;
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  throw new Error(`No statement ${wanted} within ${withinMs} ms; there stands: ${seen.join(' | ') || 'nothing'}`);
}
