import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';

import { pulseFacts } from '@/db/read-models/pulse-facts';
import { elsewhere } from '@/db/repositories/presence/elsewhere';
import { holdPresence, type HeldViewer } from '@/db/repositories/presence/hold-presence';
import { addCase, openRecordDatabase, type RecordDatabase } from '@/tests/db/record-database';

let db: RecordDatabase;
let caseId: string;
const [here, there] = [randomUUID(), randomUUID()];
const since = '2027-03-14T10:00:00.250Z';

beforeAll(async () => {
  db = await openRecordDatabase();
  ({ caseId } = await addCase(db.database.app, db.hospital));
});
afterAll(() => db.drop());
beforeEach(() => db.admin('case_presence').delete());

function desk(viewerId = 'socket-1'): HeldViewer {
  return { viewerId, hospitalId: db.hospital.id, caseId, personId: db.hospital.deskId, screenId: null, role: 'neurophysiologist', displayName: 'Neurophysiologist', isDesk: true, since };
}
const wall = (): HeldViewer => ({ ...desk('socket-2'), personId: null, screenId: randomUUID(), role: 'screen', displayName: '', isDesk: false });
const seen = (processId: string) => elsewhere(db.database.feed, caseId, processId);

describe('holdPresence', () => {
  test('tells other processes, and not its own, who is there', async () => {
    await holdPresence(db.database.app, there, [desk(), wall()]);
    const { viewers, deskGoneAt } = await seen(here);
    expect(viewers.map(({ role }) => role).toSorted()).toEqual(['neurophysiologist', 'screen']);
    expect(viewers.find(({ isDesk }) => isDesk)).toEqual({ personId: db.hospital.deskId, screenId: null, role: 'neurophysiologist', displayName: 'Neurophysiologist', isDesk: true, since });
    expect([deskGoneAt, await seen(there)]).toEqual([null, { viewers: [], deskGoneAt: null }]);
  });

  test('lets go of whom it does not name, and says when the desk went', async () => {
    await holdPresence(db.database.app, there, [desk(), wall()]);
    const before = Date.now() - 2_000;
    await holdPresence(db.database.app, there, [wall()]);
    const { viewers, deskGoneAt } = await seen(here);
    expect(viewers.map(({ role }) => role)).toEqual(['screen']);
    expect(Date.parse(deskGoneAt ?? '')).toBeGreaterThan(before);
    await holdPresence(db.database.app, there, [desk(), wall()]);
    expect(await seen(here)).toMatchObject({ viewers: [{}, {}], deskGoneAt: null });
  });

  test.each([[3, 2], [5, 0]])('a process that said nothing for %i s has %i viewers', async (ageS, count) => {
    await holdPresence(db.database.app, there, [desk(), wall()]);
    await db.admin('case_presence').update({ seen_at: db.admin.raw('now() - make_interval(secs => ?)', [ageS]) });
    const { viewers, deskGoneAt } = await seen(here);
    expect([viewers.length, deskGoneAt === null]).toEqual([count, count > 0]);
  });

  test('removes what is over a day old of every process, and nothing younger', async () => {
    await holdPresence(db.database.app, there, [desk('old'), desk('young')]);
    await db.admin('case_presence').where({ viewer_id: 'old' }).update({ seen_at: db.admin.raw(`now() - interval '25 hours'`) });
    await db.admin('case_presence').where({ viewer_id: 'young' }).update({ seen_at: db.admin.raw(`now() - interval '23 hours'`) });
    await holdPresence(db.database.app, here, [desk('mine')]);
    expect((await db.admin('case_presence').pluck('viewer_id')).toSorted()).toEqual(['mine', 'young']);
  });

  test('refuses a case under another hospital', async () => {
    await expect(holdPresence(db.database.app, there, [{ ...desk(), hospitalId: db.other.id }])).rejects.toMatchObject({ code: '23503' });
  });
});

describe('pulseFacts', () => {
  test('gives heads and presence of each case in one query, and the time without any case', async () => {
    const { caseId: quiet } = await addCase(db.database.app, db.other);
    await holdPresence(db.database.app, there, [desk()]);
    const facts = await pulseFacts(db.database.feed, [caseId, quiet], here);
    expect([...facts.heads].map(([id, { seq }]) => [id, seq])).toEqual([[caseId, 1], [quiet, 1]]);
    expect(facts.elsewhere.get(caseId)?.viewers).toMatchObject([{ personId: db.hospital.deskId }]);
    expect(facts.elsewhere.get(quiet)).toEqual({ viewers: [], deskGoneAt: null });
    const none = await pulseFacts(db.database.feed, [], here);
    expect([none.heads.size, none.elsewhere.size, Number.isNaN(Date.parse(none.checkedAt))]).toEqual([0, 0, false]);
  });
});

test('the table is written by its function only, and read by the feed only', async () => {
  await expect(db.database.app('case_presence').select()).rejects.toMatchObject({ code: '42501' });
  await expect(db.database.app('case_presence').delete()).rejects.toMatchObject({ code: '42501' });
  await expect(db.database.feed('case_presence').delete()).rejects.toMatchObject({ code: '42501' });
  await expect(db.database.feed.raw(`select hold_presence(?, '[]')`, [here])).rejects.toMatchObject({ code: '42501' });
  await expect(db.database.audit('case_presence').select()).rejects.toMatchObject({ code: '42501' });
});
