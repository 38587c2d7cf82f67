import { spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startCluster, type Cluster } from '@/server/setup/database/cluster';
import { findPostgresAccount } from '@/server/setup/database/postgres-account';
import { ensurePostgresPrograms } from '@/server/setup/database/postgres-programs';

const folder = mkdtempSync(path.join(os.tmpdir(), 'fascicle-cluster-'));
const lockFile = path.join(folder, 'cluster/postmaster.pid');
let programs: string;
let cluster: Cluster;

const start = () => startCluster(folder, programs, findPostgresAccount());

async function ask(statement: string): Promise<unknown> {
  const client = new Client({ connectionString: cluster.adminUrl });
  await client.connect();
  try {
    return Object.values((await client.query<Record<string, unknown>>(statement)).rows[0] ?? {})[0];
  } finally {
    await client.end();
  }
}

describe('startCluster', () => {
  beforeAll(async () => {
    chmodSync(folder, 0o711);
    programs = await ensurePostgresPrograms();
    cluster = await start();
    await ask('create table kept (n int)');
  });
  afterAll(async () => {
    await cluster.stop();
    rmSync(folder, { recursive: true, force: true });
  });

  it('sets up what a record needs, on loopback alone, under a password', async () => {
    const shown = await Promise.all(['data_checksums', 'fsync', 'synchronous_commit', 'full_page_writes', 'listen_addresses', 'unix_socket_directories', 'password_encryption'].map((name) => ask(`show ${name}`)));
    expect(shown).toEqual(['on', 'on', 'on', 'on', '127.0.0.1', '', 'scram-sha-256']);
    const wrong = new Client({ connectionString: cluster.adminUrl.replace(/:[^:@]+@/, ':wrong@') });
    await expect(wrong.connect()).rejects.toMatchObject({ code: '28P01' });
  });

  it('never runs as root and shows its password to nobody else', () => {
    expect(statSync(`/proc/${cluster.pid}`).uid).not.toBe(0);
    expect(statSync(path.join(folder, 'cluster.json')).mode & 0o077).toBe(0);
  });

  it('keeps what was committed when it is killed, on the same port', async () => {
    const { port, pid } = cluster;
    await ask('insert into kept values (1)');
    await cluster.kill9();
    cluster = await start();
    expect([cluster.port, await ask('select count(*)::int from kept')]).toEqual([port, 1]);
    expect(cluster.pid).not.toBe(pid);
  });

  it('takes over one that is still running', async () => {
    expect((await start()).pid).toBe(cluster.pid);
  });

  it('starts although its lock file names another living program', async () => {
    await cluster.kill9();
    const account = findPostgresAccount();
    const stranger = spawn('sleep', ['60'], { cwd: '/', stdio: 'ignore', ...account });
    const lines = readFileSync(lockFile, 'utf8').split('\n');
    writeFileSync(lockFile, [String(stranger.pid), ...lines.slice(1)].join('\n'));
    cluster = await start();
    expect(await ask('select count(*)::int from kept')).toBe(1);
    expect(stranger.exitCode).toBeNull();
    stranger.kill();
  });

  it('goes to another port when its own was taken meanwhile', async () => {
    await cluster.stop();
    expect(existsSync(lockFile)).toBe(false);
    const thief = createServer();
    await new Promise<void>((listening) => void thief.listen(cluster.port, '127.0.0.1', listening));
    const before = cluster.port;
    cluster = await start();
    expect(cluster.port).not.toBe(before);
    expect(await ask('select count(*)::int from kept')).toBe(1);
    thief.close();
  });

  it('says in one sentence that its files are damaged', async () => {
    await cluster.stop();
    const control = path.join(folder, 'cluster/global/pg_control');
    const whole = readFileSync(control);
    writeFileSync(control, Buffer.alloc(whole.length));
    await expect(start()).rejects.toThrow(/^The private database did not start: (FATAL|PANIC): .*\(log: .*postgres\.log\)\.$/);
    writeFileSync(control, whole);
    cluster = await start();
  });
});
