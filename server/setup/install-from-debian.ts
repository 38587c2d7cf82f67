import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { runProgram, tellingLine } from './run-program.mjs';
import { SetupFailure } from './setup-failure.mjs';

const createClusterFolder = '/etc/postgresql-common';

/** Installs one Debian package with everything it needs, or says with which command a person can. */
export async function installFromDebian(debianName: string, spokenName: string, options: { keepDebianClusterAway?: boolean } = {}): Promise<void> {
  const byHand = `install it with "sudo apt-get install ${debianName}" and start again`;
  if (!existsSync('/usr/bin/apt-get')) throw new SetupFailure('missingRight', `${spokenName} is missing and this machine has no apt-get; install it by hand and start again.`);
  const isRoot = process.getuid?.() === 0;
  if (!isRoot && (await runProgram('sudo', ['-n', 'true'])).status !== 0) {
    throw new SetupFailure('missingRight', `${spokenName} is missing and this user may not install it; ${byHand}.`);
  }
  if (options.keepDebianClusterAway && isRoot) preventDebianCluster();
  await apt(isRoot, ['update']);
  const { status, output } = await apt(isRoot, ['install', '-y', '--no-install-recommends', debianName]);
  if (status !== 0) throw new SetupFailure('missingRight', `${spokenName} is missing and apt-get could not install it (${tellingLine(output)}); ${byHand}.`);
}

function apt(isRoot: boolean, words: readonly string[]): Promise<{ status: number; output: string }> {
  const command = ['env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-q', ...words];
  const [program = 'env', ...rest] = isRoot ? command : ['sudo', '-n', ...command];
  // Cut short, apt leaves half-installed packages behind.
  return runProgram(program, rest, { letFinish: true });
}

/** Debian would make and start a cluster of its own at installation; nobody asked for a second database on this machine. */
function preventDebianCluster(): void {
  if (existsSync(createClusterFolder)) return;
  mkdirSync(`${createClusterFolder}/createcluster.d`, { recursive: true });
  writeFileSync(`${createClusterFolder}/createcluster.d/fascicle.conf`, 'create_main_cluster = false\n');
}
