import ts from 'typescript';

import { lineOf, parseSource, visitAll } from '@/tests/architecture/checks/parse-source';
import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** A file ends before this line. */
export const fileLinesMax = 300;
/** A function has at most so many lines. */
export const functionLinesMax = 70;

/** Lines of a file, a last line without text not counted. */
export function lineCount(file: HouseFile): number {
  return file.text.replace(/\n$/, '').split('\n').length;
}

/** Problems of size: a long file or a long function. A block of tests (`describe`) is a list, not a function. */
export function checkSize(file: HouseFile): readonly string[] {
  const lines = lineCount(file);
  const longFile = lines >= fileLinesMax ? [`${file.path}: ${lines} lines, under ${fileLinesMax} are allowed`] : [];
  if (!/\.(ts|tsx|mjs|cjs|js)$/.test(file.path)) return longFile;
  const source = parseSource(file);
  const longFunctions: string[] = [];
  visitAll(source, (node) => {
    if (!ts.isFunctionLike(node) || !('body' in node) || node.body === undefined || isTestBlock(node)) return;
    const first = lineOf(source, node);
    const last = source.getLineAndCharacterOfPosition(node.end).line + 1;
    if (last - first + 1 > functionLinesMax) {
      longFunctions.push(`${file.path}:${first}: function of ${last - first + 1} lines, ${functionLinesMax} are allowed`);
    }
  });
  return [...longFile, ...longFunctions];
}

function isTestBlock(node: ts.Node): boolean {
  const call = node.parent;
  return ts.isCallExpression(call) && /^describe\b/.test(call.expression.getText());
}

/** The middle of a list of numbers; the lower one of two. */
export function median(numbers: readonly number[]): number {
  const sorted = [...numbers].sort((a, b) => a - b);
  return sorted[Math.floor((sorted.length - 1) / 2)] ?? 0;
}
