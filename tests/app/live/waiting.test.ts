import { describe, expect, it } from 'vitest';

import { openLiveDatabase } from '@/app/_live/live-database';
import { openLiveStorage } from '@/app/_live/live-storage';
import { provisionalState } from '@/app/_live/provisional-state';
import { freshBrowser, openTab, until } from '@/tests/app/live/desk-tab';
import { FakeServer } from '@/tests/app/live/fake-server';
import { caseId, desk, entries, say, script, texts } from '@/tests/app/live/ulnar-desk';
import { adm } from '@/tests/support/ulnar-case';

describe('LiveClient sends commands', () => {
  it('answers with the committed entries and keeps nothing', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    const reply = await tab.client.send(caseId, say('Agree'));
    expect(reply).toMatchObject({ kind: 'committed', entries: [{ kind: 'message.sent', body: { text: 'Agree' } }] });
    expect(tab.store().waiting).toEqual([]);
    expect(server.arrived).toHaveLength(1);
  });

  it('sends before it shows what waits, so that drawing it holds nothing up', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    const inFlightWhenShown: number[] = [];
    tab.watch(({ waiting }) => waiting.length > 0 && inFlightWhenShown.push(server.commandsInFlight));
    server.faults = ['lose-answer'];
    await tab.client.send(caseId, say('Now'));
    expect(inFlightWhenShown[0]).toBe(1);
  });

  it('shows what cannot be sent at once', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    server.stop();
    await until(() => !tab.store().link.isConnected);
    expect((await tab.client.send(caseId, say('Later'))).kind).toBe('waiting');
    expect(tab.store().waiting).toMatchObject([{ status: 'waiting', command: { text: 'Later' } }]);
    expect(server.arrived).toEqual([]);
  });

  it('sends in the order of giving and one at a time', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    await Promise.all(['1', '2', '3', '4', '5'].map((text) => tab.client.send(caseId, say(text))));
    expect(texts(server)).toEqual(['1', '2', '3', '4', '5']);
    expect(server.mostInFlight).toBe(1);
  });

  it.each(['lose-answer', 'not-saved', 'drop-connection'] as const)('sends the same command id again after "%s", and it is committed once', async (fault) => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    server.faults = [fault];
    const reply = tab.client.send(caseId, say('Once'));
    if (fault === 'drop-connection') {
      await until(() => !tab.store().link.isConnected);
      server.start();
    }
    await until(() => tab.store().waiting.length === 0 && texts(server).length === 1);
    expect(new Set(server.arrived).size).toBe(1);
    if (fault !== 'drop-connection') expect(server.arrived).toHaveLength(2);
    expect((await reply).kind).toBe('committed');
  });

  it('refuses at once what breaks the contract, with the field, and sends nothing', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    expect(await tab.client.send(caseId, say('   '))).toMatchObject({ kind: 'refused', field: 'text' });
    expect(tab.store().waiting).toEqual([]);
    expect(server.arrived).toEqual([]);
  });

  it('keeps a refused command with its sentence until it is dismissed, and the next one goes on', async () => {
    const server = new FakeServer(caseId, entries);
    server.refuse = (command) => (command.name === 'send-message' && command.text === 'Bad' ? 'Refused: not this one' : null);
    const browser = freshBrowser();
    const tab = await desk(browser, server);
    const [bad, good] = await Promise.all([tab.client.send(caseId, say('Bad')), tab.client.send(caseId, say('Good'))]);
    expect([bad.kind, good.kind]).toEqual(['refused', 'committed']);
    expect(tab.store().waiting).toMatchObject([{ commandId: bad.commandId, status: 'refused' }]);
    const again = await desk(browser, server);
    expect(again.store().waiting).toMatchObject([{ status: 'refused', refusal: { message: 'Refused: not this one' } }]);
    await again.client.queue.dismiss(again.store().waiting[0]!.commandId);
    expect(again.store().waiting).toEqual([]);
    expect(texts(server)).toEqual(['Good']);
    expect(server.arrived).toHaveLength(2);
  });
});

describe('LiveClient without a link', () => {
  it('keeps commands over a reload with the server away, shows the case as kept, and commits each once in order', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const before = await desk(browser, server);
    await until(() => before.feed(caseId).state?.seq === entries.length);
    server.stop();
    expect(await before.client.send(caseId, say('1'))).toMatchObject({ kind: 'waiting' });
    before.kill();
    const after = await desk(browser, server);
    await until(() => after.feed(caseId).state?.seq === entries.length);
    expect(after.store().session).toEqual({ status: 'unconfirmed', personId: 'person-1', displayName: 'Neurophysiologist' });
    expect(await after.client.send(caseId, say('2'))).toMatchObject({ kind: 'waiting' });
    expect(after.feed(caseId).checkedAt).toBeNull();
    const ids = after.store().waiting.map((one) => one.commandId);
    server.start();
    await until(() => after.store().waiting.length === 0);
    expect(texts(server)).toEqual(['1', '2']);
    expect(server.entries.slice(-2).map((entry) => entry.commandId)).toEqual(ids);
  });

  it('keeps a case whose entries came before the server said who sits here', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    browser.session = { kind: 'no-answer' };
    const before = await openTab(browser, server);
    before.client.follow(caseId, 'desk');
    await until(() => before.feed(caseId).state?.seq === entries.length);
    browser.session = { kind: 'person', personId: 'person-1', displayName: 'Neurophysiologist' };
    await until(() => before.store().session.status === 'signed-in');
    const storage = await openLiveStorage(() => openLiveDatabase(browser.databaseName));
    await expect.poll(async () => (await storage.kept.read('person-1', caseId)).length).toBe(entries.length);
    before.kill();
    server.stop();
    const after = await desk(browser, server);
    await until(() => after.feed(caseId).state?.seq === entries.length);
  });

  it('sends from one tab only when two are open', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    const [one, other] = [await desk(browser, server), await desk(browser, server)];
    server.stop();
    for (const [index, tab] of [one, other, one, other].entries()) await tab.client.send(caseId, say(String(index)));
    server.start();
    await until(() => one.store().waiting.length + other.store().waiting.length === 0);
    expect(texts(server)).toEqual(['0', '1', '2', '3']);
    expect(server.arrived).toHaveLength(4);
    expect(server.mostInFlight).toBe(1);
  });

  it('without a shared lock the same two tabs do send twice: the control of the test above', async () => {
    const browser = { ...freshBrowser(), lock: <Result>(_: string, work: () => Promise<Result>) => work() };
    const server = new FakeServer(caseId, entries);
    const [one, other] = [await desk(browser, server), await desk(browser, server)];
    server.stop();
    for (const [index, tab] of [one, other, one, other].entries()) await tab.client.send(caseId, say(String(index)));
    server.start();
    await until(() => one.store().waiting.length + other.store().waiting.length === 0);
    expect(server.arrived.length).toBeGreaterThan(4);
    expect(texts(server)).toEqual(['0', '1', '2', '3']);
  });

  it('gives events the time of the server, also when the offset is measured only later', async () => {
    const browser = freshBrowser();
    const server = new FakeServer(caseId, entries);
    browser.clockMs = () => Date.parse('2027-03-14T11:00:00.000Z');
    server.nowMs = () => Date.parse('2027-03-14T11:05:00.000Z');
    const tab = await desk(browser, server);
    server.stop();
    await tab.client.send(caseId, say('Early'));
    expect(tab.store().waiting).toMatchObject([{ eventAt: '2027-03-14T11:00:00.000Z', isOffsetMeasured: false }]);
    browser.session = { kind: 'no-answer' };
    server.start();
    server.sockets.forEach((socket) => (socket.isFollowing = true));
    server.pulse();
    browser.session = { kind: 'person', personId: 'person-1', displayName: 'Neurophysiologist' };
    await until(() => tab.store().waiting.length === 0);
    expect(server.eventTimes).toEqual(['2027-03-14T11:05:00.000Z']);
  });

  it('shows the author the state that the server then commits', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    server.stop();
    const eventAtMs = Date.parse('2027-03-14T10:31:00.000Z');
    // The wall's "received" time is the server's own: the server stands at the event, so that the two can be equal.
    server.nowMs = () => eventAtMs;
    const lost = script.runBody('axilla', { adm: adm('axilla', 0.3) });
    await tab.client.send(caseId, { name: 'log-run', run: { ...lost, readings: [...lost.readings] } }, eventAtMs);
    await tab.client.send(caseId, { name: 'log-step', stepId: script.plan.steps[0]!.id, label: null }, eventAtMs + 1000);
    const provisional = provisionalState(tab.feed(caseId).state!, tab.store().waiting, server.author);
    expect(provisional.entries.map((entry) => entry.kind)).toContain('notice.raised');
    expect(provisional.refusals).toEqual([]);
    server.start();
    await until(() => tab.store().waiting.length === 0);
    expect(tab.feed(caseId).state).toEqual({ ...provisional.state, hash: server.state.hash });
    expect(tab.feed(caseId).state).toEqual(server.state);
  });

  it('never holds a command and its committed entry at once: the run would show twice', async () => {
    const server = new FakeServer(caseId, entries);
    const tab = await desk(freshBrowser(), server);
    const seen: number[] = [];
    tab.watch((store) => {
      const committed = store.feeds[caseId]?.entries.filter((entry) => entry.kind === 'message.sent').length ?? 0;
      seen.push(committed + store.waiting.length);
    });
    await tab.client.send(caseId, say('Once'));
    expect(Math.max(...seen)).toBe(1);
    expect(seen.at(-1)).toBe(1);
  });
});
