import { randomBytes } from 'node:crypto';
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { chooseFreePort } from '../free-port';
import { runProgram, tellingLine } from '../run-program.mjs';
import { SetupFailure } from '../setup-failure.mjs';
import type { PostgresAccount } from './postgres-account';
import { postgresEnvironment } from './postgres-environment';

/** A private cluster on disk: its own port, chosen once, and its administrator's password. */
export type ClusterFiles = Readonly<{ folder: string; clusterFolder: string; logFile: string; port: number; password: string }>;

const recordName = 'cluster.json';

export function readClusterFiles(folder: string): ClusterFiles | null {
  const file = path.join(folder, recordName);
  if (!existsSync(file)) return null;
  const record = JSON.parse(readFileSync(file, 'utf8')) as { port: number; password: string };
  return { folder, clusterFolder: path.join(folder, 'cluster'), logFile: path.join(folder, 'postgres.log'), ...record };
}

export function writeClusterRecord(folder: string, record: { port: number; password: string }): void {
  const file = path.join(folder, recordName);
  writeFileSync(`${file}.new`, `${JSON.stringify({ port: record.port, password: record.password })}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
}

/** The cluster of this folder, created when there is none: passwords by scram, data checksums, never half-made. */
export async function ensureClusterFiles(folder: string, programs: string, account: PostgresAccount | null): Promise<ClusterFiles> {
  const known = readClusterFiles(folder);
  if (known !== null && existsSync(known.clusterFolder)) return known;
  if (existsSync(path.join(folder, 'cluster'))) {
    throw new SetupFailure('database', `${path.join(folder, recordName)}, which holds the password of the database beside it, is gone; put it back from a copy.`);
  }
  writeClusterRecord(folder, known ?? { port: await chooseFreePort(), password: randomBytes(24).toString('base64url') });
  const files = readClusterFiles(folder);
  if (files === null) throw new Error(`${recordName} was written and cannot be read.`);
  await initialise(files, programs, account);
  return files;
}

async function initialise(files: ClusterFiles, programs: string, account: PostgresAccount | null): Promise<void> {
  const unfinished = path.join(files.folder, 'cluster.new');
  const passwordFile = path.join(files.folder, 'password.new');
  rmSync(unfinished, { recursive: true, force: true });
  mkdirSync(unfinished, { mode: 0o700 });
  writeFileSync(passwordFile, files.password, { mode: 0o600 });
  for (const made of account === null ? [] : [unfinished, passwordFile]) chownSync(made, account?.uid ?? 0, account?.gid ?? 0);
  const words = ['-D', unfinished, '-U', 'postgres', `--pwfile=${passwordFile}`, '--auth=scram-sha-256', '--data-checksums', '--encoding=UTF8', '--locale=C.UTF-8'];
  const { status, output } = await runProgram(path.join(programs, 'initdb'), words, { cwd: '/', env: postgresEnvironment, ...account });
  rmSync(passwordFile, { force: true });
  if (status !== 0) throw new SetupFailure('database', `The private database could not be created in ${files.folder}: ${tellingLine(output)}.`);
  chmodSync(unfinished, 0o700);
  renameSync(unfinished, files.clusterFolder);
}
