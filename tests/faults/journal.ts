import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

import { root } from '@/tests/support/product-build';

import type { Acknowledged } from './find-losses';

/** A writer with its journal. */
export interface Writer {
  acknowledged(): readonly Acknowledged[];
  /** Whether a command was sent and is not yet answered. */
  isInFlight(): boolean;
  stop(): Promise<void>;
}

/** Starts the writer in a process of its own; the journal is a file that outlives whatever is killed. */
export function startWriter(of: { url: string; cookie: string; caseId: string }): Writer {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-journal-'));
  const file = path.join(folder, 'journal');
  const words = ['--import', 'tsx', path.join(root, 'tests/faults/journal-writer.ts'), of.url, of.cookie, of.caseId, file];
  const child: ChildProcess = spawn(process.execPath, words, { cwd: root, stdio: ['ignore', 'ignore', 'inherit'] });
  const lines = () => {
    try {
      return readFileSync(file, 'utf8').trim().split('\n').filter(Boolean);
    } catch {
      return [];
    }
  };
  return {
    acknowledged: () =>
      lines()
        .filter((line) => line.startsWith('acknowledged '))
        .map((line) => {
          const [, commandId = '', seq = ''] = line.split(' ');
          return { commandId, seq: Number(seq) };
        }),
    isInFlight: () => lines().at(-1)?.startsWith('sent ') === true,
    async stop() {
      if (child.exitCode === null) {
        child.kill('SIGTERM');
        await once(child, 'exit');
      }
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
