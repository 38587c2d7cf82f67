import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { checkLock, checkPinned, checkReasons, checkUsed } from '@/tests/architecture/checks/check-dependencies';
import { repositoryFiles } from '@/tests/architecture/checks/repository-files';

interface Manifest {
  readonly dependencies: Readonly<Record<string, string>>;
  readonly devDependencies: Readonly<Record<string, string>>;
}

const manifest = JSON.parse(readFileSync('package.json', 'utf8')) as Manifest;
const all = { ...manifest.dependencies, ...manifest.devDependencies };
const readIfThere = (path: string): string => repositoryFiles().find((file) => file.path === path)?.text ?? '';

describe('the packages', () => {
  it('are pinned to one version each', () => expect(checkPinned(all)).toEqual([]));
  it('are each really used', () => expect(checkUsed(Object.keys(all), repositoryFiles())).toEqual([]));
  it('have a lock that names no host', () => expect(checkLock(readFileSync('package-lock.json', 'utf8'))).toEqual([]));
  it('are each named with a reason in DEVELOPERS.md', () => expect(checkReasons(Object.keys(all), readIfThere('DEVELOPERS.md'))).toEqual([]));
});

describe('the check of packages can fail', () => {
  it.each(['^1.2.3', '~1.2.3', '1.2', 'latest', '*', '1.2.3 || 2.0.0'])('version %s', (version) => {
    expect(checkPinned({ zod: version })).toHaveLength(1);
  });

  it('an unused package, and one that is only talked about', () => {
    const text = "// zod is nice\nimport { z } from 'pg';";
    expect(checkUsed(['zod', 'pg'], [{ path: 'lib/a.ts', text }])).toEqual(['zod: named in package.json and never used']);
  });

  it('uses by import, part of a package, style sheet, command and types', () => {
    const files = [
      { path: 'a.ts', text: "import { sha256 } from '@noble/hashes/sha2.js';\nawait import('idb');" },
      { path: 'b.css', text: "@import '@fontsource-variable/some-font';" },
      { path: 'package.json', text: '{"scripts":{"x":"node --import tsx a.ts","lint":"eslint ."},"postcss":{"plugins":{"@tailwindcss/postcss":{}}}}' },
    ];
    const names = ['@noble/hashes', 'idb', '@fontsource-variable/some-font', 'tsx', 'eslint', '@tailwindcss/postcss', '@types/node'];
    expect(checkUsed(names, files)).toEqual([]);
    expect(checkUsed(['@types/pg'], files)).toHaveLength(1);
  });

  it('a lock with an address', () => {
    expect(checkLock('{"packages":{"node_modules/zod":{"resolved":"https://host/zod.tgz"}}}')).toHaveLength(1);
    expect(checkLock('{"packages":{"node_modules/zod":{"version":"1.0.0","integrity":"sha512-x"}}}')).toEqual([]);
    expect(checkLock('{"packages":{"node_modules/zod":{"version":"1.0.0"}}}')).toHaveLength(1);
  });

  it('a package without a reason', () => {
    expect(checkReasons(['zod'], '`zod`')).toHaveLength(1);
    expect(checkReasons(['zod'], '| `zod` | parses what comes in at the door |')).toEqual([]);
    expect(checkReasons(['pg'], 'knex and pgvector are names of other things')).toHaveLength(1);
  });
});
