import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { exitStatuses } from '@/server/setup/exit-statuses.mjs';
import { openTestHouse, type TestHouse } from '@/tests/server/house/open-test-house';

const folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-token-'));
let house: TestHouse;

beforeAll(async () => {
  house = await openTestHouse();
});
afterAll(async () => {
  await house.close();
  rmSync(folder, { recursive: true, force: true });
});

/** What the person at the terminal types after `npm run token --`, on the database of the running house. */
function token(...words: string[]): { status: number | null; output: string; sentence: string } {
  const { adminUrl, secret } = house.database;
  const environment = { ...process.env, NODE_OPTIONS: '', DATABASE_URL: adminUrl, FASCICLE_SECRET: secret, FASCICLE_STATE_FOLDER: folder, FASCICLE_DEMO: '', HOST: '', PORT: '', PUBLIC_URL: '', LOG_LEVEL: '' };
  const ended = spawnSync(process.execPath, ['--import', 'tsx', 'server/auth/print-token.ts', ...words], { cwd: path.resolve(import.meta.dirname, '../../..'), env: environment, encoding: 'utf8' });
  return { status: ended.status, output: ended.stdout.trim(), sentence: ended.stderr.trim() };
}

const statusWith = async (bearer: string) => (await fetch(`${house.url}/api/session`, { headers: { authorization: `Bearer ${bearer}` } })).status;

describe('npm run token', () => {
  test('prints a token alone, which opens the running house, is listed without itself, and ends when it is revoked', async () => {
    const printed = token('--for', 'physician@demo.example', '--days', '2', '--label', 'Ward display');
    expect([printed.status, printed.output]).toEqual([0, expect.stringMatching(/^fascicle_[A-Za-z0-9_-]{43}$/)]);
    const id = /[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}/.exec(printed.sentence)?.[0] ?? '';
    const { expires_at: expiresAt } = await house.admin('access_tokens').where({ id }).first('expires_at');
    expect(Math.abs(Date.parse(expiresAt) - Date.now() - 2 * 86_400_000)).toBeLessThan(60_000);
    expect(await statusWith(printed.output)).toBe(200);
    const listed = token('--list', '--for', 'physician@demo.example');
    expect(listed.output).toContain(id);
    expect(listed.output).toContain('Ward display');
    expect(listed.output).not.toContain(printed.output);
    expect(token('--revoke', id)).toMatchObject({ status: 0 });
    expect(await statusWith(printed.output)).toBe(401);
    expect(token('--revoke', id)).toMatchObject({ status: exitStatuses.wrongSetting });
  }, 60_000);

  test.each([
    [[], /^Whose token\? /],
    [['--for', 'nobody@demo.example'], /^There is no person with the e-mail "nobody@demo\.example"\./],
    [['--for', 'desk@demo.example', '--days', '0'], /^--days is "0"; a whole number from 1 to 365 is allowed\./],
    [['--for', 'desk@demo.example', '--days', '1.5'], /^--days is "1\.5"; /],
    [['--for', 'desk@demo.example', '--label', 'x'.repeat(61)], /^--label has 61 characters; 1 to 60 are allowed\./],
    [['--revoke', 'x'], /^There is no good token x; /],
    [['--give', 'me'], /--give/],
  ])('%j is answered with a sentence and prints no token', (words, sentence) => {
    const { status, output, sentence: said } = token(...words);
    expect([status, output, said.split('\n').length]).toEqual([exitStatuses.wrongSetting, '', 1]);
    expect(said).toMatch(sentence);
  });
});
