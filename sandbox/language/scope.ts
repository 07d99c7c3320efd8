import ts from "typescript";

/** How a name was made. */
export type DeclarationKind = "let" | "const" | "var" | "function" | "class" | "parameter" | "type" | "other";

export interface Declaration {
  readonly name: string;
  readonly kind: DeclarationKind;
  readonly identifier: ts.Identifier;
  /** The node in which the name is known: a block, loop, function or the file. */
  readonly scope: ts.Node;
  /** What it is made with: the initialiser, the function or the class. */
  readonly value: ts.Node | undefined;
}

/** The names of a script and where each is known. */
export interface Scopes {
  readonly declarations: readonly Declaration[];
  /** The declaration that a name stands for at a node, or null. */
  resolve(name: string, at: ts.Node): Declaration | null;
  /** Declarations of a name anywhere in the script. */
  named(name: string): readonly Declaration[];
}

function isScope(node: ts.Node): boolean {
  return (
    ts.isSourceFile(node) ||
    ts.isBlock(node) ||
    ts.isCaseBlock(node) ||
    ts.isForStatement(node) ||
    ts.isForOfStatement(node) ||
    ts.isForInStatement(node) ||
    ts.isFunctionLike(node) ||
    ts.isClassLike(node) ||
    ts.isCatchClause(node)
  );
}

function scopeOf(node: ts.Node): ts.Node {
  let scope: ts.Node = node;
  while (!isScope(scope) && scope.parent !== undefined) scope = scope.parent;
  return scope;
}

function functionScopeOf(node: ts.Node): ts.Node {
  let scope: ts.Node = node;
  while (!ts.isSourceFile(scope) && !ts.isFunctionLike(scope)) scope = scope.parent;
  return scope;
}

/** Lists every name that the script makes. The tree needs its parents set. */
export function readScopes(file: ts.SourceFile): Scopes {
  const declarations: Declaration[] = [];
  const byName = new Map<string, Declaration[]>();

  const add = (identifier: ts.Identifier, kind: DeclarationKind, scope: ts.Node, value: ts.Node | undefined): void => {
    const declaration = { name: identifier.text, kind, identifier, scope, value };
    declarations.push(declaration);
    const same = byName.get(identifier.text);
    if (same === undefined) byName.set(identifier.text, [declaration]);
    else same.push(declaration);
  };

  const addBinding = (
    name: ts.BindingName,
    kind: DeclarationKind,
    scope: ts.Node,
    value: ts.Node | undefined,
  ): void => {
    if (ts.isIdentifier(name)) return add(name, kind, scope, value);
    for (const element of name.elements)
      if (ts.isBindingElement(element)) addBinding(element.name, kind, scope, undefined);
  };

  const visit = (node: ts.Node): void => {
    if (ts.isVariableDeclaration(node) && ts.isVariableDeclarationList(node.parent)) {
      const flags = node.parent.flags & ts.NodeFlags.BlockScoped;
      const kind = flags === ts.NodeFlags.Let ? "let" : flags === 0 ? "var" : "const";
      addBinding(node.name, kind, kind === "var" ? functionScopeOf(node) : scopeOf(node.parent), node.initializer);
    } else if (ts.isParameter(node)) addBinding(node.name, "parameter", scopeOf(node.parent), undefined);
    else if (ts.isFunctionDeclaration(node) && node.name !== undefined)
      add(node.name, "function", scopeOf(node.parent), node);
    else if (ts.isFunctionExpression(node) && node.name !== undefined) add(node.name, "other", node, node);
    else if (ts.isClassDeclaration(node) && node.name !== undefined)
      add(node.name, "class", scopeOf(node.parent), node);
    else if (ts.isClassExpression(node) && node.name !== undefined) add(node.name, "other", node, node);
    else if (ts.isTypeAliasDeclaration(node) || ts.isInterfaceDeclaration(node))
      add(node.name, "type", scopeOf(node.parent), undefined);
    else if (ts.isTypeParameterDeclaration(node)) add(node.name, "type", scopeOf(node.parent), undefined);
    ts.forEachChild(node, visit);
  };
  visit(file);

  return {
    declarations,
    named: (name) => byName.get(name) ?? [],
    resolve: (name, at) => {
      const candidates = byName.get(name);
      if (candidates === undefined) return null;
      for (let node: ts.Node | undefined = at; node !== undefined; node = node.parent) {
        const found = candidates.find((candidate) => candidate.scope === node && candidate.kind !== "type");
        if (found !== undefined) return found;
      }
      return null;
    },
  };
}

/** Whether an identifier is read or written as a variable here: not a property, key, label, type or its own making. */
export function isVariableUse(node: ts.Identifier): boolean {
  const { parent } = node;
  if (parent === undefined) return false;
  if (ts.isPropertyAccessExpression(parent)) return parent.expression === node;
  if (ts.isPropertyAssignment(parent)) return parent.initializer === node;
  if (ts.isShorthandPropertyAssignment(parent)) return true;
  if (ts.isBindingElement(parent)) return parent.initializer === node;
  if (ts.isVariableDeclaration(parent) || ts.isParameter(parent)) return parent.initializer === node;
  if (ts.isFunctionLike(parent)) return (parent as ts.ArrowFunction).body === node;
  if (ts.isPropertyDeclaration(parent)) return parent.initializer === node;
  if (ts.isEnumMember(parent)) return parent.initializer === node;
  if (ts.isClassLike(parent) || ts.isInterfaceDeclaration(parent) || ts.isTypeAliasDeclaration(parent)) return false;
  if (ts.isLabeledStatement(parent) || ts.isBreakOrContinueStatement(parent)) return false;
  if (ts.isExpressionWithTypeArguments(parent))
    return ts.isHeritageClause(parent.parent) && ts.isClassLike(parent.parent.parent);
  if (ts.isTypeNode(parent) || ts.isTypeParameterDeclaration(parent) || ts.isTypeElement(parent)) return false;
  if (ts.isQualifiedName(parent) || ts.isModuleDeclaration(parent) || ts.isEnumDeclaration(parent)) return false;
  return (
    !ts.isImportSpecifier(parent) &&
    !ts.isImportClause(parent) &&
    !ts.isExportSpecifier(parent) &&
    !ts.isNamespaceImport(parent) &&
    !ts.isMetaProperty(parent)
  );
}
