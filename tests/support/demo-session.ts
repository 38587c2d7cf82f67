import type { BrowserContext } from 'playwright-core';

import { signInAsDemo } from '@/tests/live/sign-in-as';

const sessions = new Map<string, Promise<string>>();

/** The cookies of a demo person, who signs in once for each product: a second-factor code is taken once only. */
export function demoSession(product: { readonly url: string }, email: string): Promise<string> {
  const key = `${product.url} ${email}`;
  const session = sessions.get(key) ?? signInAsDemo(product, email).then((jar) => jar.header);
  sessions.set(key, session);
  return session;
}

/** Puts the session into a browser, as if its person had signed in there. */
export async function takeSession(context: BrowserContext, product: { readonly url: string }, email: string): Promise<void> {
  const pairs = (await demoSession(product, email)).split('; ').map((pair) => [pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1)] as const);
  await context.addCookies(pairs.map(([name, value]) => ({ name, value, url: product.url })));
}
