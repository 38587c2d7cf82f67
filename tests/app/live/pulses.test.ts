import { afterEach, describe, expect, it } from 'vitest';

import { PulseReader } from '@/app/_live/pulse-reader';
import { ServerClock } from '@/app/_live/server-clock';
import { freshBrowser, openTab, until, type Tab } from '@/tests/app/live/desk-tab';
import { FakeServer } from '@/tests/app/live/fake-server';
import { monitoredUlnar } from '@/tests/support/ulnar-case';

const { entries } = monitoredUlnar();
const caseId = entries[0]!.caseId;
const startMs = Date.parse('2027-03-14T11:00:00.000Z');
const tabs: Tab[] = [];
afterEach(() => tabs.splice(0).forEach((tab) => tab.kill()));

function reader() {
  const seen = { nowMs: startMs, fresh: [] as string[], stale: 0 };
  const pulses = new PulseReader({
    nowMs: () => seen.nowMs,
    publish: () => undefined,
    fresh: (pulse) => seen.fresh.push(pulse.checkedAt),
    alwaysStale: () => (seen.stale += 1),
  });
  const at = (browserMs: number, checkedMs: number) => {
    seen.nowMs = startMs + browserMs;
    pulses.read({ checkedAt: new Date(startMs + checkedMs).toISOString(), cases: [] });
  };
  return { seen, pulses, at };
}

describe('ServerClock', () => {
  it('takes the earliest arrival: a late pulse does not turn the clock back', () => {
    const clock = new ServerClock();
    clock.take(90_000, 30_000 + 40);
    clock.take(91_000, 31_000 + 5);
    clock.take(92_000, 32_000 + 2_700);
    expect(clock.offsetMs).toBe(59_995);
  });

  it('keeps the last offset over a new connection until the first pulse measures again', () => {
    const clock = new ServerClock();
    clock.take(5_000, 1_000);
    clock.restart();
    expect(clock.offsetMs).toBe(4_000);
    clock.take(9_000, 8_000);
    expect(clock.offsetMs).toBe(1_000);
  });

  it('knows nothing before the first pulse, and says so', () => {
    const clock = new ServerClock();
    expect(clock).toMatchObject({ offsetMs: 0, isMeasured: false });
  });
});

describe('PulseReader', () => {
  it('counts a check just under 3 s old and not one of 3 s', () => {
    const { seen, at } = reader();
    at(0, 0);
    at(3_999, 1_000);
    at(5_000, 2_000);
    expect(seen.fresh.map((text) => Date.parse(text) - startMs)).toEqual([0, 1_000]);
  });

  it('does not count an answer that was given before', () => {
    const { seen, at } = reader();
    at(0, 0);
    at(1_000, 0);
    expect(seen.fresh).toHaveLength(1);
  });

  it('asks for a new connection when all pulses were old for 5 s, and measures anew on it', () => {
    const { seen, pulses, at } = reader();
    at(0, 0);
    for (let second = 1; second <= 6; second += 1) at(second * 1000 + 60_000, second * 1000);
    expect(seen).toMatchObject({ stale: 1, fresh: { length: 1 } });
    pulses.restart();
    at(67_000, 7_000);
    expect(seen.fresh).toHaveLength(2);
  });

  it('passes over what is no pulse', () => {
    const { seen, pulses } = reader();
    pulses.read({ checkedAt: 'yesterday', cases: [] });
    pulses.read('pulse');
    expect(seen.fresh).toEqual([]);
    expect(pulses.clock.isMeasured).toBe(false);
  });
});

describe('LiveClient with pulses', () => {
  it('corrects its clock by the offset and marks the case as checked', async () => {
    const browser = freshBrowser();
    browser.clockMs = () => startMs - 90_000;
    const server = new FakeServer(caseId, entries);
    server.nowMs = () => startMs;
    const tab = await openTab(browser, server);
    tabs.push(tab);
    tab.client.follow(caseId, 'wall');
    await until(() => tab.feed(caseId).state?.seq === entries.length);
    expect(tab.feed(caseId).checkedAt).toBeNull();
    server.pulse();
    expect(tab.client.nowMs()).toBe(startMs);
    expect(tab.store().link).toMatchObject({ offsetMs: 90_000, isOffsetMeasured: true, lastCheckedAt: '2027-03-14T11:00:00.000Z' });
    expect(tab.feed(caseId)).toMatchObject({ checkedAt: '2027-03-14T11:00:00.000Z', deskConnected: true, wallsConnected: 1 });
  });
});
