import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { commandLine, endProgram, findStartedProgram } from '@/server/setup/started-program.mjs';

const variable = 'FASCICLE_TEST_RUN';

export type RunFolder = Readonly<{ remove: () => Promise<void> }>;

/**
 * One folder for all that a test run puts down, and with it a mark on all that it starts. A level that is cut short
 * cannot tidy up after itself: what still carries the mark at the end is ended here.
 */
export function openRunFolder(): RunFolder {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-run-'));
  chmodSync(folder, 0o711);
  process.env.TMPDIR = folder;
  process.env[variable] = folder;
  return {
    remove: async () => {
      for (const pid of findMarked(folder)) {
        const program = findStartedProgram(pid);
        if (program !== null) await endProgram(program, { patienceMs: 5_000 });
      }
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Known by the folder in their command line (a database) or in their surroundings (everything else). */
function findMarked(folder: string): number[] {
  const others = readdirSync('/proc').map(Number).filter((pid) => pid > 1 && pid !== process.pid);
  return others.filter((pid) => commandLine(pid).some((word) => word.startsWith(`${folder}/`)) || isMarked(pid, folder));
}

function isMarked(pid: number, folder: string): boolean {
  try {
    return readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0').includes(`${variable}=${folder}`);
  } catch {
    return false;
  }
}
