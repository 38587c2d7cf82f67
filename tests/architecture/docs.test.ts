import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

import { describe, expect, it } from 'vitest';

import { checkDocstrings, docstringOf } from '@/tests/architecture/checks/check-docstrings';
import { examplesOf, runExample, strangersIn } from '@/tests/architecture/checks/examples';
import { exportedDeclarations, parseSource } from '@/tests/architecture/checks/parse-source';
import { sourceFiles, type HouseFile } from '@/tests/architecture/checks/repository-files';

const library = sourceFiles().filter((file) => file.path.startsWith('lib/'));
const examples = library.flatMap((file) => {
  const exportedNames = exportedDeclarations(parseSource(file)).map((declaration) => declaration.name);
  return examplesOf(file).map((example) => ({ ...example, strangers: strangersIn(example, exportedNames) }));
});
const runnable = examples.filter((example) => example.strangers.length === 0);

/** Test files that @accuracy names and that are not there. */
function missingProofs(file: HouseFile): readonly string[] {
  const source = parseSource(file);
  return exportedDeclarations(source).flatMap(({ name, statement }) => {
    const accuracy = (docstringOf(source, statement)?.tags.get('accuracy') ?? []).join(' ');
    const named = accuracy.match(/tests\/[\w/.-]+\.test\.tsx?/g) ?? [];
    return named.filter((path) => !existsSync(path)).map((path) => `${file.path}: ${name} names ${path}, which is not there`);
  });
}

describe('the docstrings of lib', () => {
  it('say of each export what it is, takes, gives and rests on', () => expect(library.flatMap(checkDocstrings)).toEqual([]));
  it('name proofs that are there', () => expect(library.flatMap(missingProofs)).toEqual([]));

  it('hold examples that are run, all of them in the sciences of measurement', () => {
    process.stdout.write(`${runnable.length} examples run, ${examples.length - runnable.length} read only: they need a case at hand\n`);
    for (const folder of ['units', 'conduction', 'change', 'reference']) {
      const here = examples.filter((example) => example.path.startsWith(`lib/${folder}/`));
      expect(here.length).toBeGreaterThan(0);
      expect(here.filter((example) => example.strangers.length > 0)).toEqual([]);
    }
  });

  it.each(runnable.map((example) => [`${example.path} ${example.name}: ${example.expression.slice(0, 40)}`, example] as const))('%s', async (_name, example) => {
    const exported = (await import(pathToFileURL(join(process.cwd(), example.path)).href)) as Record<string, unknown>;
    const { given, promised } = runExample(example, exported);
    expect(given).toEqual(promised);
  });
});

describe('the check of docstrings can fail', () => {
  const good = '/**\n * A summary that says something.\n * @param onsetMs in ms\n * @returns in ms\n * @source house rule\n */\n';
  const text = 'export function f(onsetMs: number): number { return onsetMs; }\n';
  const problems = (docstring: string, code = text) => checkDocstrings({ path: 'lib/units/a.ts', text: docstring + code });

  it('lets a complete docstring pass', () => expect(problems(good)).toEqual([]));
  it('finds a missing docstring', () => expect(problems('')).toHaveLength(1));
  it('does not take the comment of another statement', () => expect(problems(`${good}const x = 1;\n`)).toHaveLength(1));
  it.each(['@param onsetMs in ms', '@returns in ms', '@source house rule'])('finds a missing %s', (line) => {
    expect(problems(good.replace(` * ${line}\n`, ''))).not.toEqual([]);
  });
  it('asks for every parameter in the sciences, elsewhere for those that leave something open', () => {
    const code = 'export function f(state: CaseState, nowMs: number, zone: string): string { return zone; }\n';
    const told = '/** A summary that says something. @returns words @source house rule */\n';
    const asked = (path: string) => checkDocstrings({ path, text: told + code }).map((problem) => problem.split('@param ')[1]);
    expect(asked('lib/text/a.ts')).toEqual(['zone']);
    expect(asked('lib/change/a.ts')).toEqual(['state', 'nowMs', 'zone']);
  });
  it('finds a number without a unit', () => expect(problems(good.replace('@returns in ms', '@returns the result'))).toHaveLength(1));
  it('finds a summary that says nothing', () => expect(problems(good.replace('A summary that says something.', 'F.'))).toHaveLength(1));
  it('finds a throw that is not told', () => {
    expect(problems(good, "export function f(onsetMs: number): number { throw new RangeError('x'); }\n")).toHaveLength(1);
  });
  it('tells an example that needs more than its file gives', () => {
    const example = { path: 'lib/a.ts', name: 'f', expression: "f(state, [1].map((x) => Math.abs(x)), { state: 1 }).kind", expected: '1' };
    expect(strangersIn(example, ['f'])).toEqual(['state']);
  });
  it('runs an example and finds a wrong one', () => {
    const [example] = examplesOf({ path: 'lib/a.ts', text: `/**\n * A sum of two numbers.\n * @example\n * sum(1, 2) // => 4\n */\nexport const sum = 1;\n` });
    if (!example) throw new Error('Expected one example');
    expect(runExample(example, { sum: (a: number, b: number) => a + b })).toEqual({ given: 3, promised: 4 });
  });
});
