import { afterEach, describe, expect, it } from 'vitest';

import { checkThatCounts } from '@/app/_live/live-store';
import { applyEntry } from '@/lib/case/apply-entry';
import { initialState } from '@/lib/case/initial-state';
import { freshBrowser, openTab, until, type Tab } from '@/tests/app/live/desk-tab';
import { FakeServer } from '@/tests/app/live/fake-server';
import { monitoredUlnar } from '@/tests/support/ulnar-case';

const { entries } = monitoredUlnar();
const caseId = entries[0]!.caseId;
const say = (server: FakeServer, text: string) => server.commit({ name: 'send-message', text }, `id-${text}`);
const tabs: Tab[] = [];

async function follow(server: FakeServer, viewer: 'desk' | 'wall' = 'wall'): Promise<Tab> {
  const tab = await openTab(freshBrowser(), server);
  tabs.push(tab);
  tab.client.follow(caseId, viewer);
  await until(() => tab.feed(caseId).state?.seq === server.state.seq);
  return tab;
}

afterEach(() => tabs.splice(0).forEach((tab) => tab.kill()));

describe('LiveClient follows a case', () => {
  it('reads the whole log page by page and holds the state that the entries give', async () => {
    const server = new FakeServer(caseId, entries);
    server.pageSize = 7;
    const tab = await follow(server, 'desk');
    expect(tab.feed(caseId).state).toEqual(entries.reduce(applyEntry, initialState(caseId)));
    expect(tab.feed(caseId).entries.map((entry) => entry.seq)).toEqual(entries.map((_, index) => index + 1));
    expect(server.followed).toEqual(entries.flatMap((_, index) => (index % 7 === 0 ? [index] : [])));
  });

  it('applies what the server sends, once, and passes over what it holds', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server, 'desk');
    say(server, 'one');
    const after = tab.feed(caseId);
    server.tell('entries', { caseId, entries: server.entries.slice(-3) });
    expect(after.state?.seq).toBe(entries.length + 1);
    expect(tab.feed(caseId)).toBe(after);
    expect(server.followed).toHaveLength(1);
  });

  it('follows again from last over a gap', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server, 'desk');
    server.isSilent = true;
    say(server, 'unheard');
    server.isSilent = false;
    say(server, 'heard');
    await until(() => tab.feed(caseId).state?.seq === entries.length + 2);
    expect(server.followed).toEqual([0, entries.length]);
    expect(tab.feed(caseId).entries.slice(-2).map((entry) => entry.body?.text)).toEqual(['unheard', 'heard']);
  });

  it('follows again when a pulse tells of a number that never came', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    server.isSilent = true;
    say(server, 'lost');
    server.isSilent = false;
    server.pulse();
    expect(tab.feed(caseId).checkedAt).toBeNull();
    await until(() => tab.feed(caseId).checkedAt !== null);
    expect(tab.feed(caseId).state?.seq).toBe(entries.length + 1);
  });

  it('comes back by itself after the server was away, without a hole', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server, 'desk');
    server.stop();
    expect(tab.store().link.isConnected).toBe(false);
    say(server, 'meanwhile');
    server.start();
    await until(() => tab.feed(caseId).state?.seq === entries.length + 1);
    expect(tab.feed(caseId).problem).toBeNull();
  });

  it('calls another hash under a held number a fork, and is not live', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    server.pulse();
    expect(tab.feed(caseId).checkedAt).not.toBeNull();
    server.tell('entries', { caseId, entries: [{ ...entries.at(-2)!, hash: 'f'.repeat(64) }] });
    expect(tab.feed(caseId)).toMatchObject({ problem: 'fork' });
    expect(checkThatCounts(tab.feed(caseId))).toBeNull();
    const { checkedAt } = tab.feed(caseId);
    server.nowMs = () => Date.now() + 500;
    server.pulse();
    expect(tab.feed(caseId).checkedAt).toBe(checkedAt);
  });

  it.each([
    ['a pulse with another hash at the head', (server: FakeServer) => server.pulse({ headHash: 'e'.repeat(64) })],
    ['a next entry that stands on another hash, asked again', (server: FakeServer) => {
      const forged = { ...entries.at(-1)!, seq: entries.length + 1, previousHash: 'd'.repeat(64), hash: 'c'.repeat(64) };
      server.entries.push(forged);
      server.tell('entries', { caseId, entries: [forged] });
    }],
    ['a log that is shorter than what was seen', (server: FakeServer) => {
      server.stop();
      server.entries.pop();
      server.state = server.entries.reduce(applyEntry, initialState(caseId));
      server.start();
    }],
  ])('calls it a fork: %s', async (_, rewrite) => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    rewrite(server);
    await until(() => tab.feed(caseId).problem === 'fork');
    expect(tab.feed(caseId).state?.seq).toBe(entries.length);
  });

  it('stops before a kind it does not know and says that the version is newer', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    const unknown = { ...entries.at(-1)!, seq: entries.length + 1, kind: 'trace.attached', previousHash: entries.at(-1)!.hash, hash: 'b'.repeat(64) };
    server.tell('entries', { caseId, entries: [unknown] });
    server.pulse();
    expect(tab.feed(caseId)).toMatchObject({ problem: 'newer-version', checkedAt: null });
    expect(checkThatCounts(tab.feed(caseId))).toBeNull();
    expect(tab.feed(caseId).state?.seq).toBe(entries.length);
  });

  it('says "not found" for a case that is not there or not theirs', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await openTab(freshBrowser(), server);
    tabs.push(tab);
    tab.client.follow('018f0000-0000-7000-8000-0000000000ff', 'wall');
    await until(() => tab.feed('018f0000-0000-7000-8000-0000000000ff').problem === 'not-found');
  });

  it('ends when the server ends it, with the reason', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    server.pulse();
    server.tell('ended', { caseId, reason: 'revoked' });
    server.pulse();
    expect(tab.feed(caseId)).toMatchObject({ ended: 'revoked', problem: null });
    expect(checkThatCounts(tab.feed(caseId))).toBeNull();
  });

  it('confirms what a wall painted, again after a lost connection', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await follow(server);
    server.stop();
    tab.client.painted(caseId, 12, 'ulnar-1');
    expect(server.painted).toEqual([]);
    server.start();
    await until(() => server.painted.length === 1);
    expect(server.painted[0]).toMatchObject({ caseId, seq: 12, alertId: 'ulnar-1' });
  });
});
