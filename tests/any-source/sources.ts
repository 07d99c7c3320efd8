import fc from "fast-check";
import type { NameTable } from "../../sandbox/language/names.ts";
import { drawProgram } from "../golden/grammar.ts";

/**
 * Source texts of every kind, for the property that no text makes the pipeline throw. Half of a pair,
 * control signs and marks for the direction of writing are characters like any other.
 */

const ODD = [
  "\u0000",
  "\u0007",
  "\u001b",
  "\u200b",
  "\u202e",
  "\u2028",
  "\ufeff",
  "\ud800",
  "\udfff",
  "\uffff",
  "😀",
  "é",
  "e\u0301",
];
const PIECES = [
  ..."(){}[]<>;,.:?!=+-*/%&|^~@#$\\'\"`",
  ..."\n\r\t ",
  "=>",
  "${",
  "/*",
  "*/",
  "//",
  "<!--",
  "square",
  ".all",
  ".on()",
  ".fadeTo(50, 2)",
  "wait(1)",
  "song",
  "for (const x of ",
  "function f(",
  "class A {",
  "const a = ",
  "let ",
  "if (",
  "else ",
  "return ",
  "0x",
  "1e999",
  "0n",
  "08",
  "async ",
  "await ",
  "yield ",
  "import ",
  "export ",
  "enum ",
  "as any",
  "$$",
];

/** Any characters, or pieces of programs in any order. */
export const randomText: fc.Arbitrary<string> = fc.oneof(
  fc.string({ unit: "binary", maxLength: 200 }),
  fc
    .array(fc.oneof(fc.constantFrom(...PIECES), fc.constantFrom(...ODD), fc.string({ maxLength: 4 })), {
      maxLength: 80,
    })
    .map((parts) => parts.join("")),
);

type Change = readonly [
  kind: "delete" | "double" | "swap" | "noise" | "cut",
  at: number,
  length: number,
  noise: string,
];

const change: fc.Arbitrary<Change> = fc.tuple(
  fc.constantFrom("delete", "double", "swap", "noise", "cut"),
  fc.double({ min: 0, max: 1, noNaN: true }),
  fc.nat({ max: 12 }),
  fc.oneof(fc.constantFrom(...PIECES), fc.constantFrom(...ODD)),
);

/** A text after one slip. */
function slip(text: string, [kind, share, length, noise]: Change): string {
  const at = Math.floor(share * text.length);
  const [before, here, after] = [text.slice(0, at), text.slice(at, at + length), text.slice(at + length)];
  if (kind === "delete") return before + after;
  if (kind === "double") return before + here + here + after;
  if (kind === "swap") return before + after.slice(0, length) + here + after.slice(length);
  if (kind === "cut") return before;
  return before + noise + here + after;
}

/** Real scripts after one to six slips. */
export const slippedScript = (scripts: readonly string[]): fc.Arbitrary<string> =>
  fc
    .tuple(fc.constantFrom(...scripts), fc.array(change, { minLength: 1, maxLength: 6 }))
    .map(([script, changes]) => changes.reduce(slip, script));

/** Right programs that the grammar draws. */
export const drawnProgram = (names: NameTable): fc.Arbitrary<string> =>
  fc.infiniteStream(fc.nat()).map((stream) => drawProgram((below) => (stream.next().value ?? 0) % below, names));
