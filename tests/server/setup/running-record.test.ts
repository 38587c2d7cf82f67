import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { assertNotRunning, claimRunning, readRunning, removeRunning, writeRunning } from '@/server/setup/running-record.mjs';
import { findStartedProgram, isStillRunning, type StartedProgram } from '@/server/setup/started-program.mjs';

let folder: string;
let children: ChildProcess[] = [];

/** A program that waits, with a word by which it can be told. */
function startWaiting(word: string): StartedProgram {
  const child = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)', word], { detached: true, stdio: 'ignore' });
  children.push(child);
  const program = findStartedProgram(child.pid ?? 0);
  if (program === null) throw new Error('The waiting program did not start.');
  return program;
}

describe('the running record', () => {
  beforeEach(() => {
    folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-running-'));
  });
  afterEach(() => {
    for (const child of children) child.kill('SIGKILL');
    children = [];
    rmSync(folder, { recursive: true, force: true });
  });

  it('refuses a second start in one sentence with the address and the number', () => {
    const starter = startWaiting('start.mjs');
    writeRunning(folder, { starter, server: null, programs: [], url: 'http://127.0.0.1:4050' });
    expect(() => assertNotRunning(folder)).toThrow(`Fascicle is already running at http://127.0.0.1:4050 (number ${starter.pid})`);
  });

  it('does not take a later program with the same number for the earlier one', () => {
    const starter = startWaiting('start.mjs');
    writeRunning(folder, { starter: { ...starter, startedAt: 'an earlier boot/1' }, server: null, programs: [], url: null });
    expect(() => assertNotRunning(folder)).not.toThrow();
  });

  it('ends a server and a build that a killed start left behind', async () => {
    const gone = { pid: 2 ** 22 - 1, startedAt: 'an earlier boot/1' };
    const server = startWaiting('dist/server.mjs');
    const build = startWaiting('build');
    writeRunning(folder, { starter: gone, server, programs: [build], url: null });
    expect(await claimRunning(folder, 'server.mjs')).toBe(true);
    expect([isStillRunning(server), isStillRunning(build)]).toEqual([false, false]);
    expect(readRunning(folder)).toMatchObject({ starter: { pid: process.pid }, server: null });
  });

  it('leaves a program alone whose command line is not our server', async () => {
    const stranger = startWaiting('something-else');
    writeRunning(folder, { starter: { pid: 2 ** 22 - 1, startedAt: 'an earlier boot/1' }, server: stranger, programs: [], url: null });
    expect(await claimRunning(folder, 'server.mjs')).toBe(false);
    expect(isStillRunning(stranger)).toBe(true);
  });

  it('reads a damaged record as none, and removes only its own', () => {
    const starter = startWaiting('start.mjs');
    writeRunning(folder, { starter, server: null, programs: [], url: null });
    removeRunning(folder);
    expect(readRunning(folder)?.starter).toEqual(starter);
    rmSync(path.join(folder, 'running.json'));
    expect(readRunning(folder)).toBeNull();
  });
});
