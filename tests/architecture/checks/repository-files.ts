import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync, statSync } from 'node:fs';

/** One file of the house as text. */
export interface HouseFile {
  readonly path: string;
  readonly text: string;
}

/** Every path that git holds or would take, from the root. */
export function repositoryPaths(): readonly string[] {
  const listed = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', '-z'], { encoding: 'utf8' });
  return listed.split('\0').filter((path) => path !== '' && existsSync(path) && statSync(path).isFile()).sort();
}

/** The files a person writes: sources, styles, settings and pages. The lock and binary files are not among them. */
export function repositoryFiles(): readonly HouseFile[] {
  const written = /\.(ts|tsx|mjs|cjs|js|css|sql|md|json|ya?ml|html)$|^\.ci\//;
  return repositoryPaths()
    .filter((path) => written.test(path) && path !== 'package-lock.json')
    .map((path) => ({ path, text: readFileSync(path, 'utf8') }));
}

/** The files a compiler or Node reads. */
export function sourceFiles(): readonly HouseFile[] {
  return repositoryFiles().filter((file) => /\.(ts|tsx|mjs|cjs|js)$/.test(file.path));
}
