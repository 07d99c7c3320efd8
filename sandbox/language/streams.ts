import ts from "typescript";

/**
 * Which stream of luck a call draws from: the tokens of its innermost statement without nested
 * blocks and function bodies, and how many equal statements stand above it (rules 26 and 27).
 */
export interface Stream {
  /** Three words of 32 bits, from the statement's tokens and its count. */
  readonly key: readonly [number, number, number];
}

/** Whether a node is a statement of its own as far as luck goes: so is the body of a short arrow. */
function isOwnStatement(node: ts.Node): boolean {
  if (ts.isBlock(node)) return false;
  if (ts.isStatement(node) || ts.isPropertyDeclaration(node) || ts.isCaseOrDefaultClause(node)) return true;
  return ts.isArrowFunction(node.parent) && node.parent.body === node;
}

/** The innermost statement around a node; the file when there is none. */
export function statementOf(node: ts.Node): ts.Node {
  let at = node;
  while (!ts.isSourceFile(at) && !isOwnStatement(at)) at = at.parent;
  return at;
}

/** Parts of a statement that are statements or bodies themselves. */
function isNested(node: ts.Node, statement: ts.Node): boolean {
  if (node === statement) return false;
  return ts.isBlock(node) || ts.isCaseBlock(node) || ts.isClassElement(node) || isOwnStatement(node);
}

const COMMENT = /\/\*[^]*?\*\/|\/\/[^\n]*/g;
const SPACE = /\s+/g;

/**
 * The tokens of a statement, joined by single spaces. `script` is the text without types (same
 * positions), so that a type added to a line does not change its luck.
 */
function tokensOf(statement: ts.Node, file: ts.SourceFile, script: string): string {
  const pieces: string[] = [];
  const gap = (from: number, to: number): void => {
    // Between two nodes stand signs and key words only, so a comment can not be inside a text.
    const signs = script.slice(from, to).replace(COMMENT, " ").replace(SPACE, " ").trim();
    if (signs !== "") pieces.push(signs);
  };
  const read = (node: ts.Node): void => {
    if (isNested(node, statement)) return;
    let at = node.getStart(file);
    let isLeaf = true;
    ts.forEachChild(node, (child) => {
      isLeaf = false;
      gap(at, child.getStart(file));
      read(child);
      at = child.end;
    });
    if (isLeaf) {
      const text = script.slice(node.getStart(file), node.end);
      if (text.trim() !== "") pieces.push(text);
    } else gap(at, node.end);
  };
  read(statement);
  return pieces.join(" ").replace(/\s*;$/, "");
}

/** 32 bits of a text: FNV-1a over its UTF-16 units, then the finish of MurmurHash3, from a start value. */
function hash32(text: string, start: number): number {
  let hash = start;
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    hash = Math.imul(hash ^ (unit & 0xff), 0x01_00_01_93);
    hash = Math.imul(hash ^ (unit >>> 8), 0x01_00_01_93);
  }
  hash = Math.imul(hash ^ (hash >>> 16), 0x85_eb_ca_6b);
  hash = Math.imul(hash ^ (hash >>> 13), 0xc2_b2_ae_35);
  return (hash ^ (hash >>> 16)) >>> 0;
}

/** Hands out the streams of a script; asked for in any order, counted top to bottom. */
export class StreamTable {
  readonly streams: Stream[] = [];
  readonly #indexOf = new Map<ts.Node, number>();

  constructor(file: ts.SourceFile, script: string, statements: ReadonlySet<ts.Node>) {
    const counts = new Map<string, number>();
    const ordered = [...statements].sort((a, b) => a.pos - b.pos || b.end - a.end);
    for (const statement of ordered) {
      const tokens = tokensOf(statement, file, script);
      const count = (counts.get(tokens) ?? 0) + 1;
      counts.set(tokens, count);
      const text = `${count} ${tokens}`;
      this.#indexOf.set(statement, this.streams.length);
      this.streams.push({
        key: [hash32(text, 0x81_1c_9d_c5), hash32(text, 0x9e_37_79_b9), hash32(text, 0x7f_4a_7c_15)],
      });
    }
  }

  /** Index of the stream of a statement that the table was made with; 0 for any other. */
  indexOf(statement: ts.Node): number {
    return this.#indexOf.get(statement) ?? 0;
  }
}
