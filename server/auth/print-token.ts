import { parseArgs } from 'node:util';

import { v7 as newId } from 'uuid';

import { makePool, type Handle } from '@/db/connection';
import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { accessTokensOf } from '@/db/repositories/tokens/access-tokens-of';
import { insertAccessToken } from '@/db/repositories/tokens/insert-access-token';
import { revokeAccessToken } from '@/db/repositories/tokens/revoke-access-token';
import { accessTokenHash, newAccessToken } from '@/server/auth/access-token';
import { settings } from '@/server/settings/settings';
import { openInstallation } from '@/server/setup/installation';
import { readEnvironmentFile } from '@/server/setup/read-environment-file.mjs';
import { reportFailure, SetupFailure } from '@/server/setup/setup-failure.mjs';

const longestDays = 365;
const usage = 'Type: npm run token -- --for EMAIL [--days 30] [--label WORDS], --list --for EMAIL, or --revoke ID';

/** `npm run token`: prints a new token for a program of a person once, lists a person's tokens, ends one. */
async function printToken(words: readonly string[]): Promise<void> {
  const given = readWords(words);
  const pool = makePool(openInstallation(settings()).appUrl, 1, 'fascicle token');
  try {
    if (given.revoke !== undefined) return await revoke(pool, given.revoke);
    const person = await findPerson(pool, given.for);
    if (given.list) return await list(pool, person);
    await print(pool, person, given);
  } finally {
    await pool.destroy();
  }
}

interface Given {
  readonly for?: string | undefined;
  readonly days?: string | undefined;
  readonly label?: string | undefined;
  readonly revoke?: string | undefined;
  readonly list?: boolean | undefined;
}

function readWords(words: readonly string[]): Given {
  try {
    const options = { for: { type: 'string' }, days: { type: 'string' }, label: { type: 'string' }, revoke: { type: 'string' }, list: { type: 'boolean' } } as const;
    return parseArgs({ args: [...words], options, strict: true }).values;
  } catch (error) {
    throw new SetupFailure('wrongSetting', `${(error as Error).message.split('.')[0]}. ${usage}`);
  }
}

async function findPerson(pool: Handle, email: string | undefined) {
  if (email === undefined) throw new SetupFailure('wrongSetting', `Whose token? ${usage}`);
  const person = await findCredentialsByEmail(pool, email);
  if (person === null) throw new SetupFailure('wrongSetting', `There is no person with the e-mail "${email}".`);
  return person;
}

async function print(pool: Handle, person: { personId: string; email: string }, given: Given): Promise<void> {
  const days = Number(given.days ?? 30);
  if (!Number.isInteger(days) || days < 1 || days > longestDays) throw new SetupFailure('wrongSetting', `--days is "${given.days}"; a whole number from 1 to ${longestDays} is allowed.`);
  const label = given.label?.trim() ?? 'Printed by npm run token';
  if (label.length < 1 || label.length > 60) throw new SetupFailure('wrongSetting', `--label has ${label.length} characters; 1 to 60 are allowed.`);
  const [id, token] = [newId(), newAccessToken()];
  const expiresAt = new Date(Date.now() + days * 86_400_000).toISOString();
  await insertAccessToken(pool, { id, tokenHash: accessTokenHash(token), personId: person.personId, label, expiresAt });
  // The token alone on the output, so that a program can take it; the rest is for the person who reads along.
  process.stderr.write(`Token ${id} of ${person.email}, good until ${expiresAt}. It is shown this once; end it with: npm run token -- --revoke ${id}\n`);
  process.stdout.write(`${token}\n`);
}

async function list(pool: Handle, person: { personId: string; email: string }): Promise<void> {
  const tokens = await accessTokensOf(pool, person.personId);
  const lines = tokens.map(({ id, label, expiresAt, revokedAt, lastUsedAt }) => `${id}  ${revokedAt === null ? `good until ${expiresAt}` : `revoked ${revokedAt}`}  last used ${lastUsedAt ?? 'never'}  ${label}`);
  process.stdout.write(`${lines.length === 0 ? `${person.email} has no token` : lines.join('\n')}\n`);
}

async function revoke(pool: Handle, id: string): Promise<void> {
  const isId = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(id);
  if (!isId || !(await revokeAccessToken(pool, id))) throw new SetupFailure('wrongSetting', `There is no good token ${id}; npm run token -- --list --for EMAIL shows them.`);
  process.stdout.write(`Token ${id} is revoked\n`);
}

try {
  readEnvironmentFile();
  await printToken(process.argv.slice(2));
} catch (error) {
  process.exitCode = reportFailure(error);
}
