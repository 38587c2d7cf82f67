import { createHash } from 'node:crypto';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { acceptSecondFactorStep } from '@/db/repositories/people/accept-second-factor-step';
import { demoPeople } from '@/db/repositories/people/demo-people';
import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { findCredentialsByPerson } from '@/db/repositories/people/find-credentials-by-person';
import { liveMemberships } from '@/db/repositories/people/live-memberships';
import { membersOf } from '@/db/repositories/people/members-of';
import { findLiveSession } from '@/db/repositories/sessions/find-live-session';
import { findLiveSessions } from '@/db/repositories/sessions/find-live-sessions';
import { insertSession } from '@/db/repositories/sessions/insert-session';
import { noteReauthenticated } from '@/db/repositories/sessions/note-reauthenticated';
import { revokeSession } from '@/db/repositories/sessions/revoke-session';
import { removeOldAttempts } from '@/db/repositories/sign-in/remove-old-attempts';
import { beginAttempt, noteSuccess } from '@/db/repositories/sign-in/begin-attempt';
import { withinHospitals } from '@/db/within-hospitals';
import { openRecordDatabase, type RecordDatabase } from '@/tests/db/record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const inAnHour = () => new Date(Date.now() + 3_600_000).toISOString();

async function begin(expiresAt = inAnHour()): Promise<string> {
  const id = uuidv7();
  await insertSession(db.database.app, { id, personId: db.hospital.deskId, expiresAt });
  return id;
}

describe('credentials', () => {
  test('are found by address in any case of letters, and by person, with no hospital set', async () => {
    const expected = {
      personId: db.hospital.deskId, email: 'desk@north.example', displayName: 'neurophysiologist',
      passwordHash: 'hash of desk@north.example', secondFactorSecret: 'secret of desk@north.example', secondFactorStep: -1, isDemo: false,
    };
    expect(await findCredentialsByEmail(db.database.app, 'Desk@North.EXAMPLE')).toEqual(expected);
    expect(await findCredentialsByPerson(db.database.app, db.hospital.deskId)).toEqual(expected);
  });

  test('are not found for an unknown address, also not by a pattern', async () => {
    for (const email of ['nobody@north.example', '%', 'desk@north.example\' or true --']) expect(await findCredentialsByEmail(db.database.app, email)).toBeNull();
    expect(await findCredentialsByPerson(db.database.app, uuidv7())).toBeNull();
  });

  test('are listed for demo people only', async () => {
    expect(await demoPeople(db.database.app)).toEqual([]);
    await db.admin('people').where({ id: db.other.reviewerId }).update({ is_demo: true });
    expect((await demoPeople(db.database.app)).map(({ personId }) => personId)).toEqual([db.other.reviewerId]);
  });
});

describe('acceptSecondFactorStep', () => {
  test('takes a step once and never an earlier one', async () => {
    const accept = (step: number) => acceptSecondFactorStep(db.database.app, db.hospital.reviewerId, step);
    expect([await accept(100), await accept(100), await accept(99), await accept(101)]).toEqual([true, false, false, true]);
    expect((await findCredentialsByPerson(db.database.app, db.hospital.reviewerId))?.secondFactorStep).toBe(101);
  });

  test('takes it once also when eight requests race', async () => {
    const answers = await Promise.all(Array.from({ length: 8 }, () => acceptSecondFactorStep(db.database.app, db.other.deskId, 7)));
    expect(answers.filter(Boolean)).toHaveLength(1);
  });

  test('takes none for a person who is not there', async () => {
    expect(await acceptSecondFactorStep(db.database.app, uuidv7(), 1)).toBe(false);
  });
});

describe('findLiveSession', () => {
  test('gives the person and their present roles in one answer', async () => {
    const sessionId = await begin();
    expect(await findLiveSession(db.database.app, sessionId)).toMatchObject({
      sessionId, personId: db.hospital.deskId, email: 'desk@north.example', isDemo: false, reauthenticatedAt: null,
      memberships: [{ hospitalId: db.hospital.id, hospitalName: 'Hospital north', timeZone: 'Europe/London', role: 'neurophysiologist' }],
    });
  });

  test('gives nothing for one that is revoked, past its time or unknown', async () => {
    const revoked = await begin();
    expect([await revokeSession(db.database.app, revoked), await revokeSession(db.database.app, revoked)]).toEqual([true, false]);
    const past = await begin();
    await db.admin('sessions').where({ id: past }).update({ created_at: '2020-01-01Z', expires_at: '2020-01-02Z' });
    for (const id of [revoked, past, uuidv7()]) expect(await findLiveSession(db.database.app, id)).toBeNull();
    expect(await noteReauthenticated(db.database.app, revoked)).toBe(false);
  });

  test('gives the same for many at once, the live ones only', async () => {
    const [live, revoked] = [await begin(), await begin()];
    await revokeSession(db.database.app, revoked);
    const found = await findLiveSessions(db.database.app, [live, revoked, uuidv7()]);
    expect([...found]).toEqual([[live, await findLiveSession(db.database.app, live)]]);
  });

  test('drops a role as soon as the membership is revoked', async () => {
    const id = uuidv7();
    await insertSession(db.database.app, { id, personId: db.other.reviewerId, expiresAt: inAnHour() });
    expect((await findLiveSession(db.database.app, id))?.memberships).toHaveLength(1);
    await db.admin('memberships').where({ person_id: db.other.reviewerId }).update({ revoked_at: db.admin.fn.now() });
    expect((await findLiveSession(db.database.app, id))?.memberships).toEqual([]);
    expect(await liveMemberships(db.database.app, db.other.reviewerId)).toEqual([]);
    expect(await withinHospitals(db.database.app, [db.other.id], (transaction) => membersOf(transaction, db.other.id, 'reviewer'))).toEqual([]);
  });

  test('shows that the person gave their credentials again', async () => {
    const id = await begin();
    expect(await noteReauthenticated(db.database.app, id)).toBe(true);
    expect((await findLiveSession(db.database.app, id))?.reauthenticatedAt).toMatch(/^\d{4}-.+\.\d{3}Z$/);
  });
});

describe('membersOf', () => {
  test('finds people within the hospital only', async () => {
    const desk = { personId: db.hospital.deskId, email: 'desk@north.example', displayName: 'neurophysiologist' };
    const within = <Result>(work: Parameters<typeof withinHospitals<Result>>[2]) => withinHospitals(db.database.app, [db.hospital.id], work);
    expect(await within((transaction) => membersOf(transaction, db.hospital.id, 'neurophysiologist'))).toEqual([desk]);
    expect(await within((transaction) => membersOf(transaction, db.other.id, 'neurophysiologist'))).toEqual([]);
  });
});

describe('beginAttempt', () => {
  const limits = { windowS: 60, perAccount: 3, perAddress: 5 };
  const begin = (email: string, address: string, within: { readonly windowS: number } = limits) =>
    beginAttempt(db.database.app, { emailHash: createHash('sha256').update(email).digest(), address }, { ...limits, ...within });

  test('counts by address typed since its last success, and by machine, what stood before', async () => {
    expect(await begin('someone', '127.0.0.9')).toMatchObject({ byEmail: 0, byAddress: 0 });
    await begin('someone', '127.0.0.8');
    const { id, ...counted } = await begin('someone', '127.0.0.9');
    expect(counted).toEqual({ byEmail: 2, byAddress: 1 });
    await noteSuccess(db.database.app, id ?? -1);
    expect(await begin('someone', '127.0.0.9')).toMatchObject({ byEmail: 0, byAddress: 1 });
    await db.admin('sign_in_attempts').update({ at: db.admin.raw(`at - interval '2 minutes'`) });
    expect(await begin('someone', '127.0.0.9')).toMatchObject({ byEmail: 0, byAddress: 0 });
    expect(await begin('someone', '127.0.0.9', { windowS: 300 })).toMatchObject({ byEmail: 2, byAddress: 3 });
  });

  test('lets no more pass side by side than one after the other, of an account and of a machine, and counts none past it', async () => {
    const passed = (begun: readonly { readonly id: number | null }[]) => begun.filter(({ id }) => id !== null).length;
    const ofAccount = await Promise.all(Array.from({ length: 30 }, (_, index) => begin('guessed', `127.0.1.${index}`)));
    const ofMachine = await Promise.all(Array.from({ length: 30 }, (_, index) => begin(`guessed ${index}`, '127.0.2.1')));
    expect([passed(ofAccount), passed(ofMachine)]).toEqual([limits.perAccount, limits.perAddress]);
    expect(await begin('guessed', '127.0.3.1')).toEqual({ id: null, byEmail: limits.perAccount, byAddress: 0 });
  });
});

describe('removeOldAttempts', () => {
  test('removes attempts of more than 30 days ago and no others, for the application alone', async () => {
    await db.admin('sign_in_attempts').delete();
    const emailHash = createHash('sha256').update('old').digest();
    const at = (age: string) => db.admin('sign_in_attempts').insert({ email_hash: emailHash, address: age, succeeded: false, at: db.admin.raw('now() - ?::interval', [age]) });
    for (const age of ['31 days', '29 days', '1 minute']) await at(age);
    await expect(db.database.app('sign_in_attempts').delete()).rejects.toMatchObject({ code: '42501' });
    await expect(removeOldAttempts(db.database.feed)).rejects.toMatchObject({ code: '42501' });
    expect(await removeOldAttempts(db.database.app)).toBe(1);
    expect(await db.admin('sign_in_attempts').orderBy('id').pluck('address')).toEqual(['29 days', '1 minute']);
  });
});
