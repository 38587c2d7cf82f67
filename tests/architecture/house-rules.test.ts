import { describe, expect, it } from 'vitest';

import { checkBarrel, checkDeclaredNames, checkFileName, checkMainExport } from '@/tests/architecture/checks/check-names';
import { checkSize, fileLinesMax, functionLinesMax, lineCount, median } from '@/tests/architecture/checks/check-size';
import { checkTopLevel, topLevel } from '@/tests/architecture/checks/check-top-level';
import { checkWords } from '@/tests/architecture/checks/check-words';
import { repositoryFiles, repositoryPaths, sourceFiles } from '@/tests/architecture/checks/repository-files';

const files = repositoryFiles();
const sources = sourceFiles();
const lines = (count: number) => 'const x = 1;\n'.repeat(count);

describe('the house', () => {
  it('has exactly its top level', () => expect(checkTopLevel(repositoryPaths())).toEqual([]));
  it('has short files and short functions', () => expect(files.flatMap(checkSize)).toEqual([]));
  it('names its files in kebab-case without empty words', () => expect(repositoryPaths().flatMap(checkFileName)).toEqual([]));
  it('declares no empty names', () => expect(sources.flatMap(checkDeclaredNames)).toEqual([]));
  it('calls each file of lib, server and db like what it exports', () => expect(sources.flatMap(checkMainExport)).toEqual([]));
  it('has no barrel files', () => expect(sources.flatMap(checkBarrel)).toEqual([]));
  it('has no leftovers, silenced checks or traces of one machine', () => expect(files.flatMap(checkWords)).toEqual([]));

  it('is small by habit: half of lib within 50 lines, half of all within 80', () => {
    const sizes = (prefix: string) => sources.filter((file) => file.path.startsWith(prefix)).map(lineCount);
    const rows = ['lib/', 'db/', 'server/', 'app/', 'tests/', ''].map((prefix) => ({
      folder: prefix || 'all',
      files: sizes(prefix).length,
      median: median(sizes(prefix)),
      longest: Math.max(0, ...sizes(prefix)),
    }));
    process.stdout.write(`${rows.map((row) => `${row.folder} ${row.files} files, median ${row.median}, longest ${row.longest}`).join('\n')}\n`);
    expect(median(sizes('lib/'))).toBeLessThanOrEqual(50);
    expect(median(sizes(''))).toBeLessThanOrEqual(80);
  });
});

describe('each rule of the house can fail', () => {
  it('the top level', () => {
    expect(checkTopLevel([...topLevel, 'utils/x.ts'])).toEqual(['utils: not on the map of the top level']);
    expect(checkTopLevel([...topLevel.slice(1), '.gitignore'])).toEqual(['app: missing at the top level']);
  });

  it('sizes, on both sides of the limit', () => {
    expect(checkSize({ path: 'lib/a.ts', text: lines(fileLinesMax - 1) })).toEqual([]);
    expect(checkSize({ path: 'lib/a.ts', text: lines(fileLinesMax) })).toHaveLength(1);
    const body = (count: number) => `function f() {\n${lines(count - 2)}}\n`;
    expect(checkSize({ path: 'lib/a.ts', text: body(functionLinesMax) })).toEqual([]);
    expect(checkSize({ path: 'lib/a.ts', text: body(functionLinesMax + 1) })).toHaveLength(1);
  });

  it.each(['lib/JudgeChange.ts', 'lib/judge_change.ts', 'lib/change-utils.ts', 'lib/common/judge.ts', 'app/api/cases/Route.ts'])('the file name %s', (path) => {
    expect(checkFileName(path)).not.toEqual([]);
  });

  it.each(['lib/change/judge-change.ts', 'app/api/cases/[caseId]/route.ts', 'README.md', '.ci/run', 'db/migrations/0001-roles.ts'])('and lets %s pass', (path) => {
    expect(checkFileName(path)).toEqual([]);
  });

  it.each(['const data = 1;', 'function f(item: number) {}', 'const caseData = 1;', 'interface A { info: string }', 'const { flag } = x;', 'const process = 1;'])('the name in %s', (text) => {
    expect(checkDeclaredNames({ path: 'lib/a.ts', text })).toHaveLength(1);
  });

  it.each(['const temperatureC = 1;', 'const { data: cases } = x;', 'const { data: cases }: { readonly x: 1 } = y;', 'process.exit(1);', 'const serverProcess = 1;'])('and lets the names in %s pass', (text) => {
    expect(checkDeclaredNames({ path: 'lib/a.ts', text })).toEqual([]);
  });

  it('the main export', () => {
    expect(checkMainExport({ path: 'lib/change/judge-change.ts', text: 'export const other = 1;' })).toHaveLength(1);
    expect(checkMainExport({ path: 'lib/change/judge-change.ts', text: 'export function judgeChange() {}' })).toEqual([]);
    expect(checkMainExport({ path: 'lib/case/entries.ts', text: 'export type EntryKind = 1;' })).toHaveLength(1);
    expect(checkMainExport({ path: 'lib/case/bodies.ts', text: 'export type EntryKind = 1;\nexport type Reading = 2;' })).toHaveLength(1);
    expect(checkMainExport({ path: 'lib/case/entry.ts', text: 'export type EntryKind = 1;\nexport type EntryBody = 2;' })).toEqual([]);
    expect(checkMainExport({ path: 'server/nothing.ts', text: 'start();' })).toHaveLength(1);
  });

  it('barrel files', () => {
    expect(checkBarrel({ path: 'lib/change/all.ts', text: "export * from '@/lib/change/a';\nexport { b } from '@/lib/change/b';" })).toHaveLength(1);
    expect(checkBarrel({ path: 'lib/change/index.ts', text: 'export const x = 1;' })).toHaveLength(1);
  });

  it.each([`// TO${'DO'} later`, `x as a${'ny'}`, `// @ts-igno${'re'}`, `// eslint-disa${'ble'}`, `'/ho${'me'}/someone'`, `"https://regis${'try'}.npmjs.org"`, `it.sk${'ip'}('x')`])('the words in %s', (text) => {
    expect(checkWords({ path: 'lib/a.ts', text })).toHaveLength(1);
  });
});
