import { describe, expect, it } from 'vitest';

import type { SessionAnswer } from '@/app/_live/desk-identity';
import { openLiveDatabase } from '@/app/_live/live-database';
import { openLiveStorage } from '@/app/_live/live-storage';
import { freshBrowser, openTab, until } from '@/tests/app/live/desk-tab';
import { FakeServer } from '@/tests/app/live/fake-server';
import { caseId, desk, entries, say, tabs, texts } from '@/tests/app/live/ulnar-desk';

describe('LiveClient between two people', () => {
  it('keeps what waits for its author at sign-out and sends none of it in the next person\'s name', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const first = await desk(browser, server);
    server.stop();
    await first.client.send(caseId, say('Of the first'));
    await first.client.signOut();
    first.kill();
    server.start();
    browser.session = { kind: 'person', personId: 'person-2', displayName: 'Relief' };
    const second = await desk(browser, server);
    await second.client.send(caseId, say('Of the second'));
    expect(second.store().waiting).toEqual([]);
    expect(texts(server)).toEqual(['Of the second']);
    second.kill();
    browser.session = { kind: 'person', personId: 'person-1', displayName: 'Neurophysiologist' };
    const back = await desk(browser, server);
    await until(() => texts(server).length === 2 && back.store().waiting.length === 0);
    expect(texts(server)).toEqual(['Of the second', 'Of the first']);
  });

  it('forgets the kept case and the person at sign-out: a reload without a link shows nothing of them', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const first = await desk(browser, server);
    await first.client.signOut();
    first.kill();
    server.stop();
    const after = await openTab(browser, server);
    tabs.push(after);
    after.client.follow(caseId, 'desk');
    await after.client.startDesk();
    expect(after.store().session.status).toBe('unknown');
    expect(after.feed(caseId).state).toBeNull();
  });

  it('sends nothing on a new connection before the server said whose it is', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const tab = await desk(browser, server);
    server.stop();
    await tab.client.send(caseId, say('Mine'));
    const asked: ((session: SessionAnswer) => void)[] = [];
    browser.ask = () => new Promise((resolve) => void asked.push(resolve));
    server.start();
    await until(() => asked.length === 1);
    await tab.client.send(caseId, say('Also mine'));
    expect(server.arrived).toEqual([]);
    asked[0]?.(browser.session);
    await until(() => tab.store().waiting.length === 0);
    expect(texts(server)).toEqual(['Mine', 'Also mine']);
  });

  it('does not remember a person whose sign-out overtook the answer to who is signed in', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const asked: ((session: SessionAnswer) => void)[] = [];
    browser.ask = () => new Promise((resolve) => void asked.push(resolve));
    const tab = await openTab(browser, server);
    tabs.push(tab);
    const started = tab.client.startDesk();
    await until(() => asked.length === 1);
    await tab.client.signOut();
    asked[0]?.(browser.session);
    await started;
    expect(tab.store().session.status).toBe('signed-out');
    expect(tab.client.queue.person).toBeNull();
    expect(await (await openLiveStorage(() => openLiveDatabase(browser.databaseName))).readSession()).toBeNull();
  });

  it('takes the case of the one before off the screen when another person turns out to be signed in', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const tab = await desk(browser, server);
    server.stop();
    await tab.client.send(caseId, say('Of the first'));
    browser.session = { kind: 'person', personId: 'person-2', displayName: 'Relief' };
    server.start();
    await until(() => tab.store().session.status === 'signed-in' && tab.client.queue.person === 'person-2');
    expect(tab.store().waiting).toEqual([]);
    await until(() => tab.feed(caseId).state?.seq === entries.length);
    expect(texts(server)).toEqual([]);
  });
});
