import { createHash } from 'node:crypto';
import { accessSync, chmodSync, constants, mkdirSync, statSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { SetupFailure } from './setup-failure.mjs';

/**
 * Where this clone keeps its database, secret and logs. Nothing is created here.
 * A database never runs as root, so for root the folder must be one that others can enter.
 * @param {string} root the clone
 * @param {{ wish?: string | undefined, uid?: number, home?: string }} [who]
 * @returns {string}
 */
export function chooseStateFolder(root, { wish, uid = process.getuid?.() ?? 0, home = os.homedir() } = {}) {
  if (wish && !path.isAbsolute(wish)) throw new SetupFailure('wrongSetting', `FASCICLE_STATE_FOLDER is "${wish}"; it must be an absolute folder such as /var/lib/fascicle.`);
  if (wish) return path.resolve(wish);
  const inClone = path.join(root, '.fascicle');
  const hash = createHash('sha256').update(root).digest('hex').slice(0, 12);
  if (uid === 0) return othersMayEnter(root) ? inClone : path.join('/var/lib/fascicle', hash);
  return mayWrite(root) ? inClone : path.join(home, '.local/state/fascicle', hash);
}

/**
 * Creates the folder; others may pass through it to the database's own folder and see nothing else.
 * @param {string} folder
 */
export function makeStateFolder(folder) {
  try {
    mkdirSync(folder, { recursive: true });
    chmodSync(folder, 0o711);
    accessSync(folder, constants.W_OK);
  } catch (error) {
    throw new SetupFailure('missingRight', `The state folder ${folder} cannot be written by this user; set FASCICLE_STATE_FOLDER to one that can.`, error);
  }
}

/** @param {string} folder */
function othersMayEnter(folder) {
  for (let at = folder; ; at = path.dirname(at)) {
    if ((statSync(at).mode & 0o001) === 0) return false;
    if (at === path.dirname(at)) return true;
  }
}

/** @param {string} folder */
function mayWrite(folder) {
  try {
    accessSync(folder, constants.W_OK);
    return true;
  } catch {
    return false;
  }
}
