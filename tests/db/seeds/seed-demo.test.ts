import { verify } from '@node-rs/argon2';
import { generate, verify as verifyCode } from 'otplib';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { makePool } from '@/db/connection';
import { demoPeople } from '@/db/repositories/people/demo-people';
import { liveMemberships } from '@/db/repositories/people/live-memberships';
import { DEMO_PASSWORD } from '@/db/seeds/demo-people';
import { isEmptyDatabase } from '@/db/seeds/is-empty-database';
import { seedDemo } from '@/db/seeds/seed-demo';
import { createTestDatabase } from '@/tests/support/database';

let made: Awaited<ReturnType<typeof createTestDatabase>>;
let admin: ReturnType<typeof makePool>;
let app: ReturnType<typeof makePool>;
beforeAll(async () => {
  made = await createTestDatabase();
  admin = makePool(made.adminUrl, 1, 'test administrator');
  app = makePool(made.appUrl, 1, 'test application');
});
afterAll(async () => {
  await Promise.all([admin.destroy(), app.destroy()]);
  await made.drop();
});

describe('seedDemo', () => {
  test('fills an empty database with two hospitals, their theatres and people by role, and only once', async () => {
    expect(await isEmptyDatabase(admin)).toBe(true);
    await seedDemo(admin);
    expect(await isEmptyDatabase(admin)).toBe(false);
    await expect(seedDemo(admin)).rejects.toThrow('The database is not empty; a demo is put into an empty one only.');
    expect(await admin('hospitals').count()).toEqual([{ count: 2 }]);
    expect(await admin('theatres').count()).toEqual([{ count: 12 }]);
    const roles = await Promise.all((await demoPeople(app)).map(async ({ email, personId }) => [email, (await liveMemberships(app, personId)).map(({ role }) => role)]));
    expect(roles).toEqual([
      ['admin@demo.example', ['administrator']],
      ['desk@demo.example', ['neurophysiologist']],
      ['desk@other.example', ['neurophysiologist']],
      ['physician@demo.example', ['physician']],
      ['reviewer@demo.example', ['reviewer']],
      ['surgeon@demo.example', ['surgeon']],
    ]);
  });

  test('gives each a password under argon2id and a second-factor secret of their own that makes codes', async () => {
    const people = await demoPeople(app);
    expect(new Set(people.map(({ secondFactorSecret }) => secondFactorSecret)).size).toBe(6);
    for (const { passwordHash, secondFactorSecret, isDemo } of people) {
      expect(isDemo).toBe(true);
      expect(passwordHash).toMatch(/^\$argon2id\$/);
      expect(await verify(passwordHash, DEMO_PASSWORD)).toBe(true);
      expect(await verify(passwordHash, `${DEMO_PASSWORD}x`)).toBe(false);
      expect((await verifyCode({ secret: secondFactorSecret, token: await generate({ secret: secondFactorSecret }) })).valid).toBe(true);
    }
  });
});
