import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { makeDatabase, makePool, type Database, type Handle } from '@/db/connection';
import { caseLog } from '@/db/read-models/case-log';
import type { CaseCommand } from '@/lib/case/commands';
import { commandDigest } from '@/lib/record/command-digest';
import { verifyChain } from '@/lib/record/verify-chain';
import { appendCommand } from '@/server/commands/append-command';
import { makeServerContext } from '@/server/make-server-context';
import type { ServerContext } from '@/server/server-context';
import { createLogger } from '@/server/telemetry/logger';

import { planCaseAs, runCommand } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

let house: TestHouse;
let admin: Handle;
const databases: Database[] = [];

/** A memory, a queue and pools of its own: what a second process would have. */
function anotherProcess(): ServerContext {
  const { appUrl, feedUrl, auditUrl, secret } = house.database;
  const database = makeDatabase({ app: appUrl, feed: feedUrl, audit: auditUrl });
  databases.push(database);
  return makeServerContext({ database, log: createLogger({ level: 'silent' }), publicUrl: house.url, secret, isDemo: true });
}

beforeAll(async () => {
  house = await openTestHouse();
  admin = makePool(house.database.adminUrl, 1, 'fascicle test');
});
afterAll(async () => {
  await Promise.all(databases.map((database) => database.close()));
  await admin.destroy();
  await house.close();
});

async function givenTo(context: ServerContext, caseId: string, command: CaseCommand, commandId: string = newId()) {
  const { hospital_id: hospitalId } = await admin('cases').where({ id: caseId }).first('hospital_id');
  const author = { id: 'test', role: 'neurophysiologist', displayName: 'Neurophysiologist' };
  const eventAt = new Date().toISOString();
  return appendCommand(context, { caseId, hospitalId, commandId, commandDigest: commandDigest(command), eventAt, author, command });
}

const logOf = (caseId: string) => caseLog(admin, caseId, { afterSeq: 0, limit: 10_000, kinds: null });

describe('two processes on one database', () => {
  test('write one case in turns without a gap, a double or a broken chain, and remember the same state', async () => {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    const [one, two] = [anotherProcess(), anotherProcess()];
    await givenTo(one, caseId, { name: 'open-case', clockOffsetMs: null });
    const replies = await Promise.all(
      Array.from({ length: 60 }, (_, index) => givenTo(index % 2 === 0 ? one : two, caseId, index % 5 === 0 ? (runCommand('wrist') as CaseCommand) : { name: 'send-message', text: `Message ${index}` })),
    );
    expect(replies.filter((reply) => reply.kind !== 'committed')).toEqual([]);
    const log = await logOf(caseId);
    expect(verifyChain(log.map(({ bytes, hash }) => ({ bytes, hash })))).toEqual({ ok: true, count: log.length });
    expect(new Set(log.map(({ entry }) => entry.commandId)).size).toBe(62);
    const [first, second] = [await one.memory.catchUp(caseId), await two.memory.catchUp(caseId)];
    expect(first).toEqual(second);
    expect(first).toEqual(await anotherProcess().memory.load(caseId));
  });

  test('one command id given to both at once is committed once and answered alike', async () => {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    const [one, two] = [anotherProcess(), anotherProcess()];
    const commandId = newId();
    const replies = await Promise.all([one, two].map((process) => givenTo(process, caseId, { name: 'open-case', clockOffsetMs: null }, commandId)));
    expect(replies[0]).toMatchObject({ kind: 'committed', entries: [{ seq: 2, kind: 'case.opened' }] });
    expect(replies[1]).toEqual(replies[0]);
    expect((await logOf(caseId)).length).toBe(2);
  });

  test('a memory that is behind never refuses what the log allows, nor allows what the log refuses', async () => {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    const [one, two] = [anotherProcess(), anotherProcess()];
    expect((await two.memory.load(caseId)).state.status).toBe('planned');
    await givenTo(one, caseId, { name: 'open-case', clockOffsetMs: null });
    // Two still believes "planned": it would refuse a phase, and would accept an opening.
    expect(await givenTo(two, caseId, { name: 'change-phase', phase: 'monitoring', reason: null })).toMatchObject({ kind: 'committed' });
    expect((await one.memory.load(caseId)).state.phase).toBe('set-up');
    expect(await givenTo(one, caseId, { name: 'change-phase', phase: 'monitoring', reason: null })).toMatchObject({ kind: 'refused', code: 'same-phase' });
  });

  test('the control: without its key the log would have taken both', async () => {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    const [one, two] = [anotherProcess(), anotherProcess()];
    await Promise.all([one.memory.load(caseId), two.memory.load(caseId)]);
    // Both stand at number 1 and decide from there; only the key makes the second one decide again.
    const replies = await Promise.all([one, two].map((process) => givenTo(process, caseId, { name: 'open-case', clockOffsetMs: null })));
    expect(replies.map((reply) => reply.kind).sort()).toEqual(['committed', 'refused']);
  });
});

describe('snapshots', () => {
  test('a case of over 500 entries is begun from its snapshot and folds to the same state', async () => {
    const caseId = await planCaseAs(house, 'desk@demo.example');
    const writer = anotherProcess();
    await givenTo(writer, caseId, { name: 'open-case', clockOffsetMs: null });
    for (let index = 0; index < 510; index += 1) await givenTo(writer, caseId, { name: 'send-message', text: `Message ${index}` });
    await expect.poll(async () => Number((await admin('case_snapshots').where({ case_id: caseId }).count('* as count').first())?.count)).toBe(1);
    const written = await writer.memory.load(caseId);
    const read = await anotherProcess().memory.load(caseId);
    expect(read).toEqual(written);
  }, 90_000);
});
