import { execFile } from 'node:child_process';
import { readdirSync } from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { createTestDatabase } from '@/tests/support/database';

interface Steps {
  readonly pending: number;
  readonly count: number;
  readonly up: readonly (readonly string[])[];
  readonly down: readonly (readonly string[])[];
  readonly again: readonly string[];
}

let made: Awaited<ReturnType<typeof createTestDatabase>>;
let steps: Steps;
beforeAll(async () => {
  made = await createTestDatabase();
  const { stdout } = await promisify(execFile)(process.execPath, ['--import', 'tsx', path.join(import.meta.dirname, 'step-migrations.ts')], {
    env: { ...process.env, DATABASE_URL_ADMIN: made.adminUrl },
    maxBuffer: 64 * 1024 * 1024,
  });
  steps = JSON.parse(stdout) as Steps;
}, 120_000);
afterAll(() => made.drop());

describe('every migration', () => {
  test('is there, and each of them adds something', () => {
    expect(steps.count).toBe(readdirSync(path.join(import.meta.dirname, '../../db/migrations')).length);
    expect(steps.pending, 'a fresh test database is up to date').toBe(0);
    for (const [index, after] of steps.up.entries()) {
      if (index > 0) expect(after, `migration ${index}`).not.toEqual(steps.up[index - 1]);
    }
  });

  test('taken back leaves what was there before it, rights and policies included', () => {
    for (const [index, after] of steps.down.entries()) {
      expect(after, `after ${index} were taken back`).toEqual(steps.up[steps.count - index]);
    }
  });

  test('applied again gives the same database', () => {
    expect(steps.again).toEqual(steps.up[steps.count]);
    expect(steps.again.some((line) => line.startsWith('policy entries own_hospitals'))).toBe(true);
  });
});
