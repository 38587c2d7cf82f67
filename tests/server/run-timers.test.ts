import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { runTimers } from '@/server/commands/run-timers';

import { caseWithNotice } from './house/case-with-notice';
import { openSecondServer, type SecondServer } from './house/second-server';
import { commit, planCaseAs } from './house/client';
import { appendNewerEntry } from './house/newer-entry';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
let later: { ms: number };
const servers: SecondServer[] = [];

beforeAll(async () => {
  house = await openTestHouse();
  later = { ms: 0 };
  for (let count = 0; count < 3; count += 1) servers.push(openSecondServer(house, { nowMs: () => Date.now() + later.ms }));
});
afterAll(async () => {
  await Promise.all(servers.map((server) => server.close()));
  await house.close();
});

const kindsOf = async (caseId: string) => (await house.admin('entries').where({ case_id: caseId }).orderBy('seq').select('kind')).map(({ kind }: { kind: string }) => kind);

describe('runTimers', () => {
  test('raises the alert of a notice that was not repeated: once, by any number of servers, and not before its time', async () => {
    const caseId = await caseWithNotice(house, desk);
    expect(await kindsOf(caseId)).toContain('notice.raised');
    await Promise.all(servers.map(({ context }) => runTimers(context)));
    expect(await kindsOf(caseId)).not.toContain('alert.raised');
    later.ms = 120_000;
    await Promise.all([...servers, ...servers].map(({ context }) => runTimers(context)));
    const kinds = await kindsOf(caseId);
    expect(kinds.filter((kind) => kind === 'alert.raised')).toEqual(['alert.raised']);
    const raised = await house.admin('entries').where({ case_id: caseId, kind: 'alert.raised' }).first('author_role', 'command_id', 'body');
    expect(raised).toMatchObject({ author_role: 'timer', command_id: expect.stringMatching(/^repeat\/ulnar-1\/\d+$/), body: { isRepeated: false } });
  });

  test('runs in every other case when one was written by a newer program', async () => {
    const [server] = servers;
    if (server === undefined) throw new Error('Three servers were opened.');
    later.ms = 0;
    const unread = await planCaseAs(house, desk);
    await commit(house, desk, unread, { name: 'open-case', clockOffsetMs: null });
    await appendNewerEntry(house, server, unread);
    const caseId = await caseWithNotice(house, desk);
    expect(unread < caseId).toBe(true);
    later.ms = 120_000;
    await runTimers(server.context);
    expect(await kindsOf(caseId)).toContain('alert.raised');
  });
});
