import { afterAll, beforeAll, expect, test } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';
import { demoSession } from '@/tests/support/demo-session';
import { HttpDesk } from '@/tests/support/http-desk';
import { startProduct, type Product } from '@/tests/support/start-product';

let first: Product;
let second: Product;
let desk: HttpDesk;
let physicianCookie: string;

beforeAll(async () => {
  first = await startProduct();
  second = await startProduct({ database: first.database });
  physicianCookie = await demoSession(first, 'physician@demo.example');
  const session = await (await fetch(`${first.url}/api/session`, { headers: { cookie: physicianCookie } })).json();
  const { personId } = session as { personId: string };
  desk = await HttpDesk.plan(first, { ...ulnarAtElbow, theatre: 'Theatre 1' }, 'desk@demo.example', [{ personId, role: 'physician' }]);
});
afterAll(async () => {
  await second.stop();
  await first.stop();
});

const lastOf = (viewer: Viewer) => viewer.pulses.at(-1)?.cases[0];

/** A cookie by name stands for every port of a machine, so one session is good at both programs. */
async function watching(product: Product, cookie: string, viewer: 'desk' | 'follow' | 'wall'): Promise<Viewer> {
  const connected = await connectViewer(product, { cookie, viewer });
  expect((await connected.follow(desk.caseId)).kind).toBe('entries');
  return connected;
}

test('desk, wall and physician at different programs see each other, and see within 6 s that one was killed', async () => {
  const asked = await fetch(`${second.url}/api/screen`, { method: 'POST', headers: { origin: second.url, 'content-type': 'application/json' } });
  const wallCookie = (asked.headers.get('set-cookie') ?? '').split(';')[0] ?? '';
  await desk.pair(((await asked.json()) as { code: string }).code);
  const physician = await watching(first, physicianCookie, 'follow');
  const atDesk = await watching(second, desk.cookie, 'desk');
  const wall = await watching(second, wallCookie, 'wall');
  const everyone = [{ role: 'physician', displayName: 'Supervising physician' }, { role: 'neurophysiologist', displayName: 'Neurophysiologist' }];
  for (const viewer of [physician, atDesk]) {
    await expect.poll(() => lastOf(viewer), { timeout: 6_000 }).toMatchObject({ deskConnected: true, wallsConnected: 1, peopleConnected: everyone });
  }
  await expect.poll(() => lastOf(wall), { timeout: 6_000 }).toMatchObject({ deskConnected: true, peopleConnected: [] });
  // What the desk gives at one program reaches the physician at the other.
  const [opened] = await desk.give({ name: 'open-case', clockOffsetMs: 0 });
  await expect.poll(() => physician.got.at(-1)?.hash, { timeout: 5_000 }).toBe(opened?.hash);

  const killedAt = Date.now();
  await second.kill9();
  await expect.poll(() => lastOf(physician), { timeout: 6_000, interval: 50 }).toMatchObject({ deskConnected: false, wallsConnected: 0, peopleConnected: [everyone[0]] });
  // Since its last word: at most a second of writing before the kill.
  const since = Date.parse(lastOf(physician)?.deskSince ?? '');
  expect(since).toBeGreaterThan(killedAt - 3_000);
  expect(since).toBeLessThan(killedAt + 1_000);
  expect(physician.disconnects).toEqual([]);

  await second.restart();
  const again = await watching(second, desk.cookie, 'desk');
  await expect.poll(() => lastOf(physician), { timeout: 6_000 }).toMatchObject({ deskConnected: true, peopleConnected: everyone });
  for (const viewer of [again, physician]) viewer.close();
});

test('who leaves by themselves is gone for the other program within 3 s', async () => {
  const physician = await watching(first, physicianCookie, 'follow');
  const atDesk = await watching(second, desk.cookie, 'desk');
  await expect.poll(() => lastOf(physician)?.deskConnected, { timeout: 6_000 }).toBe(true);
  atDesk.close();
  await expect.poll(() => lastOf(physician)?.deskConnected, { timeout: 3_000, interval: 50 }).toBe(false);
  physician.close();
});
