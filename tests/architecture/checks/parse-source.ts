import ts from 'typescript';

import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** The syntax tree of a source file, with parents set. */
export function parseSource(file: HouseFile): ts.SourceFile {
  const kind = /\.(tsx|jsx)$/.test(file.path) ? ts.ScriptKind.TSX : /\.[cm]?js$/.test(file.path) ? ts.ScriptKind.JS : ts.ScriptKind.TS;
  return ts.createSourceFile(file.path, file.text, ts.ScriptTarget.ES2022, true, kind);
}

/** Calls the visitor with a node and everything below it. */
export function visitAll(node: ts.Node, visit: (node: ts.Node) => void): void {
  visit(node);
  ts.forEachChild(node, (child) => visitAll(child, visit));
}

/** The line a node starts on, counted from 1. */
export function lineOf(source: ts.SourceFile, node: ts.Node): number {
  return source.getLineAndCharacterOfPosition(node.getStart(source)).line + 1;
}

/** A declaration that a file hands out, with the statement that carries its docstring. */
export interface ExportedDeclaration {
  readonly name: string;
  readonly node: ts.FunctionDeclaration | ts.VariableDeclaration | ts.InterfaceDeclaration | ts.TypeAliasDeclaration | ts.ClassDeclaration;
  readonly statement: ts.Statement;
}

/** Everything a file declares and exports by name, in order. */
export function exportedDeclarations(source: ts.SourceFile): readonly ExportedDeclaration[] {
  return source.statements.flatMap((statement): ExportedDeclaration[] => {
    const isExported = ts.canHaveModifiers(statement) && ts.getModifiers(statement)?.some((modifier) => modifier.kind === ts.SyntaxKind.ExportKeyword);
    if (!isExported) return [];
    if (ts.isVariableStatement(statement)) {
      return statement.declarationList.declarations.flatMap((node) => (ts.isIdentifier(node.name) ? [{ name: node.name.text, node, statement }] : []));
    }
    if (ts.isFunctionDeclaration(statement) || ts.isClassDeclaration(statement)) {
      return [{ name: statement.name?.text ?? 'default', node: statement, statement }];
    }
    if (ts.isInterfaceDeclaration(statement) || ts.isTypeAliasDeclaration(statement)) {
      return [{ name: statement.name.text, node: statement, statement }];
    }
    return [];
  });
}
