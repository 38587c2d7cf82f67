import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Browser, Page } from 'playwright-core';

/** Two pages with nothing in them: a key on one changes a text on the other. */
export interface BarePages {
  /** One key press; how long it took to stand on the other page, stamped as on the product's pages. */
  readonly pressOnceMs: () => Promise<number>;
  readonly close: () => Promise<void>;
}

const html = '<!doctype html><html lang="en"><title>Bare</title><body><p>nothing</p></body></html>';

/** Opens both in one browser context, joined by a BroadcastChannel: the shortest way that a browser has between two pages. */
export async function openBarePages(browser: Browser): Promise<BarePages> {
  const server = createServer((_, response) => void response.setHeader('content-type', 'text/html').end(html));
  await new Promise<void>((tell) => server.listen(0, '127.0.0.1', tell));
  const context = await browser.newContext();
  const [from, to] = [await context.newPage(), await context.newPage()];
  for (const page of [from, to]) await page.goto(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`);
  await stampEnter(from);
  await from.evaluate(() => {
    const channel = new BroadcastChannel('bare');
    let count = 0;
    window.addEventListener('keydown', (event) => (event.key === 'Enter' ? channel.postMessage(`press ${(count += 1)}`) : undefined));
  });
  await to.evaluate(() => {
    new BroadcastChannel('bare').onmessage = (message: MessageEvent<string>) => void (document.querySelector('p')!.textContent = message.data);
  });
  let count = 0;
  return {
    pressOnceMs: async () => {
      count += 1;
      const painted = paintOf(to, 'p', `press ${count}`);
      await painted.isWatching;
      await from.keyboard.press('Enter');
      return (await painted.atMs) - (await lastEnterMs(from));
    },
    close: async () => {
      await context.close();
      server.close();
    },
  };
}

/** Stamps each Enter on its way down to whatever listens. */
export async function stampEnter(page: Page): Promise<void> {
  await page.evaluate(() =>
    window.addEventListener('keydown', (event) => void (event.key === 'Enter' && Object.assign(window, { lastEnterMs: performance.timeOrigin + performance.now() })), { capture: true }),
  );
}

/** When the last Enter went down, in ms since 1970 by the machine's clock. */
export function lastEnterMs(page: Page): Promise<number> {
  return page.evaluate(() => (window as unknown as { lastEnterMs: number }).lastEnterMs);
}

/**
 * When a text first stood painted in an element: the change seen by a MutationObserver, then two animation frames, so
 * that the frame with it has been handed over. `isWatching` resolves before anything may change.
 */
export function paintOf(page: Page, selector: string, text: string): { isWatching: Promise<unknown>; atMs: Promise<number> } {
  const isWatching = page.evaluate(
    ([where, wanted]) => {
      if (document.querySelector(where)?.textContent?.replace(/\u00a0/g, ' ').includes(wanted) === true) throw new Error(`"${wanted}" stands there before it was sent`);
      const painted = new Promise<number>((tell) => {
        const observer = new MutationObserver(() => {
          if (document.querySelector(where)?.textContent?.replace(/\u00a0/g, ' ').includes(wanted) !== true) return;
          observer.disconnect();
          requestAnimationFrame(() => requestAnimationFrame(() => tell(performance.timeOrigin + performance.now())));
        });
        observer.observe(document.body, { subtree: true, childList: true, characterData: true });
      });
      Object.assign(window, { painted });
    },
    [selector, text] as const,
  );
  const atMs = isWatching.then(() => page.evaluate(() => (window as unknown as { painted: Promise<number> }).painted));
  return { isWatching, atMs };
}
