import { spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { openInstallation, type Installation } from '@/server/setup/installation';
import { chooseFreePort } from '@/server/setup/free-port';
import { parseSettings } from '@/server/settings/settings';
import { readRunning } from '@/server/setup/running-record.mjs';
import { commandLine, endProgram, findStartedProgram, type StartedProgram } from '@/server/setup/started-program.mjs';
import { root, testBuildEnvironment } from './product-build';

export type WholeProduct = Readonly<{
  url: string;
  port: number;
  installation: Installation;
  /** Throws while one of them is not running: a number 0 would mean this very group of programs to `kill`. */
  pids: () => { starter: number; server: number; database: number };
  /** What `npm start` printed so far. */
  printed: () => string;
  /** Starts the same installation once more, after a kill -9 of the starter. */
  startAgain: () => Promise<void>;
  /** Ctrl-C; gives the exit status. */
  interrupt: () => Promise<number | null>;
  remove: () => Promise<void>;
}>;

const patienceMs = 120_000;
/** An `.env` of the clone is for its own product: what is set here, be it to nothing, wins over it. */
const unset = { HOST: '', PUBLIC_URL: '', DATABASE_URL: '', FASCICLE_DEMO: '', FASCICLE_SECRET: '', LOG_LEVEL: '' };

/** Starts the program of `npm start` itself, with its watch over server and database, on an installation that is thrown away. */
export async function startWholeProduct(environment: Readonly<Record<string, string>> = {}): Promise<WholeProduct> {
  const stateFolder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-test-'));
  chmodSync(stateFolder, 0o711);
  const port = await chooseFreePort();
  const variables = { ...unset, PORT: String(port), FASCICLE_STATE_FOLDER: stateFolder, ...testBuildEnvironment, ...environment };
  let printed = '';
  let starter: StartedProgram | null = null;
  let ended: Promise<number | null> = Promise.resolve(null);
  const start = async () => {
    printed = '';
    const child = spawn(process.execPath, [path.join(root, 'server/setup/start.mjs')], { cwd: root, env: { ...process.env, ...variables }, stdio: ['ignore', 'pipe', 'pipe'], detached: true });
    for (const output of [child.stdout, child.stderr]) output.on('data', (chunk: Buffer) => void (printed += chunk.toString()));
    ended = new Promise((tell) => child.once('close', tell));
    starter = child.pid === undefined ? null : findStartedProgram(child.pid);
    const until = performance.now() + patienceMs;
    while (!printed.includes(' is ready after ')) {
      if (child.exitCode !== null || performance.now() > until) throw new Error(`The product did not start:\n${printed}`);
      await pause(50);
    }
  };
  await start();
  return {
    url: `http://127.0.0.1:${port}`,
    port,
    installation: openInstallation(parseSettings(variables), root),
    pids: () => pidsOf(stateFolder),
    printed: () => printed,
    startAgain: start,
    interrupt: async () => {
      if (starter !== null) process.kill(starter.pid, 'SIGINT');
      return ended;
    },
    remove: async () => {
      if (starter !== null) await endProgram(starter, { patienceMs: 60_000 });
      // A killed starter leaves both behind.
      for (const program of [readRunning(stateFolder)?.server ?? null, databaseProgram(stateFolder)]) {
        if (program !== null) await endProgram(program, { patienceMs: 5_000 });
      }
      rmSync(stateFolder, { recursive: true, force: true });
    },
  };
}

function pidsOf(stateFolder: string): { starter: number; server: number; database: number } {
  const record = readRunning(stateFolder);
  const database = databaseProgram(stateFolder);
  if (record?.server == null || database === null) throw new Error(`The product has no ${database === null ? 'database' : 'server'} running.`);
  return { starter: record.starter.pid, server: record.server.pid, database: database.pid };
}

/** Known by its command line too: the number in the file may belong to somebody else by now. */
function databaseProgram(stateFolder: string): StartedProgram | null {
  try {
    const pid = Number(readFileSync(path.join(stateFolder, 'cluster/postmaster.pid'), 'utf8').split('\n')[0]);
    return commandLine(pid).includes(path.join(stateFolder, 'cluster')) ? findStartedProgram(pid) : null;
  } catch {
    return null;
  }
}
