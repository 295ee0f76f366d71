// What the architecture's rules need to know of a source file, read off its syntax tree.
import path from 'node:path';
import ts from 'typescript';

export interface Import {
  /** As written: `#shared/units`, `./queue`, `zod`. */
  readonly specifier: string;
  readonly line: number;
  /** False if it is put together at run time. */
  readonly isKnown: boolean;
  /** Gone after compilation. */
  readonly isTypeOnly: boolean;
}

export interface Use {
  readonly name: string;
  readonly line: number;
}

export interface SourceFile {
  /** From the project's root, with `/`. */
  readonly path: string;
  readonly text: string;
  readonly lines: number;
  readonly imports: readonly Import[];
  /** Names that are used and that the file does not declare itself. */
  readonly globals: readonly Use[];
  /** `Math.x`, also out of `const { x } = Math`. */
  readonly mathUses: readonly Use[];
  /** Lines with `a ** b`. */
  readonly powers: readonly number[];
}

function isTypeOnlyClause(clause: ts.ImportClause | undefined): boolean {
  if (clause === undefined) return false;
  if (clause.isTypeOnly) return true;
  const { name, namedBindings } = clause;
  if (name !== undefined || namedBindings === undefined || ts.isNamespaceImport(namedBindings)) return false;
  return namedBindings.elements.length > 0 && namedBindings.elements.every((e) => e.isTypeOnly);
}

/** The specifier of `import 'x'`, `export … from 'x'`, `import('x')`, `typeof import('x')`, `new URL('x', import.meta.url)`, `require('x')`. */
function importOf(node: ts.Node): { readonly specifier: ts.Expression; readonly isTypeOnly: boolean } | null {
  if (ts.isImportDeclaration(node)) {
    return { specifier: node.moduleSpecifier, isTypeOnly: isTypeOnlyClause(node.importClause) };
  }
  if (ts.isExportDeclaration(node) && node.moduleSpecifier !== undefined) {
    return { specifier: node.moduleSpecifier, isTypeOnly: node.isTypeOnly };
  }
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument) && ts.isStringLiteral(node.argument.literal)) {
    return { specifier: node.argument.literal, isTypeOnly: true };
  }
  if (ts.isCallExpression(node)) {
    const { expression } = node;
    const isImport = expression.kind === ts.SyntaxKind.ImportKeyword;
    const isRequire = ts.isIdentifier(expression) && expression.text === 'require';
    const [first] = node.arguments;
    if ((isImport || isRequire) && first !== undefined) return { specifier: first, isTypeOnly: false };
  }
  if (ts.isNewExpression(node) && ts.isIdentifier(node.expression) && node.expression.text === 'URL') {
    const [first, second] = node.arguments ?? [];
    const isModule = first !== undefined && ts.isStringLiteralLike(first) && /\.(tsx?|mjs|js)$/.test(first.text);
    if (isModule && second?.getText() === 'import.meta.url') return { specifier: first, isTypeOnly: false };
  }
  return null;
}

/** Whether an identifier is the name of a property, a member, a label or a declaration rather than a use. */
function isMereName(node: ts.Identifier): boolean {
  const { parent } = node;
  if (ts.isPropertyAccessExpression(parent)) return parent.name === node;
  if (ts.isQualifiedName(parent)) return parent.right === node;
  if (ts.isBindingElement(parent)) return parent.propertyName === node || parent.name === node;
  if (ts.isJsxAttribute(parent) || ts.isImportSpecifier(parent) || ts.isExportSpecifier(parent)) return true;
  if (ts.isShorthandPropertyAssignment(parent)) return false;
  const named = parent as { readonly name?: ts.Node };
  return named.name === node;
}

function declaredBy(node: ts.Node): ts.Identifier | null {
  const isDeclaration =
    ts.isVariableDeclaration(node) ||
    ts.isParameter(node) ||
    ts.isFunctionDeclaration(node) ||
    ts.isFunctionExpression(node) ||
    ts.isClassDeclaration(node) ||
    ts.isBindingElement(node) ||
    ts.isImportSpecifier(node) ||
    ts.isNamespaceImport(node) ||
    ts.isImportClause(node) ||
    ts.isInterfaceDeclaration(node) ||
    ts.isTypeAliasDeclaration(node) ||
    ts.isTypeParameterDeclaration(node) ||
    ts.isEnumDeclaration(node);
  return isDeclaration && node.name !== undefined && ts.isIdentifier(node.name) ? node.name : null;
}

/** The member of `Math` that a node reads; `null` if it reads none, '?' if it cannot be told which. */
function mathMember(node: ts.Node): string | null {
  if (!ts.isIdentifier(node) || node.text !== 'Math') return null;
  const { parent } = node;
  if (ts.isPropertyAccessExpression(parent) && parent.expression === node) return parent.name.text;
  if (ts.isElementAccessExpression(parent) && ts.isStringLiteralLike(parent.argumentExpression)) {
    return parent.argumentExpression.text;
  }
  if (ts.isVariableDeclaration(parent) && ts.isObjectBindingPattern(parent.name)) {
    return parent.name.elements.map((e) => (e.propertyName ?? e.name).getText()).join(',');
  }
  return isMereName(node) ? null : '?';
}

export function readSource(file: string, text: string): SourceFile {
  const kind = /x$/.test(file) ? ts.ScriptKind.TSX : /js$/.test(file) ? ts.ScriptKind.JS : ts.ScriptKind.TS;
  const tree = ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true, kind);
  const lineOf = (node: ts.Node): number => tree.getLineAndCharacterOfPosition(node.getStart()).line + 1;
  const imports: Import[] = [];
  const uses: Use[] = [];
  const declared = new Set<string>();
  const mathUses: Use[] = [];
  const powers: number[] = [];
  const walk = (node: ts.Node): void => {
    const found = importOf(node);
    if (found !== null) {
      const { specifier, isTypeOnly } = found;
      const isKnown = ts.isStringLiteralLike(specifier);
      const written = isKnown ? specifier.text : specifier.getText();
      imports.push({ specifier: written, line: lineOf(node), isKnown, isTypeOnly });
    }
    const name = declaredBy(node);
    if (name !== null) declared.add(name.text);
    if (ts.isIdentifier(node) && !isMereName(node)) uses.push({ name: node.text, line: lineOf(node) });
    for (const member of mathMember(node)?.split(',') ?? []) mathUses.push({ name: member, line: lineOf(node) });
    if (
      ts.isBinaryExpression(node) &&
      [ts.SyntaxKind.AsteriskAsteriskToken, ts.SyntaxKind.AsteriskAsteriskEqualsToken].includes(node.operatorToken.kind)
    ) {
      powers.push(lineOf(node));
    }
    ts.forEachChild(node, walk);
  };
  walk(tree);
  return {
    path: file,
    text,
    lines: text.split('\n').length - (text.endsWith('\n') ? 1 : 0),
    imports,
    globals: uses.filter((use) => !declared.has(use.name)),
    mathUses,
    powers,
  };
}

/** What an import leads to: a file of the project (without its ending), a folder of shared/ by its door, or a package. */
export type Target =
  | { readonly kind: 'file'; readonly path: string }
  | { readonly kind: 'door'; readonly folder: string }
  | { readonly kind: 'package'; readonly name: string };

export function targetOf(from: string, specifier: string): Target {
  const bare = specifier.replace(/\?.*$/, '');
  const door = /^#shared\/(.+)$/.exec(bare);
  if (door !== null) return { kind: 'door', folder: door[1]! };
  if (bare.startsWith('.')) {
    const joined = path.posix.join(path.posix.dirname(from), bare);
    return { kind: 'file', path: joined.replace(/\.(tsx?|mjs|js)$/, '') };
  }
  const [scope, name] = bare.split('/');
  return { kind: 'package', name: bare.startsWith('@') ? `${scope}/${name}` : (scope ?? bare) };
}
