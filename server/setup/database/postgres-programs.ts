import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { runProgram } from '../run-program.mjs';
import { SetupFailure } from '../setup-failure.mjs';
import { installFromDebian } from '../install-from-debian';

const needed = ['initdb', 'postgres'];
const debianFolder = '/usr/lib/postgresql';
const lowestMajor = 15;

/** The folder of PostgreSQL's programs; installed from Debian when this machine has none. */
export async function ensurePostgresPrograms(): Promise<string> {
  const found = await findPostgresPrograms();
  if (found !== null) return found;
  await installFromDebian('postgresql', 'PostgreSQL', { keepDebianClusterAway: true });
  const installed = await findPostgresPrograms();
  if (installed === null) throw new SetupFailure('database', `Debian's PostgreSQL was installed, but ${debianFolder} holds no version from ${lowestMajor} on.`);
  return installed;
}

/** The newest usable version on this machine, or null. */
export async function findPostgresPrograms(): Promise<string | null> {
  const majors = existsSync(debianFolder) ? readdirSync(debianFolder).map(Number).filter((major) => major >= lowestMajor) : [];
  const folders = majors.sort((a, b) => b - a).map((major) => path.join(debianFolder, String(major), 'bin'));
  const told = await runProgram('pg_config', ['--bindir']);
  const version = told.status === 0 ? await runProgram('pg_config', ['--version']) : null;
  const toldMajor = Number(/PostgreSQL (\d+)/.exec(version?.output ?? '')?.[1] ?? 0);
  if (told.status === 0 && toldMajor >= lowestMajor) folders.push(told.output.trim());
  return folders.find((folder) => needed.every((program) => existsSync(path.join(folder, program)))) ?? null;
}
