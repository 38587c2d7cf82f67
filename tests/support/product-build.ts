import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { buildFolders, type BuildFolders } from '@/server/setup/build-folders';
import { buildWhenChanged } from '@/server/setup/build-when-changed';

export const root = path.resolve(import.meta.dirname, '../..');
const buildFolder = 'tests/.out/build';

/** The tests' own build of the product, beside and apart from the one that may be running. */
export const testBuildFolders: BuildFolders = buildFolders(root, buildFolder);
export const testBuildEnvironment = { FASCICLE_BUILD_FOLDER: buildFolder };

/** Builds the product for the tests when a source changed. Two test runs in one clone take turns. */
export async function buildForTests(options: { fromNothing?: boolean } = {}): Promise<string> {
  const lock = path.join(root, 'tests/.out/building');
  mkdirSync(path.dirname(lock), { recursive: true });
  while (!tryLock(lock)) await pause(500);
  try {
    // What an earlier failure left in the cache must not decide this build.
    if (options.fromNothing) rmSync(path.join(root, buildFolder), { recursive: true, force: true });
    return await buildWhenChanged(root, testBuildFolders);
  } finally {
    rmSync(lock, { force: true });
  }
}

function tryLock(lock: string): boolean {
  try {
    writeFileSync(lock, String(process.pid), { flag: 'wx' });
    return true;
  } catch {
    if (!isRunning(Number(readFileSync(lock, 'utf8')))) rmSync(lock, { force: true });
    return false;
  }
}

function isRunning(pid: number): boolean {
  try {
    return pid > 0 && process.kill(pid, 0);
  } catch {
    return false;
  }
}
