import { Client } from 'pg';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';

import { signInAsDemo } from '@/tests/live/sign-in-as';
import { envelope, planRequest, send } from '@/tests/server/house/client';
import { launchChromium } from '@/tests/support/chromium';
import { startProduct, type Product } from '@/tests/support/start-product';

import { findLosses, type LogRow } from './find-losses';
import { startWriter, type Writer } from './journal';
import { openWatchedWall, type WatchedWall } from './watched-wall';

/** Twenty of each in the full form; the short form shows the same on a few. */
const killCount = process.env.FASCICLE_TEST_FULL === '1' ? 20 : 4;
/** A screen says that it is not live within this time of silence. Safety deadline of the product. */
const notLiveWithinMs = 3_000;
/** What the sampling of the page and of the machine may add. */
const samplingMs = 150;

let product: Product;
let browser: Browser;
let wall: WatchedWall;
let writer: Writer;
let isWriting = false;
let caseId: string;

beforeAll(async () => {
  product = await startProduct({ ownCluster: true });
  browser = await launchChromium();
  const cookie = (await signInAsDemo(product, 'desk@demo.example')).header;
  const planned = await send(product, 'POST', '/api/cases', { cookie, body: planRequest() });
  caseId = (planned.body as { caseId: string }).caseId;
  await send(product, 'POST', `/api/cases/${caseId}/commands`, { cookie, body: envelope({ name: 'open-case', clockOffsetMs: null }) });
  wall = await openWatchedWall(browser, product, { cookie, caseId });
  await wall.waitUntilLive(20_000);
  writer = startWriter({ url: product.url, cookie, caseId });
  isWriting = true;
  await vi.waitUntil(() => writer.acknowledged().length > 3, { timeout: 20_000 });
});
afterAll(async () => {
  if (isWriting) await writer.stop();
  await browser.close();
  await product.stop();
});

/** Waits for a command in flight, so that the kill lands between its sending and its answer. */
async function commandInFlight(): Promise<boolean> {
  const until = performance.now() + 2_000;
  while (performance.now() < until) {
    if (writer.isInFlight()) return true;
    await new Promise((resolve) => setTimeout(resolve, 1));
  }
  return false;
}

async function log(): Promise<LogRow[]> {
  const client = new Client({ connectionString: product.database.adminUrl });
  await client.connect();
  const { rows } = await client.query<{ seq: string; command_id: string; command_part: number }>('select seq, command_id, command_part from entries where case_id = $1 order by seq', [caseId]);
  await client.end();
  return rows.map((row) => ({ seq: Number(row.seq), commandId: row.command_id, commandPart: row.command_part }));
}

async function killAndRecover(kill: () => Promise<void>, recover: () => Promise<void>): Promise<{ wasInFlight: boolean; notLiveAfterMs: number }> {
  const before = writer.acknowledged().length;
  const wasInFlight = await commandInFlight();
  await kill();
  const killedAtMs = Date.now();
  const notLiveAfterMs = (await wall.notLiveSince(killedAtMs, 10_000)) - killedAtMs;
  await recover();
  await wall.waitUntilLive(20_000);
  await expect.poll(() => writer.acknowledged().length, { timeout: 20_000 }).toBeGreaterThan(before + 1);
  return { wasInFlight, notLiveAfterMs };
}

describe('kill -9 with a command in flight', () => {
  const cases = [
    { name: 'the server', kill: () => product.kill9(), recover: () => product.restart() },
    { name: 'PostgreSQL', kill: async () => void (await product.cluster?.cluster().kill9()), recover: async () => void (await product.cluster?.restart()) },
  ];
  test.each(cases)(
    `of $name, ${killCount} times: nothing acknowledged is missing, the wall is not live within 3 s and live again without a touch`,
    async ({ name, kill, recover }) => {
      const rounds = [];
      for (let round = 0; round < killCount; round += 1) rounds.push(await killAndRecover(kill, recover));
      const acknowledged = writer.acknowledged();
      const losses = findLosses(acknowledged, await log());
      expect(losses).toEqual({ missing: [], renumbered: [], duplicated: [], reordered: [], gaps: [] });
      const latest = Math.max(...rounds.map((round) => round.notLiveAfterMs));
      const inFlight = rounds.filter((round) => round.wasInFlight).length;
      console.log(`faults: ${name} killed ${killCount} times, ${inFlight} with a command in flight, ${acknowledged.length} acknowledged, 0 lost, not live after ${latest} ms at the latest`);
      expect(latest).toBeLessThanOrEqual(notLiveWithinMs + samplingMs);
      expect(inFlight).toBeGreaterThan(killCount / 2);
    },
    900_000,
  );
});
