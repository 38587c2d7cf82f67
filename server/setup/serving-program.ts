import { spawn } from 'node:child_process';
import { SetupFailure } from './setup-failure.mjs';
import { exitStatuses } from './exit-statuses.mjs';
import { endProgram, findStartedProgram, type StartedProgram } from './started-program.mjs';
import type { ServerLog } from './server-log';

export type ServingProgram = Readonly<{ program: StartedProgram; port: number; ended: Promise<string>; stop: () => Promise<void> }>;
export type ServingOrder = Readonly<{ command: readonly string[]; cwd: string; environment: NodeJS.ProcessEnv; log: ServerLog; onStarted?: (program: StartedProgram) => void }>;

const readinessPatienceMs = 60_000;

/** Starts the server and waits until it says that it listens. */
export function startServing(order: ServingOrder): Promise<ServingProgram> {
  const [command = process.execPath, ...words] = order.command;
  const child = spawn(command, words, { cwd: order.cwd, env: order.environment, stdio: ['ignore', 'pipe', 'pipe', 'ipc'], detached: true });
  const lastLines: string[] = [];
  for (const output of [child.stdout, child.stderr]) {
    if (output === null) continue;
    order.log.follow(output, output === child.stderr);
    output.on('data', (chunk: Buffer) => lastLines.push(...chunk.toString().split('\n').filter(Boolean)) > 20 && lastLines.splice(0, lastLines.length - 20));
  }
  return new Promise((resolve, reject) => {
    const program = child.pid === undefined ? null : findStartedProgram(child.pid);
    if (program !== null) order.onStarted?.(program);
    const stop = () => (program === null ? Promise.resolve() : endProgram(program, { patienceMs: 12_000 }));
    const late = setTimeout(() => {
      void stop();
      reject(new SetupFailure('serverKeepsFailing', `The server did not listen within ${readinessPatienceMs / 1000} seconds.`));
    }, readinessPatienceMs);
    const ended = new Promise<string>((tell) => child.once('close', (code, signal) => tell(signal === null ? `status ${code}` : `signal ${signal}`)));
    child.once('error', (error) => reject(new SetupFailure('serverKeepsFailing', `The server could not be started: ${error.message}.`, error)));
    child.once('close', (code) => {
      clearTimeout(late);
      reject(endedEarly(code, lastLines));
    });
    child.on('message', (message) => {
      if (!isListening(message) || program === null) return;
      clearTimeout(late);
      resolve({ program, port: message.port, ended, stop });
    });
  });
}

function isListening(message: unknown): message is { kind: 'listening'; port: number } {
  return typeof message === 'object' && message !== null && 'kind' in message && message.kind === 'listening' && 'port' in message && typeof message.port === 'number';
}

/** The server's own sentence, taken out of a log line where it stands in one. */
function endedEarly(code: number | null, lastLines: readonly string[]): SetupFailure {
  const last = lastLines.at(-1) ?? 'it said nothing';
  const sentence = /"msg":"((?:[^"\\]|\\.)*)"/.exec(last)?.[1] ?? last;
  if (code === exitStatuses.takenPort) return new SetupFailure('takenPort', sentence);
  return new SetupFailure('serverKeepsFailing', `The server ended before it listened (status ${code}): ${sentence}`);
}
