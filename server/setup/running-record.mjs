import { readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { SetupFailure } from './setup-failure.mjs';
import { commandLine, endProgram, findStartedProgram, isStillRunning } from './started-program.mjs';

/**
 * What one `npm start` has running, kept on disk so that the next one can clean up after a kill -9.
 * @typedef {import('./started-program.mjs').StartedProgram} StartedProgram
 * @typedef {{ starter: StartedProgram, server: StartedProgram | null, programs: StartedProgram[], url: string | null }} RunningRecord
 */

const fileName = 'running.json';

/**
 * @param {string} stateFolder
 * @returns {RunningRecord | null}
 */
export function readRunning(stateFolder) {
  try {
    const record = JSON.parse(readFileSync(path.join(stateFolder, fileName), 'utf8'));
    return typeof record?.starter?.pid === 'number' ? record : null;
  } catch {
    return null;
  }
}

/**
 * @param {string} stateFolder
 * @param {RunningRecord} record
 */
export function writeRunning(stateFolder, record) {
  const file = path.join(stateFolder, fileName);
  writeFileSync(`${file}.new`, `${JSON.stringify(record)}\n`);
  renameSync(`${file}.new`, file);
}

/** @param {string} stateFolder */
export function removeRunning(stateFolder) {
  if (readRunning(stateFolder)?.starter.pid === process.pid) rmSync(path.join(stateFolder, fileName), { force: true });
}

/** @param {string} stateFolder */
export function assertNotRunning(stateFolder) {
  const record = readRunning(stateFolder);
  if (record === null || record.starter.pid === process.pid || !isStillRunning(record.starter)) return;
  const place = record.url === null ? 'being started' : `running at ${record.url}`;
  throw new SetupFailure('alreadyRunning', `Fascicle is already ${place} (number ${record.starter.pid}); stop it with Ctrl-C in its window or with "kill ${record.starter.pid}".`);
}

/**
 * Takes the state folder for this start and ends a server that an earlier, killed start left behind.
 * @param {string} stateFolder
 * @param {string} serverFileName its command line must hold it: a number alone proves nothing
 * @returns {Promise<boolean>} whether a server was left behind
 */
export async function claimRunning(stateFolder, serverFileName) {
  assertNotRunning(stateFolder);
  const left = readRunning(stateFolder);
  const starter = findStartedProgram(process.pid);
  if (starter === null) throw new SetupFailure('missingRight', '/proc cannot be read, so running programs cannot be told apart.');
  // What was left behind stays on record until it has ended: this start may be killed too.
  writeRunning(stateFolder, { starter, server: left?.server ?? null, programs: left?.programs ?? [], url: null });
  for (const program of left?.programs ?? []) await endProgram(program, { patienceMs: 1_000 });
  const server = left?.server ?? null;
  const isOurs = server !== null && isStillRunning(server) && commandLine(server.pid).some((word) => word.endsWith(serverFileName));
  if (isOurs) await endProgram(server, { patienceMs: 3_000 });
  writeRunning(stateFolder, { starter, server: null, programs: [], url: null });
  return isOurs;
}

/**
 * Changes what is on record for this start.
 * @param {string} stateFolder
 * @param {Partial<Omit<RunningRecord, 'starter'>>} change
 */
export function updateRunning(stateFolder, change) {
  const record = readRunning(stateFolder);
  if (record?.starter.pid === process.pid) writeRunning(stateFolder, { ...record, ...change });
}
