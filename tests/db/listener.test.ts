import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { readPayload, type Ring } from '@/db/bell';
import { makeListener } from '@/db/listener';
import { ringBell } from '@/db/repositories/entries/ring-bell';
import { openRecordDatabase, type RecordDatabase } from './record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const ringOf = (n: number): Ring => ({ caseId: `018f0000-0000-7000-8000-${String(n).padStart(12, '0')}`, seq: n });

async function cutListeners(): Promise<number> {
  const { rows } = await db.admin.raw<{ rows: unknown[] }>(
    `select pg_terminate_backend(pid) from pg_stat_activity where application_name = 'fascicle bell' and datname = current_database()`,
  );
  return rows.length;
}

describe('makeListener', () => {
  test('hears every ring once and in order, also 250 at once, and nothing after it was stopped', async () => {
    const heard: Ring[] = [];
    const listener = makeListener(db.urls.feed, { onBell: (rings) => heard.push(...rings), onReconnect: () => undefined });
    await listener.ready;
    const rings = Array.from({ length: 250 }, (_, index) => ringOf(index + 1));
    await ringBell(db.database.app, rings);
    await vi.waitFor(() => expect(heard).toEqual(rings));
    await listener.stop();
    await vi.waitFor(async () => expect(await cutListeners()).toBe(0));
    await ringBell(db.database.app, [ringOf(999)]);
    expect(heard).toHaveLength(250);
  });

  test('listens again after its connection was cut, says so, and hears again', async () => {
    const heard: Ring[] = [];
    const onReconnect = vi.fn();
    const onLost = vi.fn();
    const listener = makeListener(db.urls.feed, { onBell: (rings) => heard.push(...rings), onReconnect, onLost });
    await listener.ready;
    for (let cut = 1; cut <= 3; cut += 1) {
      expect(await cutListeners()).toBe(1);
      await vi.waitFor(() => expect(onReconnect).toHaveBeenCalledTimes(cut), { timeout: 5000 });
      await ringBell(db.database.app, [ringOf(cut)]);
      await vi.waitFor(() => expect(heard.at(-1)).toEqual(ringOf(cut)));
    }
    expect(onLost).toHaveBeenCalledTimes(3);
    await listener.stop();
  });

  test('is not disturbed by something else on its channel', async () => {
    const onBell = vi.fn();
    const listener = makeListener(db.urls.feed, { onBell, onReconnect: () => undefined });
    await listener.ready;
    for (const payload of ['', 'x', '{}', '[1]', '[["a"]]', '[["a","b"]]']) await db.admin.raw('select pg_notify(?, ?)', ['fascicle_bell', payload]);
    await ringBell(db.database.app, [ringOf(1)]);
    await vi.waitFor(() => expect(onBell).toHaveBeenCalledWith([ringOf(1)]));
    expect(onBell).toHaveBeenCalledTimes(1);
    await listener.stop();
  });
});

describe('readPayload', () => {
  test('is null for what is no list of case and number', () => {
    for (const payload of ['', 'null', '7', '[[]]', '[[1,1]]', '[["a",1.5]]']) expect(readPayload(payload)).toBeNull();
    expect(readPayload('[["a",1]]')).toEqual([{ caseId: 'a', seq: 1 }]);
  });
});
