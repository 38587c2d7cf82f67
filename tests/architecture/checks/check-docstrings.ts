import ts from 'typescript';

import { exportedDeclarations, lineOf, parseSource, type ExportedDeclaration } from '@/tests/architecture/checks/parse-source';
import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** A docstring taken apart: its prose, and the text after each tag. */
export interface Docstring {
  readonly prose: string;
  readonly tags: ReadonlyMap<string, readonly string[]>;
}

/** The docstring right above a statement, null where there is none. */
export function docstringOf(source: ts.SourceFile, statement: ts.Statement): Docstring | null {
  const comments = ts.getLeadingCommentRanges(source.text, statement.pos) ?? [];
  const last = comments.at(-1);
  const text = last ? source.text.slice(last.pos, last.end) : '';
  if (!text.startsWith('/**')) return null;
  const lines = text.slice(3, -2).split('\n').map((line) => line.replace(/^\s*\* ?/, ''));
  const [prose = '', ...tagged] = lines.join('\n').split(/(?:^|\s)@(?=[a-z])/);
  const tags = new Map<string, string[]>();
  for (const part of tagged) {
    const name = /^[a-z]+/.exec(part)?.[0] ?? '';
    tags.set(name, [...(tags.get(name) ?? []), part.slice(name.length).trim()]);
  }
  return { prose: prose.trim(), tags };
}

/** What each exported function of lib says of itself. */
const functionTags = ['returns', 'source'];
/** In the sciences every parameter is told, in the rest those whose name and type leave the form or the unit open. */
const sciences = /^lib\/(units|signal|response|conduction|change|alert)\//;
const unitAtTheEnd = /(Ms|Mm|Uv|Mv|Ma|Us|Mps|Percent|Px|Seconds|Minutes|Count|Bytes|Id|Seq)$/;
const unitWords =
  /\b(ms|s|min|mm|cm|m\/s|mA|Hz|px|seconds|minutes|milliseconds|bytes|points|count|number of|index|ratio|share|factor|rank|order|unit|length|position|times|lines|entries)\b|%|µ|°C/;

/** Problems of the docstrings of one file of lib: missing, without a sentence, a parameter, a state or an origin. */
export function checkDocstrings(file: HouseFile): readonly string[] {
  const source = parseSource(file);
  return exportedDeclarations(source).flatMap((declaration) => {
    // A type read off a schema says nothing that the schema has not said.
    if (ts.isTypeAliasDeclaration(declaration.node) && declaration.node.type.getText(source).startsWith('z.infer<')) return [];
    const docstring = docstringOf(source, declaration.statement);
    const where = `${file.path}:${lineOf(source, declaration.statement)}: ${declaration.name}`;
    if (!docstring) return [`${where} has no docstring`];
    const problems = docstring.prose.length < 12 ? ['has no summary'] : [];
    const signature = functionOf(declaration);
    if (signature) problems.push(...functionProblems(declaration.name, signature, docstring, sciences.test(file.path)));
    return problems.map((problem) => `${where} ${problem}`);
  });
}

type Signature = ts.FunctionDeclaration | ts.ArrowFunction | ts.FunctionExpression;

function functionOf({ node }: ExportedDeclaration): Signature | null {
  if (ts.isFunctionDeclaration(node)) return node;
  const value = ts.isVariableDeclaration(node) ? node.initializer : undefined;
  return value && (ts.isArrowFunction(value) || ts.isFunctionExpression(value)) ? value : null;
}

function functionProblems(name: string, signature: Signature, docstring: Docstring, isScience: boolean): string[] {
  const problems = functionTags.filter((tag) => !docstring.tags.has(tag)).map((tag) => `has no @${tag}`);
  const told = docstring.tags.get('param') ?? [];
  for (const parameter of signature.parameters) {
    const parameterName = ts.isIdentifier(parameter.name) ? parameter.name.text : null;
    if (parameterName === null || (!isScience && saysItself(parameterName, parameter))) continue;
    if (!told.some((text) => text.replace(/^\[|\]/, '').startsWith(parameterName))) problems.push(`has no @param ${parameterName}`);
  }
  const throwsRange = /throw new RangeError|\bassert[A-Z]\w*\(/.test(signature.body?.getText() ?? '');
  if (throwsRange && !docstring.tags.has('throws')) problems.push('throws and has no @throws');
  const isNumber = signature.type?.kind === ts.SyntaxKind.NumberKeyword;
  const hasUnit = unitAtTheEnd.test(name) || unitWords.test((docstring.tags.get('returns') ?? []).join(' '));
  if (isNumber && !hasUnit) problems.push('returns a number whose @returns names no unit');
  return problems;
}

/** A parameter of a type that the house has described, or with its unit at the end of its name. */
function saysItself(name: string, parameter: ts.ParameterDeclaration): boolean {
  const { type } = parameter;
  return unitAtTheEnd.test(name) || (type !== undefined && !/^(readonly )?(number|string|boolean|unknown|object|\{)/.test(type.getText()));
}
