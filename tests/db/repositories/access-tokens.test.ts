import { createHash, randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { accessTokensOf } from '@/db/repositories/tokens/access-tokens-of';
import { findTokenSession } from '@/db/repositories/tokens/find-token-session';
import { insertAccessToken } from '@/db/repositories/tokens/insert-access-token';
import { revokeAccessToken } from '@/db/repositories/tokens/revoke-access-token';
import { openRecordDatabase, type RecordDatabase } from '@/tests/db/record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

async function newToken(): Promise<{ id: string; tokenHash: Buffer }> {
  const token = { id: randomUUID(), tokenHash: createHash('sha256').update(randomUUID()).digest() };
  await insertAccessToken(db.database.app, { ...token, personId: db.hospital.deskId, label: 'A test', expiresAt: new Date(Date.now() + 60_000).toISOString() });
  return token;
}

describe('a token', () => {
  test('gives its person with the roles of this moment, and no reauthentication', async () => {
    const { id, tokenHash } = await newToken();
    const asked = () => findTokenSession(db.database.app, tokenHash);
    expect(await asked()).toMatchObject({ sessionId: id, personId: db.hospital.deskId, email: 'desk@north.example', reauthenticatedAt: null, memberships: [{ hospitalId: db.hospital.id, role: 'neurophysiologist' }] });
    await db.admin('memberships').where({ person_id: db.hospital.deskId }).update({ revoked_at: db.admin.fn.now() });
    expect(await asked()).toMatchObject({ memberships: [] });
    await db.admin('memberships').where({ person_id: db.hospital.deskId }).update({ revoked_at: null });
  });

  test.each([
    ['revoked', { revoked_at: '2027-01-01T00:00:00Z' }],
    ['past its time', { created_at: '2020-01-01T00:00:00Z', expires_at: '2020-02-01T00:00:00Z' }],
  ])('that is %s is nobody, and its use is not noted', async (_what, changes) => {
    const { id, tokenHash } = await newToken();
    await db.admin('access_tokens').where({ id }).update(changes);
    expect(await findTokenSession(db.database.app, tokenHash)).toBeNull();
    expect((await db.admin('access_tokens').where({ id }).first('last_used_at')).last_used_at).toBeNull();
  });

  test('notes its use, once a minute at most', async () => {
    const { id, tokenHash } = await newToken();
    const usedAt = async () => (await db.admin('access_tokens').where({ id }).first('last_used_at')).last_used_at as string | null;
    await findTokenSession(db.database.app, tokenHash);
    const first = await usedAt();
    expect(first).not.toBeNull();
    await findTokenSession(db.database.app, tokenHash);
    expect(await usedAt()).toBe(first);
    await db.admin('access_tokens').where({ id }).update({ last_used_at: db.admin.raw(`now() - interval '61 seconds'`) });
    await findTokenSession(db.database.app, tokenHash);
    expect(Date.parse((await usedAt()) ?? '')).toBeGreaterThanOrEqual(Date.parse(first ?? ''));
  });

  test('is revoked once, and stands in the list of its person only', async () => {
    const { id } = await newToken();
    expect([await revokeAccessToken(db.database.app, id), await revokeAccessToken(db.database.app, id), await revokeAccessToken(db.database.app, randomUUID())]).toEqual([true, false, false]);
    const listed = await accessTokensOf(db.database.app, db.hospital.deskId);
    expect(listed.find((line) => line.id === id)?.revokedAt).not.toBeNull();
    expect(await accessTokensOf(db.database.app, db.other.deskId)).toEqual([]);
  });
});

describe('the hash of a token', () => {
  test('is read by no login role, and no token is changed into another person\'s or made to last', async () => {
    const { id } = await newToken();
    for (const handle of [db.database.app, db.database.feed, db.database.audit]) await expect(handle('access_tokens').select('token_hash')).rejects.toMatchObject({ code: '42501' });
    for (const changes of [{ person_id: db.other.deskId }, { expires_at: '2099-01-01T00:00:00Z' }, { token_hash: Buffer.alloc(32) }]) {
      await expect(db.database.app('access_tokens').where({ id }).update(changes)).rejects.toMatchObject({ code: '42501' });
    }
    await expect(db.database.app('access_tokens').where({ id }).delete()).rejects.toMatchObject({ code: '42501' });
    await expect(db.database.feed.raw('select use_access_token(?)', [Buffer.alloc(32)])).rejects.toMatchObject({ code: '42501' });
  });
});
