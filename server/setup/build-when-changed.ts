import { build as bundle } from 'esbuild';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { buildEnvironment, type BuildFolders } from './build-folders';
import { runProgram, tellingLine } from './run-program.mjs';
import { SetupFailure } from './setup-failure.mjs';
import { sourceDigest } from './source-digest';

/** Builds pages and server when a source changed since the last finished build. */
export async function buildWhenChanged(root: string, folders: BuildFolders): Promise<string> {
  const nextFolder = path.join(root, folders.nextFolder ?? '.next');
  const stamp = path.join(folders.bundleFolder, 'built-from');
  const wanted = sourceDigest(root);
  const isBuilt = existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted && existsSync(path.join(nextFolder, 'BUILD_ID')) && existsSync(folders.serverFile);
  if (isBuilt) return 'unchanged';
  rmSync(folders.bundleFolder === path.dirname(nextFolder) ? stamp : folders.bundleFolder, { recursive: true, force: true });
  mkdirSync(folders.bundleFolder, { recursive: true });
  await buildPages(root, nextFolder, folders);
  await bundleServer(root, folders);
  writeFileSync(stamp, wanted);
  return 'built';
}

async function buildPages(root: string, nextFolder: string, folders: BuildFolders): Promise<void> {
  if (folders.nextFolder !== null) writeCompilerSettings(root, path.dirname(nextFolder));
  const next = path.join(root, 'node_modules/next/dist/bin/next');
  const { status, output } = await runProgram(process.execPath, [next, 'build'], { cwd: root, env: { ...process.env, ...buildEnvironment(folders) } });
  if (status === 0) return;
  // What a failed build leaves in its cache can make every later one fail.
  rmSync(nextFolder, { recursive: true, force: true });
  const log = path.join(folders.bundleFolder, 'build.log');
  writeFileSync(log, output);
  throw new SetupFailure('build', `The pages could not be built: ${tellingLine(output)} (all of it: ${path.relative(root, log)}).`);
}

/** Next writes into the compiler settings that it is given; the tests' build gets some of its own. */
function writeCompilerSettings(root: string, folder: string): void {
  mkdirSync(folder, { recursive: true });
  const up = path.relative(folder, root);
  const wanted = { extends: `${up}/tsconfig.json`, compilerOptions: { paths: { '@/*': [`${up}/*`] } }, include: [`${up}/app/**/*.ts`, `${up}/app/**/*.tsx`, `${up}/server/main.ts`], exclude: [`${up}/node_modules`] };
  writeFileSync(path.join(folder, 'tsconfig.json'), `${JSON.stringify(wanted, null, 2)}\n`);
}

/** `server/workers/<name>-worker.ts` becomes `<name>-worker.mjs` beside the server. */
async function bundleServer(root: string, folders: BuildFolders): Promise<void> {
  const workers = path.join(root, 'server/workers');
  const workerFiles = existsSync(workers) ? readdirSync(workers).filter((name) => name.endsWith('-worker.ts')) : [];
  const entryPoints = [{ in: 'server/main.ts', out: 'server' }, ...workerFiles.map((name) => ({ in: `server/workers/${name}`, out: name.replace(/\.ts$/, '') }))];
  try {
    await bundle({ absWorkingDir: root, entryPoints, outdir: folders.bundleFolder, outExtension: { '.js': '.mjs' }, bundle: true, platform: 'node', target: 'node20', format: 'esm', packages: 'external', sourcemap: true, logLevel: 'silent' });
  } catch (error) {
    throw new SetupFailure('build', `The server could not be built: ${error instanceof Error ? error.message : String(error)}.`, error);
  }
}
