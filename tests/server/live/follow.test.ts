import { v7 as newId } from 'uuid';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';

import { entriesMessageSchema, followReplySchema, pulseMessageSchema } from '@/lib/contracts/channel/messages';
import { contractVersion } from '@/lib/contracts/contract-version';

import { commit, envelope, planCaseAs, runCommand } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';

const desk = 'desk@demo.example';
let house: TestHouse;
let caseId: string;
const viewers: Viewer[] = [];

beforeAll(async () => {
  house = await openTestHouse();
  caseId = await planCaseAs(house, desk);
  await commit(house, desk, caseId, { name: 'open-case', clockOffsetMs: null });
});
afterAll(() => house.close());
afterEach(() => viewers.splice(0).forEach((viewer) => viewer.close()));

async function connect(email = desk, viewer: 'desk' | 'follow' = 'follow'): Promise<Viewer> {
  const connected = await connectViewer(house, { cookie: await house.cookieOf(email), viewer });
  viewers.push(connected);
  return connected;
}

const isDense = (viewer: Viewer) => viewer.got.every((entry, index) => index === 0 || (entry.seq === (viewer.got[index - 1]?.seq ?? 0) + 1 && entry.previousHash === viewer.got[index - 1]?.hash));

describe('follow', () => {
  test('gives what there is, then what comes, each entry once and chained', async () => {
    const viewer = await connect();
    const reply = await viewer.follow(caseId);
    expect(followReplySchema.safeParse(reply).success).toBe(true);
    for (let index = 0; index < 5; index += 1) await commit(house, desk, caseId, { name: 'send-message', text: `Message ${index}` });
    const last = await commit(house, desk, caseId, runCommand('wrist'));
    await expect.poll(() => viewer.got.at(-1)?.seq).toBe(last.at(-1)?.seq);
    expect(isDense(viewer)).toBe(true);
    expect(viewer.got[0]?.seq).toBe(1);
  });

  test('asked again from the last number gives only what is new', async () => {
    const viewer = await connect();
    const first = await viewer.follow(caseId);
    const head = first.kind === 'entries' ? first.headSeq : 0;
    viewer.close();
    await commit(house, desk, caseId, { name: 'send-message', text: 'While it was away' });
    const again = await connect();
    expect(await again.follow(caseId, head)).toMatchObject({ kind: 'entries', headSeq: head + 1, hasMore: false, entries: [{ seq: head + 1 }] });
  });

  test('what another process committed arrives by bell or poll', async () => {
    const viewer = await connect();
    await viewer.follow(caseId);
    const other = await openTestHouse({ database: house.database });
    try {
      const seen = globalThis.fascicle;
      const reply = await seen.execute('give-command', { caseId, request: envelope({ name: 'send-message', text: 'From the other process' }) }, { cookie: await house.cookieOf(desk), authorization: null, address: '127.0.0.1' });
      expect(reply.status).toBe(200);
      await expect.poll(() => JSON.stringify(viewer.got), { timeout: 3_000 }).toContain('From the other process');
      expect(isDense(viewer)).toBe(true);
    } finally {
      await other.close();
    }
  });

  test('refuses a foreign case, one that is not there, another contract and anything malformed, in words', async () => {
    const foreign = await connect('desk@other.example');
    const refused = await foreign.follow(caseId);
    expect(refused).toMatchObject({ kind: 'refused', code: 'not-found' });
    expect(await foreign.follow(newId())).toEqual(refused);
    await commit(house, desk, caseId, { name: 'send-message', text: 'Not for the other hospital' });
    expect(await foreign.follow(caseId, 0, 99)).toMatchObject({ code: 'newer-version' });
    for (const message of [null, 7, 'x', [], {}, { contractVersion, caseId, after: -1 }, { contractVersion, caseId: '\u0000', after: 0 }, { contractVersion, caseId, after: 0, extra: 1 }, Buffer.from([1, 2])]) {
      expect(await foreign.ask('follow', message)).toMatchObject({ kind: 'refused', code: 'bad-request', message: expect.stringMatching(/^Not a request/) });
    }
    expect(foreign.raw.join()).not.toContain('Not for the other hospital');
  });
});

describe('the pulse', () => {
  test('comes about once a second with the head, the database\'s time, and who is there', async () => {
    const [atDesk, away] = [await connect(desk, 'desk'), await connect()];
    for (const viewer of [atDesk, away]) await viewer.follow(caseId);
    await expect.poll(() => away.pulses.length, { timeout: 6_000 }).toBeGreaterThan(2);
    const pulse = away.pulses.at(-1);
    expect(pulseMessageSchema.safeParse(pulse).success).toBe(true);
    expect(pulse?.cases).toMatchObject([{ caseId, headSeq: away.got.at(-1)?.seq, headHash: away.got.at(-1)?.hash, deskConnected: true, wallsConnected: 0 }]);
    atDesk.close();
    await expect.poll(() => away.pulses.at(-1)?.cases[0]?.deskConnected, { timeout: 4_000 }).toBe(false);
    expect(away.pulses.at(-1)?.cases[0]?.deskSince).toMatch(/Z$/);
  });

  test('tells a viewer nothing of a case it does not follow', async () => {
    const viewer = await connect();
    await new Promise((resolve) => setTimeout(resolve, 1_500));
    expect(viewer.pulses).toEqual([]);
  });
});

describe('a command over the channel', () => {
  test('is answered as over HTTP: committed, repeated, refused, malformed, not theirs', async () => {
    const viewer = await connect(desk, 'desk');
    const request = { caseId, ...envelope({ name: 'send-message', text: 'Over the channel' }) };
    const first = await viewer.ask('command', request);
    expect(first).toMatchObject({ kind: 'committed', entries: [{ kind: 'message.sent' }] });
    expect(await viewer.ask('command', request)).toEqual(first);
    expect(await viewer.ask('command', { ...request, command: { name: 'send-message', text: 'Other' } })).toMatchObject({ kind: 'refused', code: 'command-id-used' });
    expect(await viewer.ask('command', { ...request, commandId: 'x' })).toMatchObject({ kind: 'refused', code: 'bad-request', field: 'commandId' });
    const foreign = await connect('desk@other.example', 'desk');
    expect(await foreign.ask('command', { ...request, commandId: newId() })).toMatchObject({ kind: 'refused', code: 'not-found' });
  });

  test('the wire holds to its contract', async () => {
    const viewer = await connect();
    const messages: unknown[] = [];
    viewer.socket.on('entries', (message) => messages.push(message));
    await viewer.follow(caseId);
    await commit(house, desk, caseId, runCommand('wrist'));
    await expect.poll(() => messages.length).toBeGreaterThan(0);
    for (const message of messages) expect(entriesMessageSchema.safeParse(message).error).toBeUndefined();
  });

  test('a flood is held back in words that say "send again", and ends nobody', async () => {
    const viewer = await connect(desk, 'desk');
    const answers = await Promise.all(Array.from({ length: 120 }, () => viewer.ask('follow', { contractVersion, caseId, after: 1_000_000 })));
    expect(answers.filter((answer) => (answer as { code?: string }).code === 'not-saved').length).toBeGreaterThan(20);
    expect(viewer.socket.connected).toBe(true);
  });
});
