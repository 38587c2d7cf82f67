import { afterEach } from 'vitest';

import type { PersonCommand } from '@/lib/contracts/http/commands';
import { openTab, until, type Browser, type Tab } from '@/tests/app/live/desk-tab';
import type { FakeServer } from '@/tests/app/live/fake-server';
import { monitoredUlnar } from '@/tests/support/ulnar-case';

/** A monitored ulnar case, as far as it is committed when a desk opens it. */
export const script = monitoredUlnar();
export const { entries } = script;
export const caseId = entries[0]!.caseId;

/** A message, the shortest command there is. */
export const say = (text: string): PersonCommand => ({ name: 'send-message', text });

/** What was said, in the order of the log. */
export const texts = (server: FakeServer): unknown[] => server.entries.flatMap((entry) => (entry.kind === 'message.sent' ? [entry.body?.text] : []));

/** Tabs that end with their test. */
export const tabs: Tab[] = [];
afterEach(() => tabs.splice(0).forEach((tab) => tab.kill()));

/** A desk at the ulnar case, signed in and caught up as far as the server lets it. */
export async function desk(browser: Browser, server: FakeServer): Promise<Tab> {
  const tab = await openTab(browser, server);
  tabs.push(tab);
  tab.client.follow(caseId, 'desk');
  const isReady = () => ['signed-in', 'unconfirmed'].includes(tab.store().session.status) && (!server.isUp || tab.feed(caseId).state?.seq === server.state.seq);
  await until(isReady);
  return tab;
}
