import { spawn } from 'node:child_process';
import { endProgram, findStartedProgram } from './started-program.mjs';

/** @type {Set<{ program: import('./started-program.mjs').StartedProgram, ended: Promise<unknown>, letFinish: boolean }>} */
const running = new Set();
const keptCharacters = 200_000;

/** @type {(programs: import('./started-program.mjs').StartedProgram[]) => void} */
let onChange = () => {};

/** @param {typeof onChange} listener told of the programs that run for a step and may be cut short */
export function watchPrograms(listener) {
  onChange = listener;
}

function tellChange() {
  onChange([...running].filter(({ letFinish }) => !letFinish).map(({ program }) => program));
}

/**
 * Runs a program to its end and keeps the last part of what it said.
 * It gets a group of its own, so that Ctrl-C reaches only us and we end it in our order.
 * @param {string} command
 * @param {readonly string[]} words
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, uid?: number, gid?: number, letFinish?: boolean, onOutput?: (text: string) => void }} [options]
 * @returns {Promise<{ status: number, output: string }>} status is 127 when the program does not exist, 128 and more after a signal
 */
export function runProgram(command, words, { letFinish = false, onOutput, ...options } = {}) {
  return new Promise((resolve) => {
    let output = '';
    const keep = (/** @type {Buffer} */ chunk) => {
      output = (output + chunk.toString()).slice(-keptCharacters);
      onOutput?.(chunk.toString());
    };
    const child = spawn(command, words, { stdio: ['ignore', 'pipe', 'pipe'], detached: true, ...options });
    child.stdout.on('data', keep);
    child.stderr.on('data', keep);
    const program = child.pid === undefined ? null : findStartedProgram(child.pid);
    const entry = program && { program, letFinish, ended: new Promise((ended) => child.once('close', ended)) };
    if (entry) running.add(entry);
    tellChange();
    child.once('error', (error) => resolve({ status: 127, output: error.message }));
    child.once('close', (code) => {
      if (entry) running.delete(entry);
      tellChange();
      resolve({ status: code ?? 128, output });
    });
  });
}

/** Ends the programs that are running for a step; one that must not be cut short (a package installation) is waited for. */
export async function endRunningPrograms() {
  await Promise.all([...running].map(({ program, letFinish, ended }) => (letFinish ? ended : endProgram(program, { patienceMs: 3_000 }))));
}

/**
 * The line of a program's output that tells most about why it failed.
 * @param {string} output
 * @returns {string}
 */
export function tellingLine(output) {
  const lines = output.replace(/\u001b\[[0-9;]*m/g, '').split('\n').map((line) => line.trim()).filter(Boolean);
  // Headings that only announce the reason.
  const reasons = lines.filter((line) => !/build error occurred|build failed with|^migration .* failed with error/i.test(line));
  return reasons.find((line) => /\b(error|fatal|failed|denied)\b/i.test(line)) ?? reasons.at(-1) ?? 'it said nothing';
}
