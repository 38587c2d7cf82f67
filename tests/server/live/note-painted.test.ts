import { afterAll, beforeAll, expect, test } from 'vitest';

import { notePainted } from '@/server/live/note-painted';
import type { LiveSocket } from '@/server/live/live-socket';
import { caseWithNotice } from '@/tests/server/house/case-with-notice';
import { commit, planCaseAs, runCommand } from '@/tests/server/house/client';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';
import { pairedWall } from '@/tests/server/house/paired-wall';
import { openSecondServer, type SecondServer } from '@/tests/server/house/second-server';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';

const desk = 'desk@demo.example';
let house: TestHouse;
let second: SecondServer;
let caseId: string;
let bound: Awaited<ReturnType<typeof pairedWall>>;
let wall: Viewer;

beforeAll(async () => {
  house = await openTestHouse();
  second = openSecondServer(house);
  caseId = await caseWithNotice(house, desk);
  bound = await pairedWall(house, desk, caseId);
  wall = await connectViewer(house, { cookie: bound.cookie, viewer: 'wall' });
  await wall.follow(caseId);
});
afterAll(async () => {
  wall.close();
  await second.close();
  await house.close();
});

const paintedEntries = () => house.admin('entries').where({ case_id: caseId, kind: 'alert.painted' }).orderBy('seq').select('command_id', 'author_id', 'author_role', 'author_display_name', 'body', 'event_at');
const lastSeq = async () => (await house.admin('entries').where({ case_id: caseId }).max('seq as seq').first())?.seq as number;
const seqOf = async (kind: string) => (await house.admin('entries').where({ case_id: caseId, kind }).max('seq as seq').first())?.seq as number;
const say = (seq: number, changes: object = {}) => wall.ask('painted', { caseId, seq, alertId: 'ulnar-1', paintedAt: new Date().toISOString(), ...changes });

test('what was painted before the finding was known, or what is no alert, is answered and not written', async () => {
  const raised = await seqOf('notice.raised');
  expect(await say(raised - 1)).toEqual({ kind: 'noted' });
  expect(await say(raised, { alertId: null })).toEqual({ kind: 'noted' });
  expect(await say(raised, { alertId: 'ulnar-7' })).toEqual({ kind: 'noted' });
  expect(await paintedEntries()).toEqual([]);
});

test.each([
  ['an entry that is not there', async () => ({ seq: (await lastSeq()) + 1 }), /no entry/],
  ['a time before the case', async () => ({ paintedAt: '2020-01-01T00:00:00.000Z' }), /Time too old/],
  ['a time to come', async () => ({ paintedAt: new Date(Date.now() + 3_600_000).toISOString() }), /Time ahead/],
])('%s is refused with a sentence', async (_what, changes, sentence) => {
  expect(await say(await lastSeq(), await changes())).toMatchObject({ kind: 'refused', message: expect.stringMatching(sentence) });
  expect(await paintedEntries()).toEqual([]);
});

test('the first paint is one entry in the name of the wall, whoever says it again and through whatever process', async () => {
  const seq = await lastSeq();
  const paintedAt = new Date().toISOString();
  const visitor = { kind: 'screen', screenId: bound.screenId, hospitalId: (await house.admin('cases').where({ id: caseId }).first('hospital_id')).hospital_id, caseId };
  const atSecond = { data: { visitor } } as unknown as LiveSocket;
  const answers = await Promise.all([
    ...Array.from({ length: 4 }, () => say(seq, { paintedAt })),
    ...Array.from({ length: 4 }, () => notePainted(second.context, atSecond, { caseId, seq, alertId: 'ulnar-1', paintedAt: new Date().toISOString() })),
    notePainted(second.context, atSecond, { caseId, seq, alertId: 'ulnar-1', paintedAt }),
  ]);
  expect(answers).toEqual(answers.map(() => ({ kind: 'noted' })));
  const written = await paintedEntries();
  expect(written).toMatchObject([{ command_id: `painted/ulnar-1/${seq}`, author_id: bound.screenId, author_role: 'screen', author_display_name: 'Theatre screen', body: { alertId: 'ulnar-1', entrySeq: seq, screenId: bound.screenId } }]);
  expect(written[0].event_at).toBe(written[0].body.paintedAt);
  // Its own entry reaches the wall as a number, and what it shows after that is not written again.
  await expect.poll(() => wall.got.at(-1)?.seq).toBe(seq + 1);
  expect(wall.got.at(-1)).toMatchObject({ kind: 'alert.painted', body: null });
  expect(await say(seq + 1)).toEqual({ kind: 'noted' });
  expect((await paintedEntries()).length).toBe(1);
});

test('the notice that became an alert is painted anew', async () => {
  await commit(house, desk, caseId, runCommand('wrist', 1_600));
  const raised = await seqOf('alert.raised');
  expect(await say(raised - 1)).toEqual({ kind: 'noted' });
  expect((await paintedEntries()).length).toBe(1);
  expect(await say(await lastSeq())).toEqual({ kind: 'noted' });
  expect((await paintedEntries()).map(({ body }: { body: { entrySeq: number } }) => body.entrySeq >= raised)).toEqual([false, true]);
});

test('a wall cannot confirm for another case; the attempt is in the audit', async () => {
  const other = await planCaseAs(house, desk);
  expect(await say(1, { caseId: other })).toMatchObject({ kind: 'refused' });
  expect(await house.admin('entries').where({ case_id: other, kind: 'alert.painted' })).toEqual([]);
  expect(await house.admin('read_audit').where({ case_id: other, screen_id: bound.screenId }).select('what', 'outcome')).toEqual([{ what: 'confirm-paint', outcome: 'denied' }]);
});

test('a person confirms nothing', async () => {
  const person = await connectViewer(house, { cookie: await house.cookieOf(desk), viewer: 'desk' });
  await person.follow(caseId);
  const message = { caseId, seq: await lastSeq(), alertId: 'ulnar-1', paintedAt: new Date().toISOString() };
  expect(await person.ask('painted', message)).toMatchObject({ kind: 'refused' });
  person.close();
});
