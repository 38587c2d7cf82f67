import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startWholeProduct, type WholeProduct } from '@/tests/support/start-whole-product';

const patienceMs = 30_000;
let product: WholeProduct;

async function isLive(): Promise<boolean> {
  return fetch(`${product.url}/api/health`, { signal: AbortSignal.timeout(2_000) }).then(
    ({ status }) => status === 200,
    () => false,
  );
}

async function untilLive(): Promise<boolean> {
  const until = performance.now() + patienceMs;
  while (performance.now() < until) {
    if (await isLive()) return true;
    await pause(50);
  }
  return false;
}

function kill9(...pids: number[]): void {
  for (const pid of pids) process.kill(pid, 'SIGKILL');
}

describe('npm start', () => {
  beforeAll(async () => {
    product = await startWholeProduct();
  });
  afterAll(() => product.remove());

  it('says where it is, who can sign in, how a wall is paired and how it is stopped', () => {
    expect(product.printed()).toContain(product.url);
    expect(product.printed()).toMatch(/desk@demo\.example.*\n[^]*npm run code -- --for desk@demo\.example[^]*Theatre screen: open [^]*Ctrl-C stops/);
  });

  it('cannot be taken for live while its server is down', async () => {
    kill9(product.pids().server);
    expect(await isLive()).toBe(false);
    expect(await untilLive()).toBe(true);
  });

  it.each([
    ['its server', () => [product.pids().server]],
    ['its database', () => [product.pids().database]],
    ['both', () => [product.pids().server, product.pids().database]],
  ])('is live again without a touch after a kill -9 of %s', async (_what, killed) => {
    const before = killed();
    kill9(...before);
    expect(await untilLive()).toBe(true);
    const { server, database } = product.pids();
    for (const pid of before) expect([server, database]).not.toContain(pid);
  });

  it.each([
    ['itself alone', () => [product.pids().starter]],
    ['itself and its database', () => [product.pids().starter, product.pids().database]],
    ['all three', () => [product.pids().starter, product.pids().server, product.pids().database]],
  ])('recovers at the next start after a kill -9 of %s', async (_what, killed) => {
    const before = product.pids();
    kill9(...killed());
    await product.startAgain();
    expect(await untilLive()).toBe(true);
    expect(product.pids().server).not.toBe(before.server);
  });

  it('stops all that it started when it is interrupted, and ends well', async () => {
    const { server, database } = product.pids();
    expect(await product.interrupt()).toBe(0);
    for (const pid of [server, database]) expect(() => process.kill(pid, 0)).toThrow('ESRCH');
  });
});
