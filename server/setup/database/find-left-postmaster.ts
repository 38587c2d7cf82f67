import { existsSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { commandLine, findStartedProgram, type StartedProgram } from '../started-program.mjs';
import type { ClusterFiles } from './cluster-files';

const patienceMs = 15_000;

/**
 * A PostgreSQL that runs on this folder already, or null. Clears a lock file only where PostgreSQL would be misled by it
 * (its number belongs to another program now, or to a killed one that nobody collected) and no backend is left at work.
 */
export async function findLeftPostmaster(files: ClusterFiles): Promise<{ program: StartedProgram; port: number } | null> {
  const lockFile = path.join(files.clusterFolder, 'postmaster.pid');
  if (!existsSync(lockFile)) return null;
  const lines = readFileSync(lockFile, 'utf8').split('\n');
  const pid = Number(lines[0]);
  const program = findStartedProgram(pid);
  if (program !== null && commandLine(pid).includes(files.clusterFolder)) return { program, port: Number(lines[3]) || files.port };
  if (!existsSync(`/proc/${pid}`)) return null;
  const sharedMemoryId = Number(lines[6]?.trim().split(/\s+/)[1]);
  const until = performance.now() + patienceMs;
  while (isSharedMemoryUsed(sharedMemoryId)) {
    if (performance.now() > until) return null;
    await pause(100);
  }
  rmSync(lockFile, { force: true });
  return null;
}

/** Where it cannot be known it counts as used: two servers on one folder would destroy it. */
function isSharedMemoryUsed(id: number): boolean {
  try {
    const [header = '', ...rows] = readFileSync('/proc/sysvipc/shm', 'utf8').trim().split('\n');
    const names = header.trim().split(/\s+/);
    const fields = rows.map((row) => row.trim().split(/\s+/)).find((row) => Number(row[names.indexOf('shmid')]) === id);
    return fields !== undefined && Number(fields[names.indexOf('nattch')]) > 0;
  } catch {
    return true;
  }
}
