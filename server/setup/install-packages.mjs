import { createHash } from 'node:crypto';
import { accessSync, constants, existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { runProgram } from './run-program.mjs';
import { SetupFailure } from './setup-failure.mjs';

/**
 * Installs the packages of the lock file, unless exactly those are there already.
 * @param {string} root
 * @returns {Promise<string>} what was done
 */
export async function installPackages(root) {
  const stamp = path.join(root, 'node_modules', '.fascicle-lock');
  const wanted = `${createHash('sha256').update(readFileSync(path.join(root, 'package-lock.json'))).digest('hex')} ${process.platform} ${process.arch}\n`;
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return 'unchanged';
  assertWritable(root);
  const { status, output } = await npm(['ci', '--include=dev', '--no-audit', '--no-fund'], root);
  if (status !== 0) throw new SetupFailure('packages', `The packages could not be installed (npm ci ended with status ${status}): ${reasonOf(output)}`);
  writeFileSync(stamp, wanted);
  return 'installed';
}

/**
 * @param {readonly string[]} words
 * @param {string} root
 */
function npm(words, root) {
  const env = { ...process.env, NODE_ENV: 'development' };
  const script = process.env.npm_execpath;
  return script?.endsWith('.js') ? runProgram(process.execPath, [script, ...words], { cwd: root, env }) : runProgram('npm', words, { cwd: root, env });
}

/** @param {string} root */
function assertWritable(root) {
  try {
    accessSync(root, constants.W_OK);
  } catch (error) {
    throw new SetupFailure('missingRight', `The packages are missing and this user may not write into ${root}; run it as the owner of that folder.`, error);
  }
}

/** @param {string} output */
function reasonOf(output) {
  const lines = output.split('\n').filter((line) => line.startsWith('npm error') && !/^npm error (code|A complete log|.*\.log$)/.test(line));
  return (lines[0] ?? output.trim().split('\n').at(-1) ?? '').replace(/^npm error\s*/, '') || 'npm gave no reason.';
}
