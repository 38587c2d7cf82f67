import { basename } from 'node:path';

import ts from 'typescript';

import { exportedDeclarations, lineOf, parseSource, visitAll } from '@/tests/architecture/checks/parse-source';
import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** Words that say nothing: a name made of one of them hides what the thing is. */
export const emptyWords = ['data', 'info', 'item', 'items', 'manager', 'helper', 'helpers', 'util', 'utils', 'misc', 'common', 'process', 'flag', 'temp'];

/** Names that Next, Node or a tool demands. */
const demandedNames = [
  /^app\/(.*\/)?(page|layout|loading|error|not-found|global-error|route|template|default)\.tsx?$/,
  /^app\/(.*\/)?(\([a-z-]+\)|\[[a-zA-Z.]+\]|_[a-z-]+)\//,
  /^(README|DEVELOPERS)\.md$/,
  /^db\/migrations\/\d{4}-[a-z0-9-]+\.ts$/,
  /^\.ci\//,
];
const kebabFile = /^[a-z0-9]+(-[a-z0-9]+)*(\.(test|spec|config|d|setup))*\.[a-z0-9]+$/;

/** Problems of a file's own name and of the folders on its way. */
export function checkFileName(path: string): readonly string[] {
  const name = basename(path);
  const isHidden = path.startsWith('.');
  const words = path.toLowerCase().split(/[/.\-_]/);
  const empty = emptyWords.filter((word) => words.includes(word)).map((word) => `${path}: "${word}" says nothing, name what it is`);
  const isDemanded = demandedNames.some((pattern) => pattern.test(path)) && !name.includes('_') && name === (/^(README|DEVELOPERS)\.md$/.test(name) ? name : name.toLowerCase());
  const isNamed = isHidden || isDemanded || kebabFile.test(name);
  return [...empty, ...(isNamed ? [] : [`${path}: file names are kebab-case`])];
}

/** Problems of the names that a file declares: variables, parameters, functions, types and the fields of own types. */
export function checkDeclaredNames(file: HouseFile): readonly string[] {
  const source = parseSource(file);
  const problems: string[] = [];
  visitAll(source, (node) => {
    const isDeclared =
      ts.isVariableDeclaration(node) || ts.isParameter(node) || ts.isFunctionDeclaration(node) || ts.isBindingElement(node) ||
      ts.isInterfaceDeclaration(node) || ts.isTypeAliasDeclaration(node) || ts.isPropertySignature(node) || ts.isClassDeclaration(node);
    if (!isDeclared || !node.name || !ts.isIdentifier(node.name)) return;
    const words = node.name.text.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase().split(/[ _]/);
    // "serverProcess" is a process of the machine and says so; "process" alone says nothing. Fields follow foreign shapes.
    const isWhole = (word: string) => words.length === 1 && words[0] === word;
    const empty = emptyWords.filter((word) => (ts.isPropertySignature(node) || word === 'process' ? isWhole(word) : words.includes(word)));
    for (const word of empty) problems.push(`${file.path}:${lineOf(source, node)}: "${node.name.text}" holds the empty word "${word}"`);
  });
  return problems;
}

/** Programs: started by a command line, so they export nothing. */
export const startedPrograms: Readonly<Record<string, string>> = {
  'server/main.ts': 'the composition root',
  'server/setup/start.mjs': 'npm start',
  'server/setup/with-packages.mjs': 'npm test',
  'server/setup/build-product.ts': 'npm run build',
  'server/setup/verify.ts': 'npm run verify',
  'server/setup/database/run-migrations.ts': 'started by migrate-database.ts',
  'server/setup/psql.ts': 'npm run psql',
  'server/auth/print-code.ts': 'npm run code',
  'server/auth/print-token.ts': 'npm run token',
};

/**
 * The problem of a file in lib, server or db whose name does not lead to its export. One function or value carries
 * the name of the file; of several types, one holds every word of it; a family of functions is named by its subject.
 * Migrations hand out up and down.
 */
export function checkMainExport(file: HouseFile): readonly string[] {
  if (!/^(lib|server|db)\/.*\.(ts|tsx|mjs)$/.test(file.path) || /\.d\.m?ts$/.test(file.path)) return [];
  if (file.path.startsWith('db/migrations/') || file.path in startedPrograms) return [];
  const declarations = exportedDeclarations(parseSource(file));
  const names = declarations.map((declaration) => declaration.name.toLowerCase());
  const valueCount = declarations.filter(({ node }) => !ts.isInterfaceDeclaration(node) && !ts.isTypeAliasDeclaration(node)).length;
  const words = basename(file.path).replace(/\.(ts|tsx|mjs)$/, '').split('-');
  const isSubject = names.length > 1 && names.some((name) => words.every((word) => name.includes(word.replace(/ies$|s$/, ''))));
  if (names.includes(words.join('')) || (valueCount < 2 && names.length - valueCount > 1 && isSubject) || valueCount > 1) return [];
  return [`${file.path}: exports ${names.join(', ') || 'nothing'}, none called like the file`];
}

/** The problem of a file that only hands on what others export. */
export function checkBarrel(file: HouseFile): readonly string[] {
  const { statements } = parseSource(file);
  const isBarrel = statements.length > 0 && statements.every((statement) => ts.isExportDeclaration(statement) && statement.moduleSpecifier);
  const isIndex = /(^|\/)index\.[cm]?[jt]sx?$/.test(file.path);
  return isBarrel || isIndex ? [`${file.path}: a barrel file hides where things live, import from the file itself`] : [];
}
