import { readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * What tells one running program from every other, also from a later one with the same number.
 * @typedef {{ pid: number, startedAt: string }} StartedProgram
 */

/**
 * The running program with this number, or null when there is none. One that has ended and waits to be collected is not running.
 * @param {number} pid
 * @returns {StartedProgram | null}
 */
export function findStartedProgram(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name in brackets may itself hold blanks and brackets.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    if (fields[0] === 'Z' || fields[0] === 'X') return null;
    const boot = readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim();
    return { pid, startedAt: `${boot}/${fields[19]}` };
  } catch {
    return null;
  }
}

/**
 * @param {StartedProgram} program
 * @returns {boolean}
 */
export function isStillRunning(program) {
  return findStartedProgram(program.pid)?.startedAt === program.startedAt;
}

/**
 * The words a running program was started with; empty when it is gone or not ours to see.
 * @param {number} pid
 * @returns {string[]}
 */
export function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').filter(Boolean);
  } catch {
    return [];
  }
}

/**
 * Asks a program to end and ends it by force when it has not after a while. Its own group goes with it.
 * @param {StartedProgram} program
 * @param {{ signal?: NodeJS.Signals, patienceMs?: number }} [how]
 */
export async function endProgram(program, { signal = 'SIGTERM', patienceMs = 10_000 } = {}) {
  for (const [kind, waitMs] of /** @type {const} */ ([[signal, patienceMs], ['SIGKILL', 5_000]])) {
    if (!isStillRunning(program)) return;
    send(program.pid, kind);
    const until = performance.now() + waitMs;
    while (isStillRunning(program) && performance.now() < until) await pause(20);
  }
}

/**
 * @param {number} pid
 * @param {NodeJS.Signals} signal
 */
function send(pid, signal) {
  try {
    process.kill(signal === 'SIGKILL' ? -pid : pid, signal);
  } catch {
    try {
      process.kill(pid, signal);
    } catch {
      // It ended between the look and the signal.
    }
  }
}
