import ts from "typescript";
import type { DialectCheck } from "./report.ts";

function hasModifier(node: ts.Node, kind: ts.SyntaxKind): ts.Node | undefined {
  return ts.canHaveModifiers(node) ? ts.getModifiers(node)?.find((modifier) => modifier.kind === kind) : undefined;
}

/** `this` belongs to the nearest function that is no arrow: in a class or an object's method it has a meaning. */
function isThisInClass(node: ts.Node): boolean {
  for (let at = node.parent; at !== undefined; at = at.parent) {
    if (ts.isClassLike(at)) return true;
    if (ts.isMethodDeclaration(at) && ts.isObjectLiteralExpression(at.parent)) return true;
    if (ts.isFunctionDeclaration(at) || ts.isFunctionExpression(at)) return false;
  }
  return false;
}

/** `const level;`: only the head of a `for..of` gives a `const` its value in another way. */
function isBareConst(node: ts.VariableDeclaration): boolean {
  const list = node.parent;
  if (!ts.isVariableDeclarationList(list) || ts.isForOfStatement(list.parent) || ts.isForInStatement(list.parent))
    return false;
  return (list.flags & ts.NodeFlags.BlockScoped) === ts.NodeFlags.Const;
}

/** A comma between two expressions that is not the head of a `for`. */
function isStrayComma(node: ts.Node): boolean {
  if (!ts.isBinaryExpression(node) || node.operatorToken.kind !== ts.SyntaxKind.CommaToken) return false;
  let top: ts.Node = node;
  while (ts.isBinaryExpression(top.parent) && top.parent.operatorToken.kind === ts.SyntaxKind.CommaToken)
    top = top.parent;
  return !(ts.isForStatement(top.parent) && (top.parent.incrementor === top || top.parent.initializer === top));
}

/** TypeScript that scripts do without, each with what to use. */
export const checkForbidden: DialectCheck = (node, { file, report }) => {
  switch (node.kind) {
    case ts.SyntaxKind.ImportDeclaration:
    case ts.SyntaxKind.ImportEqualsDeclaration:
      return report("no-import", node, { word: "import" });
    case ts.SyntaxKind.ExportDeclaration:
    case ts.SyntaxKind.ExportAssignment:
    case ts.SyntaxKind.NamespaceExportDeclaration:
      return report("no-import", node, { word: "export" });
    case ts.SyntaxKind.ImportKeyword:
    case ts.SyntaxKind.MetaProperty:
      return report("no-import", node, { word: node.getText(file).split(".")[0] ?? "import" });
    case ts.SyntaxKind.AwaitExpression:
      return report("no-async", node);
    case ts.SyntaxKind.YieldExpression:
      return report("no-generator", node);
    case ts.SyntaxKind.EnumDeclaration:
      return report("no-enum", node);
    case ts.SyntaxKind.ModuleDeclaration:
      return report("no-namespace", node, { word: node.getText(file).split(/\s/)[0] ?? "namespace" });
    case ts.SyntaxKind.Decorator:
      return report("no-decorator", node);
    case ts.SyntaxKind.WithStatement:
      return report("no-with", node);
    case ts.SyntaxKind.ForInStatement:
      return report("no-for-in", node);
    case ts.SyntaxKind.TryStatement:
      return report("no-try", node, { word: "try" });
    case ts.SyntaxKind.LabeledStatement:
      return report("no-label", node);
    case ts.SyntaxKind.GetAccessor:
      return report("no-accessor", node, { word: "get" });
    case ts.SyntaxKind.SetAccessor:
      return report("no-accessor", node, { word: "set" });
    case ts.SyntaxKind.BigIntLiteral:
      return report("no-bigint", node);
    case ts.SyntaxKind.AnyKeyword:
      return report("no-any", node);
    case ts.SyntaxKind.DeleteExpression:
      return report("no-delete", node);
    case ts.SyntaxKind.TaggedTemplateExpression:
      return report("no-tag", node);
    case ts.SyntaxKind.TypeAssertionExpression:
      return report("no-cast", node);
    case ts.SyntaxKind.DebuggerStatement:
      return report("not-here", node, { word: "debugger", try: "Use `console.log`." });
    case ts.SyntaxKind.ThisKeyword:
      return isThisInClass(node) || ts.isTypeNode(node.parent) ? undefined : report("no-this", node);
    case ts.SyntaxKind.ClassStaticBlockDeclaration:
      return report("not-here", node, { word: "static", try: "Set the value where you name it." });
    default:
      return checkShapes(node, { file, report });
  }
};

function checkShapes(node: ts.Node, { report }: Pick<Parameters<DialectCheck>[1], "file" | "report">): void {
  const exported = hasModifier(node, ts.SyntaxKind.ExportKeyword);
  if (exported !== undefined) return report("no-import", exported, { word: "export" });
  const declared = hasModifier(node, ts.SyntaxKind.DeclareKeyword);
  if (declared !== undefined) return report("not-here", declared, { word: "declare", try: "Take it out." });
  const asynchronous = hasModifier(node, ts.SyntaxKind.AsyncKeyword);
  if (asynchronous !== undefined) return report("no-async", asynchronous);
  if (ts.isFunctionLike(node) && (node as ts.FunctionDeclaration).asteriskToken !== undefined)
    return report("no-generator", node);
  if (ts.isForOfStatement(node) && node.awaitModifier !== undefined) return report("no-async", node.awaitModifier);
  if (ts.isParameter(node) && ts.isParameterPropertyDeclaration(node, node.parent))
    return report("not-here", node, {
      word: node.modifiers?.[0]?.getText() ?? "public",
      try: "Name the field in the class.",
    });
  if (ts.isVariableDeclarationList(node)) return checkDeclarationList(node, report);
  if (ts.isVariableDeclaration(node) && node.initializer === undefined && isBareConst(node))
    return report("const-without-value", node, { name: node.name.getText() });
  if (isStrayComma(node)) return report("no-comma", node);
}

function checkDeclarationList(node: ts.VariableDeclarationList, report: Parameters<DialectCheck>[1]["report"]): void {
  const blockScoped = node.flags & ts.NodeFlags.BlockScoped;
  if (blockScoped === 0)
    return report(
      "no-var",
      node.parent,
      {},
      { node: node.getFirstToken() ?? node, at: "instead", text: "let", label: "Write `let`" },
    );
  if (blockScoped !== ts.NodeFlags.Let && blockScoped !== ts.NodeFlags.Const)
    report("no-using", node.parent, { word: "using" });
}
