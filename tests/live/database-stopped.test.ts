import { readdirSync, readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { startProduct, type Product } from '@/tests/support/start-product';
import { envelope, planRequest, send } from '@/tests/server/house/client';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';

import { signInAsDemo } from './sign-in-as';

let product: Product;
let viewer: Viewer;
let caseId: string;
let cookie: string;

beforeAll(async () => {
  product = await startProduct({ ownCluster: true });
  cookie = (await signInAsDemo(product, 'desk@demo.example')).header;
  const planned = await send(product, 'POST', '/api/cases', { cookie, body: planRequest() });
  caseId = (planned.body as { caseId: string }).caseId;
  viewer = await connectViewer(product, { cookie, viewer: 'desk' });
  await viewer.follow(caseId);
});
afterAll(async () => {
  viewer.close();
  await product.stop();
});

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** Pulses that came within this time. */
async function pulsesWithin(ms: number): Promise<number> {
  const before = viewer.pulses.length;
  await pause(ms);
  return viewer.pulses.length - before;
}

/** Every process of the cluster by real number: the postmaster and its children. */
function clusterPids(): number[] {
  const postmaster = product.databasePid();
  if (postmaster === null) throw new Error('There is no database of its own.');
  const children = readdirSync('/proc').filter((name) => /^\d+$/.test(name) && parentOf(name) === postmaster);
  return [postmaster, ...children.map(Number)];
}

function parentOf(pid: string): number {
  try {
    return Number(/\) \S (\d+) /.exec(readFileSync(`/proc/${pid}/stat`, 'utf8'))?.[1]);
  } catch {
    return 0;
  }
}

describe('the database under a living server', () => {
  test('the control: pulses come while it answers', async () => {
    await expect.poll(() => pulsesWithin(1_500), { timeout: 10_000 }).toBeGreaterThan(0);
  });

  test('killed: no pulse claims a time after its end, a command is told "not saved", and all is well again by itself', async () => {
    await product.cluster?.cluster().kill9();
    const endedAt = new Date();
    await pause(4_000);
    expect(viewer.pulses.filter((pulse) => new Date(pulse.checkedAt) > endedAt)).toEqual([]);
    expect(await pulsesWithin(2_000)).toBe(0);
    const request = envelope({ name: 'open-case', clockOffsetMs: null });
    const refused = await send(product, 'POST', `/api/cases/${caseId}/commands`, { cookie, body: request });
    expect([refused.status, refused.body]).toMatchObject([503, { kind: 'not-saved', message: expect.stringMatching(/^Not (saved|read): /) }]);
    const health = await send(product, 'GET', '/api/health');
    expect(health.body).toMatchObject({ isDatabaseAnswering: false });
    await product.cluster?.restart();
    await expect.poll(() => pulsesWithin(1_500), { timeout: 20_000 }).toBeGreaterThan(0);
    // The same command, sent again as the sentence says, is committed once.
    const saved = await send(product, 'POST', `/api/cases/${caseId}/commands`, { cookie, body: request });
    expect([saved.status, saved.body]).toMatchObject([200, { kind: 'committed', entries: [{ kind: 'case.opened', seq: 2 }] }]);
    await expect.poll(() => viewer.got.at(-1)?.seq, { timeout: 5_000 }).toBe(2);
    expect(viewer.disconnects).toEqual([]);
  });

  test('frozen with its connections open: no pulse within 3 s, none that claims a later time, and pulses again after', async () => {
    const pids = clusterPids();
    expect(pids.length).toBeGreaterThan(3);
    pids.forEach((pid) => process.kill(pid, 'SIGSTOP'));
    const frozenAt = new Date();
    try {
      await pause(1_000);
      expect(await pulsesWithin(4_000)).toBe(0);
    } finally {
      pids.forEach((pid) => process.kill(pid, 'SIGCONT'));
    }
    expect(viewer.pulses.filter((pulse) => new Date(pulse.checkedAt) > frozenAt)).toEqual([]);
    await expect.poll(() => pulsesWithin(1_500), { timeout: 20_000 }).toBeGreaterThan(0);
  });
});
