import ts from 'typescript';

import { docstringOf } from '@/tests/architecture/checks/check-docstrings';
import { exportedDeclarations, parseSource, visitAll } from '@/tests/architecture/checks/parse-source';
import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** One line of an example: what is called, and what it is said to give. */
export interface Example {
  readonly path: string;
  readonly name: string;
  readonly expression: string;
  readonly expected: string;
}

/** The examples of a file that promise a value: `expression // => value`, the value on the same or the next line. */
export function examplesOf(file: HouseFile): readonly Example[] {
  const source = parseSource(file);
  return exportedDeclarations(source).flatMap(({ name, statement }) => {
    const texts = docstringOf(source, statement)?.tags.get('example') ?? [];
    return texts.flatMap((text) =>
      [...text.matchAll(/([\s\S]*?)\s*\/\/ => (.*)(?:\n|$)/g)].map((match) => ({
        path: file.path,
        name,
        expression: (match[1] ?? '').trim().replace(/;$/, ''),
        expected: (match[2] ?? '').trim(),
      })),
    );
  });
}

/** What an example gives and what it promises, run with the exports of its file at hand. */
export function runExample(example: Example, exported: Readonly<Record<string, unknown>>): { given: unknown; promised: unknown } {
  const names = Object.keys(exported).filter((name) => name !== 'default');
  const run = (text: string): unknown => new Function(...names, `'use strict'; return (${text});`)(...names.map((name) => exported[name]));
  return { given: plainSpaces(run(example.expression)), promised: plainSpaces(run(example.expected)) };
}

/** Text with every space an ordinary one: a docstring cannot show a space that does not break. */
function plainSpaces(value: unknown): unknown {
  return typeof value === 'string' ? value.replace(/[\u00a0\u2009\u202f]/g, ' ') : value;
}

/** Names an example uses that neither its file nor the language gives: such an example is read, not run. */
export function strangersIn(example: Example, exportedNames: readonly string[]): readonly string[] {
  const source = parseSource({ path: 'example.ts', text: `(${example.expression});` });
  const used = new Set<string>();
  const own = new Set<string>(exportedNames);
  visitAll(source, (node) => {
    if (ts.isParameter(node) && ts.isIdentifier(node.name)) own.add(node.name.text);
    if (!ts.isIdentifier(node)) return;
    const { parent } = node;
    const isField = (ts.isPropertyAccessExpression(parent) && parent.name === node) || (ts.isPropertyAssignment(parent) && parent.name === node);
    if (!isField) used.add(node.text);
  });
  return [...used].filter((name) => !own.has(name) && !(name in globalThis));
}
