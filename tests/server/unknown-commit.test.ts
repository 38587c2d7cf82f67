import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import type { Database, Handle } from '@/db/connection';
import { isFailure } from '@/server/failure';

import { openSecondServer, type SecondServer } from './house/second-server';
import { planCaseAs } from './house/client';
import { openTestHouse, type TestHouse } from './house/open-test-house';

const desk = 'desk@demo.example';
let house: TestHouse;
let honest: SecondServer;

beforeAll(async () => {
  house = await openTestHouse();
  honest = openSecondServer(house);
});
afterAll(async () => {
  await honest.close();
  await house.close();
});

const entriesOf = async (caseId: string) => Number((await house.admin('entries').where({ case_id: caseId }).count('* as count').first())?.count);

/** A database whose appends fail once: before they are done, or after the commit, when only the answer is lost. */
function failingOnce(when: 'before' | 'after'): (database: Database) => Database {
  let hasFailed = false;
  return (database) => {
    const raw = async (...words: Parameters<Handle['raw']>): Promise<unknown> => {
      if (hasFailed || !String(words[0]).includes('insert into entries')) return database.app.raw(...words);
      hasFailed = true;
      if (when === 'after') await database.app.raw(...words);
      throw new Error('Connection terminated unexpectedly');
    };
    return { ...database, app: { raw } as unknown as Handle as Database['app'] };
  };
}

describe('an append whose answer is lost', () => {
  test('after the commit: the log is asked, the command is answered as committed, and nothing is doubled', async () => {
    const caseId = await planCaseAs(house, desk);
    const server = openSecondServer(house, { wrap: failingOnce('after') });
    expect(await server.give(caseId, { name: 'open-case', clockOffsetMs: null })).toMatchObject({ kind: 'committed', entries: [{ seq: 2 }] });
    expect(await server.give(caseId, { name: 'send-message', text: 'And on' })).toMatchObject({ kind: 'committed', entries: [{ seq: 3 }] });
    expect(await entriesOf(caseId)).toBe(3);
    await server.close();
  });

  test('before the commit: never acknowledged, and the same command sent again is committed once', async () => {
    const caseId = await planCaseAs(house, desk);
    const server = openSecondServer(house, { wrap: failingOnce('before') });
    const commandId = newId();
    const thrown: unknown = await server.give(caseId, { name: 'open-case', clockOffsetMs: null }, commandId).catch((cause: unknown) => cause);
    expect(isFailure(thrown) && thrown.reply).toMatchObject({ kind: 'not-saved', message: expect.stringMatching(/^Not saved: /) });
    expect(await entriesOf(caseId)).toBe(1);
    expect(await server.give(caseId, { name: 'open-case', clockOffsetMs: null }, commandId)).toMatchObject({ kind: 'committed', entries: [{ seq: 2 }] });
    await server.close();
  });

  test('a fault of a viewer after the commit does not turn the answer into a failure', async () => {
    const caseId = await planCaseAs(house, desk);
    const server = openSecondServer(house, {
      onCommitted: () => {
        throw new Error('A viewer broke.');
      },
    });
    expect(await server.give(caseId, { name: 'open-case', clockOffsetMs: null })).toMatchObject({ kind: 'committed' });
    await server.close();
  });
});
