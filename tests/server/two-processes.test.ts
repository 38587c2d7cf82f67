import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { caseLog } from '@/db/read-models/case-log';
import type { CaseCommand } from '@/lib/case/commands';
import { verifyChain } from '@/lib/record/verify-chain';

import { openSecondServer, type SecondServer } from './house/second-server';
import { planCaseAs, runCommand } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
const opened: SecondServer[] = [];

function secondServer(): SecondServer {
  const server = openSecondServer(house);
  opened.push(server);
  return server;
}

beforeAll(async () => {
  house = await openTestHouse();
});
afterAll(async () => {
  await Promise.all(opened.map((server) => server.close()));
  await house.close();
});

const logOf = (caseId: string) => caseLog(house.admin, caseId, { afterSeq: 0, limit: 10_000, kinds: null });

describe('two servers on one database', () => {
  test('write one case in turns without a gap, a double or a broken chain, and remember the same state', async () => {
    const caseId = await planCaseAs(house, desk);
    const [one, two] = [secondServer(), secondServer()];
    await one.give(caseId, { name: 'open-case', clockOffsetMs: null });
    const replies = await Promise.all(
      Array.from({ length: 60 }, (_, index) => (index % 2 === 0 ? one : two).give(caseId, index % 5 === 0 ? (runCommand('wrist') as CaseCommand) : { name: 'send-message', text: `Message ${index}` })),
    );
    expect(replies.filter((reply) => reply.kind !== 'committed')).toEqual([]);
    const log = await logOf(caseId);
    expect(verifyChain(log.map(({ bytes, hash }) => ({ bytes, hash })))).toEqual({ ok: true, count: log.length });
    expect(new Set(log.map(({ entry }) => entry.commandId)).size).toBe(62);
    const [first, second] = [await one.context.memory.catchUp(caseId), await two.context.memory.catchUp(caseId)];
    expect(first).toEqual(second);
    expect(first).toEqual(await secondServer().context.memory.load(caseId));
  });

  test('one command id given to both at once is committed once and answered alike', async () => {
    const caseId = await planCaseAs(house, desk);
    const [one, two] = [secondServer(), secondServer()];
    const commandId = newId();
    const replies = await Promise.all([one, two].map((server) => server.give(caseId, { name: 'open-case', clockOffsetMs: null }, commandId)));
    expect(replies[0]).toMatchObject({ kind: 'committed', entries: [{ seq: 2, kind: 'case.opened' }] });
    expect(replies[1]).toEqual(replies[0]);
    expect((await logOf(caseId)).length).toBe(2);
  });

  test('a memory that is behind never refuses what the log allows, nor allows what the log refuses', async () => {
    const caseId = await planCaseAs(house, desk);
    const [one, two] = [secondServer(), secondServer()];
    expect((await two.context.memory.load(caseId)).state.status).toBe('planned');
    await one.give(caseId, { name: 'open-case', clockOffsetMs: null });
    // Two still believes "planned": it would refuse a phase, and would accept an opening.
    expect(await two.give(caseId, { name: 'change-phase', phase: 'monitoring', reason: null })).toMatchObject({ kind: 'committed' });
    expect((await one.context.memory.load(caseId)).state.phase).toBe('set-up');
    expect(await one.give(caseId, { name: 'change-phase', phase: 'monitoring', reason: null })).toMatchObject({ kind: 'refused', code: 'same-phase' });
  });

  test('two openings decided from the same number: one is committed, the other is decided again and refused', async () => {
    const caseId = await planCaseAs(house, desk);
    const [one, two] = [secondServer(), secondServer()];
    await Promise.all([one.context.memory.load(caseId), two.context.memory.load(caseId)]);
    // Both stand at number 1 and decide from there; only the key makes the second one decide again.
    const replies = await Promise.all([one, two].map((server) => server.give(caseId, { name: 'open-case', clockOffsetMs: null })));
    expect(replies.map((reply) => reply.kind).sort()).toEqual(['committed', 'refused']);
  });
});

describe('snapshots', () => {
  test('a case of over 500 entries is begun from its snapshot and folds to the same state', async () => {
    const caseId = await planCaseAs(house, desk);
    const writer = secondServer();
    await writer.give(caseId, { name: 'open-case', clockOffsetMs: null });
    for (let index = 0; index < 510; index += 1) await writer.give(caseId, { name: 'send-message', text: `Message ${index}` });
    await expect.poll(async () => Number((await house.admin('case_snapshots').where({ case_id: caseId }).count('* as count').first())?.count)).toBe(1);
    const written = await writer.context.memory.load(caseId);
    const read = await secondServer().context.memory.load(caseId);
    expect(read).toEqual(written);
  }, 90_000);
});
