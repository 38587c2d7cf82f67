import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { noteRead } from '@/db/repositories/reads/note-read';
import { askPairing } from '@/db/repositories/screens/ask-pairing';
import { endScreensForCase } from '@/db/repositories/screens/end-screens-for-case';
import { findScreenByToken } from '@/db/repositories/screens/find-screen-by-token';
import { findWaitingScreen } from '@/db/repositories/screens/find-waiting-screen';
import { liveScreenIds } from '@/db/repositories/screens/live-screen-ids';
import { noteScreenSeen } from '@/db/repositories/screens/note-screen-seen';
import { pairScreen } from '@/db/repositories/screens/pair-screen';
import { removeOldScreens } from '@/db/repositories/screens/remove-old-screens';
import { revokeScreen } from '@/db/repositories/screens/revoke-screen';
import { screensOfCase } from '@/db/repositories/screens/screens-of-case';
import { withinHospitals } from '@/db/within-hospitals';
import { addCase, openRecordDatabase, type RecordDatabase, type TestHospital } from '@/tests/db/record-database';

let db: RecordDatabase;
let caseId: string;
beforeAll(async () => {
  db = await openRecordDatabase();
  ({ caseId } = await addCase(db.database.app, db.hospital));
});
afterAll(() => db.drop());

const within = <Result>(hospital: TestHospital, work: (transaction: Knex.Transaction) => Promise<Result>) => withinHospitals(db.database.app, [hospital.id], work);
const tokenHash = (screenId: string) => createHash('sha256').update(screenId).digest();

async function ask(code: string): Promise<string> {
  const id = uuidv7();
  await askPairing(db.database.app, { id, tokenHash: tokenHash(id), code, words: 'amber lantern' });
  return id;
}
const pairing = (screenId: string) => ({ screenId, hospitalId: db.hospital.id, theatreId: db.hospital.theatreId, caseId, pairedBy: db.hospital.deskId });

describe('a wall', () => {
  test('asks, is found by its code in any hospital but not without one, and is bound to one case once', async () => {
    const id = await ask('PAIR01');
    expect(await findWaitingScreen(db.database.app, 'PAIR01', 600)).toBeNull();
    expect(await within(db.hospital, (transaction) => findWaitingScreen(transaction, 'PAIR01', 600))).toMatchObject({ id, words: 'amber lantern', caseId: null });
    expect(await within(db.hospital, (transaction) => pairScreen(transaction, pairing(id)))).toBe(true);
    expect(await within(db.hospital, (transaction) => pairScreen(transaction, pairing(id)))).toBe(false);
    expect(await within(db.hospital, (transaction) => findWaitingScreen(transaction, 'PAIR01', 600))).toBeNull();
    expect(await findScreenByToken(db.database.app, tokenHash(id))).toMatchObject({ id, caseId, hospitalId: db.hospital.id, revokedAt: null, endedAt: null });
  });

  test('is not found by a code that was asked for too long ago, or by a wrong token', async () => {
    const id = await ask('PAIR02');
    await db.admin('wall_screens').where({ id }).update({ asked_at: db.admin.raw(`now() - interval '11 minutes'`) });
    expect(await within(db.hospital, (transaction) => findWaitingScreen(transaction, 'PAIR02', 600))).toBeNull();
    expect(await findScreenByToken(db.database.app, tokenHash('other'))).toBeNull();
  });

  test('has a code of its own while it waits', async () => {
    const id = await ask('PAIR03');
    await expect(ask('PAIR03')).rejects.toMatchObject({ code: '23505', constraint: 'wall_screens_code' });
    await within(db.hospital, (transaction) => pairScreen(transaction, pairing(id)));
    await expect(ask('PAIR03')).resolves.toBeDefined();
  });

  test('cannot ask in the name of a hospital, nor be taken into another one than the reader\'s, nor be half bound', async () => {
    const bound = { id: uuidv7(), token_hash: tokenHash('bound'), code: 'PAIR04', words: 'amber lantern', hospital_id: db.hospital.id, case_id: caseId, paired_at: new Date(), paired_by: db.hospital.deskId };
    await expect(db.database.app('wall_screens').insert(bound)).rejects.toMatchObject({ code: '42501' });
    const id = await ask('PAIR05');
    await expect(within(db.other, (transaction) => pairScreen(transaction, pairing(id)))).rejects.toMatchObject({ code: '42501' });
    await expect(within(db.other, (transaction) => pairScreen(transaction, { ...pairing(id), hospitalId: db.other.id, theatreId: null }))).rejects.toMatchObject({ code: '23503' });
    await expect(within(db.hospital, (transaction) => transaction('wall_screens').where({ id }).update({ hospital_id: db.hospital.id }))).rejects.toMatchObject({ code: '23514' });
  });

  test('is revoked by its own hospital only, for good, and the sweep no longer names it', async () => {
    const id = await ask('PAIR06');
    await within(db.hospital, (transaction) => pairScreen(transaction, pairing(id)));
    expect(await liveScreenIds(db.database.feed, [id])).toEqual(new Set([id]));
    expect(await within(db.other, (transaction) => revokeScreen(transaction, id))).toBe(false);
    expect(await within(db.hospital, (transaction) => revokeScreen(transaction, id))).toBe(true);
    expect(await within(db.hospital, (transaction) => revokeScreen(transaction, id))).toBe(false);
    expect(await liveScreenIds(db.database.feed, [id])).toEqual(new Set());
    expect((await findScreenByToken(db.database.app, tokenHash(id)))?.revokedAt).not.toBeNull();
  });

  test('ends with its case', async () => {
    const ended = await addCase(db.database.app, db.hospital);
    const id = await ask('PAIR07');
    await within(db.hospital, (transaction) => pairScreen(transaction, { ...pairing(id), caseId: ended.caseId }));
    await within(db.hospital, (transaction) => noteScreenSeen(transaction, id));
    expect(await within(db.hospital, (transaction) => screensOfCase(transaction, ended.caseId))).toMatchObject([{ id, lastSeenAt: expect.any(String) as string }]);
    expect(await within(db.hospital, (transaction) => endScreensForCase(transaction, ended.caseId))).toEqual([id]);
    expect(await within(db.hospital, (transaction) => endScreensForCase(transaction, ended.caseId))).toEqual([]);
    expect(await liveScreenIds(db.database.feed, [id])).toEqual(new Set());
    expect((await findScreenByToken(db.database.app, tokenHash(id)))?.endedAt).not.toBeNull();
  });
});

describe('removeOldScreens', () => {
  const ageOf = (id: string, columns: Record<string, string>) => db.admin('wall_screens').where({ id }).update(Object.fromEntries(Object.entries(columns).map(([name, age]) => [name, db.admin.raw('now() - ?::interval', [age])])));
  const isThere = async (id: string) => (await db.admin('wall_screens').where({ id })).length === 1;
  const bound = async (code: string) => {
    const id = await ask(code);
    await within(db.hospital, (transaction) => pairScreen(transaction, pairing(id)));
    return id;
  };

  test('removes walls that were never bound after a day, and those through for 30 days that no read names', async () => {
    const [asking, given, up, live, ended, revoked, named] = [await ask('OLD001'), await ask('OLD002'), await ask('OLD003'), await bound('OLD004'), await bound('OLD005'), await bound('OLD006'), await bound('OLD007')];
    await ageOf(given, { asked_at: '23 hours' });
    await ageOf(up, { asked_at: '25 hours' });
    await ageOf(live, { asked_at: '400 days', paired_at: '400 days' });
    await ageOf(ended, { ended_at: '29 days' });
    await ageOf(revoked, { ended_at: '40 days', revoked_at: '31 days' });
    await ageOf(named, { ended_at: '40 days' });
    await noteRead(db.database.app, { hospitalId: db.hospital.id, personId: null, screenId: named, caseId, what: 'follow', outcome: 'allowed', rule: 'wall-of-the-case' });
    expect(await removeOldScreens(db.database.app)).toBe(2);
    const left = await Promise.all([asking, given, up, live, ended, revoked, named].map(isThere));
    expect(left).toEqual([true, true, false, true, true, false, true]);
    expect(await removeOldScreens(db.database.app)).toBe(0);
  });

  test('is the only way: the application deletes no wall, and nobody else may ask', async () => {
    await expect(within(db.hospital, (transaction) => transaction('wall_screens').delete())).rejects.toMatchObject({ code: '42501' });
    for (const handle of [db.database.feed, db.database.audit]) await expect(removeOldScreens(handle)).rejects.toMatchObject({ code: '42501' });
  });
});
