import type { Browser, BrowserContext, BrowserContextOptions, Page } from 'playwright-core';

/** How long anything on a page may take before the test gives up. */
const patienceMs = 15_000;

/** A page whose console is watched: what Chromium calls an error is one, unless the test said before that it will come. */
export interface WatchedPage {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Names an error that belongs to what the test does: a server that is stopped, a page that must not be there. */
  readonly expectError: (pattern: RegExp) => void;
  /** Errors that nobody expected, each with the address of its page. */
  readonly errors: () => readonly string[];
}

/** Watches a page that is there already. */
export function watchPage(page: Page): WatchedPage {
  const errors: string[] = [];
  const expected: RegExp[] = [];
  const note = (words: string) => void errors.push(`${new URL(page.url()).pathname}: ${words}`);
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') note(`${message.type()}: ${message.text()} (${message.location().url})`);
  });
  page.on('pageerror', (error) => note(`uncaught: ${error.message}`));
  page.on('crash', () => note('the page crashed'));
  return {
    page,
    context: page.context(),
    expectError: (pattern) => void expected.push(pattern),
    errors: () => errors.filter((error) => !expected.some((pattern) => pattern.test(error))),
  };
}

/** Opens a page in a browser context of its own: another person, another machine. */
export async function openWatchedPage(browser: Browser, options: BrowserContextOptions = {}): Promise<WatchedPage> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce', ...options });
  context.setDefaultTimeout(patienceMs);
  return watchPage(await context.newPage());
}
