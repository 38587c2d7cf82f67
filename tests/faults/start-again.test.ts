import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startWholeProduct, type WholeProduct } from '@/tests/support/start-whole-product';

const patienceMs = 30_000;
type Pids = ReturnType<WholeProduct['pids']>;
let product: WholeProduct;

/** Server and database both answer. */
async function isLive(): Promise<boolean> {
  return fetch(`${product.url}/api/health`, { signal: AbortSignal.timeout(2_000) }).then(
    async (response) => response.status === 200 && ((await response.json()) as { isDatabaseAnswering: boolean }).isDatabaseAnswering,
    () => false,
  );
}

/** Waits for the product to answer with none of the killed programs: a database's last connections outlive it by a moment. */
async function untilLiveWithout(killed: readonly number[]): Promise<boolean> {
  const until = performance.now() + patienceMs;
  while (performance.now() < until) {
    const running = pidsOrNone();
    if (running.length > 0 && !running.some((pid) => killed.includes(pid)) && (await isLive())) return true;
    await pause(50);
  }
  return false;
}

function pidsOrNone(): number[] {
  try {
    return Object.values(product.pids());
  } catch {
    return [];
  }
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
    const { server } = product.pids();
    kill9(server);
    expect(await isLive()).toBe(false);
    expect(await untilLiveWithout([server])).toBe(true);
  });

  it.each([
    ['its server', ({ server }: Pids) => [server]],
    ['its database', ({ database }: Pids) => [database]],
    ['both', ({ server, database }: Pids) => [server, database]],
  ])('is live again without a touch after a kill -9 of %s', async (_what, choose) => {
    const killed = choose(product.pids());
    kill9(...killed);
    expect(await untilLiveWithout(killed)).toBe(true);
  });

  it.each([
    ['itself alone', ({ starter }: Pids) => [starter]],
    ['itself and its database', ({ starter, database }: Pids) => [starter, database]],
    ['all three', ({ starter, server, database }: Pids) => [starter, server, database]],
  ])('recovers at the next start after a kill -9 of %s', async (_what, choose) => {
    const before = product.pids();
    const killed = choose(before);
    kill9(...killed);
    await product.startAgain();
    expect(await untilLiveWithout([...killed, before.server])).toBe(true);
  });

  it('stops all that it started when it is interrupted, and ends well', async () => {
    const { server, database } = product.pids();
    expect(await product.interrupt()).toBe(0);
    // One that has ended keeps its number until its parent, by now the machine's first program, has taken note.
    for (const pid of [server, database]) await expect.poll(() => isThere(pid), { timeout: 5_000 }).toBe(false);
  });
});

function isThere(pid: number): boolean {
  try {
    return process.kill(pid, 0);
  } catch {
    return false;
  }
}
