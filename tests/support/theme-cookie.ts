import type { BrowserContext } from 'playwright-core';

/** Chooses dark or light for every page of a browser context, as the switch in the product's head does. */
export async function chooseTheme(context: BrowserContext, url: string, theme: 'theatre' | 'paper'): Promise<void> {
  await context.addCookies([{ name: 'fascicle-theme', value: theme, url }]);
}
