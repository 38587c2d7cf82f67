import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openRecordDatabase, type RecordDatabase } from './record-database';

let db: RecordDatabase;
beforeAll(async () => {
  db = await openRecordDatabase();
});
afterAll(() => db.drop());

const one = async (sql: string) => (await db.database.app.raw<{ rows: Record<string, unknown>[] }>(sql)).rows[0]?.value;

describe('makeDatabase', () => {
  test('reads moments as RFC 3339 in UTC with milliseconds, whatever the session\'s zone', async () => {
    expect(await one(`select '2027-03-14 11:41:20.123+01'::timestamptz as value`)).toBe('2027-03-14T10:41:20.123Z');
    expect(await db.database.app.transaction(async (transaction) => {
      await transaction.raw(`set local time zone 'Asia/Kolkata'`);
      return (await transaction.raw<{ rows: { value: string }[] }>(`select '2027-03-14 10:41:20.123Z'::timestamptz as value`)).rows[0]?.value;
    })).toBe('2027-03-14T10:41:20.123Z');
  });

  test('reads a bigint as a number up to 2^53 − 1 and refuses to round a larger one', async () => {
    expect(await one('select 9007199254740991::bigint as value')).toBe(9007199254740991);
    await expect(one('select 9007199254740992::bigint as value')).rejects.toThrow(/holds 9007199254740992/);
  });

  test('reads bytes as a Buffer and null as null', async () => {
    expect(await one(`select '\\x00ff'::bytea as value`)).toEqual(Buffer.of(0, 255));
    expect(await one('select null::timestamptz as value')).toBeNull();
  });

  test('ends a statement after five seconds', async () => {
    expect(await one(`select current_setting('statement_timeout') as value`)).toBe('5s');
    await expect(one('select pg_sleep(10) as value')).rejects.toMatchObject({ code: '57014' });
  }, 15_000);
});
