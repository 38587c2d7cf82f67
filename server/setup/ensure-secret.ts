import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { SetupFailure } from './setup-failure.mjs';

const lowestLength = 32;

/** The installation's secret: from the settings, else made at the first start and kept in the state folder for its owner alone. */
export function ensureSecret(stateFolder: string, fromSettings: string | null): string {
  if (fromSettings !== null) return fromSettings;
  const file = path.join(stateFolder, 'secret');
  if (!existsSync(file)) {
    writeFileSync(`${file}.new`, `${randomBytes(48).toString('base64url')}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
  }
  const secret = readFileSync(file, 'utf8').trim();
  if (secret.length < lowestLength) {
    throw new SetupFailure('wrongSetting', `The secret in ${file} has ${secret.length} characters; it must have ${lowestLength} or more. Delete the file to have a new one made; everybody must then sign in again.`);
  }
  return secret;
}
