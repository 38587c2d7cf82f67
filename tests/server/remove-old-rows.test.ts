import { afterAll, beforeAll, expect, test } from 'vitest';

import { createTestDatabase, type TestDatabase } from '@/tests/support/database';
import { makePool, type Handle } from '@/db/connection';

import { openTestHouse, type TestHouse } from './house/open-test-house';

let database: TestDatabase;
let admin: Handle;
let house: TestHouse | null = null;

beforeAll(async () => {
  database = await createTestDatabase('demo');
  admin = makePool(database.adminUrl, 1, 'fascicle test');
});
afterAll(async () => {
  await house?.close();
  await admin.destroy();
  await database.drop();
});

test('a start removes what strangers left long ago, and says how much in its log', async () => {
  const attempt = (address: string, age: string) => admin('sign_in_attempts').insert({ email_hash: Buffer.alloc(32), address, succeeded: false, at: admin.raw('now() - ?::interval', [age]) });
  await attempt('198.51.100.1', '31 days');
  await attempt('198.51.100.2', '1 day');
  await admin('wall_screens').insert({ id: '018f0000-0000-7000-8000-00000000abcd', token_hash: Buffer.alloc(32), code: 'ACDEFH', words: 'amber lantern', asked_at: admin.raw(`now() - interval '2 days'`) });
  const logLines: string[] = [];
  house = await openTestHouse({ database, logLines });
  await expect.poll(async () => [await admin('sign_in_attempts').pluck('address'), await admin('wall_screens').pluck('id')]).toEqual([['198.51.100.2'], []]);
  await expect.poll(() => logLines.some((line) => line.includes('"attempts":1,"screens":1'))).toBe(true);
});
