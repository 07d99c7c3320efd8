import ts from "typescript";
import { near } from "../near-name.ts";
import { NAME_PARAMETERS, type NameKind } from "../words.ts";
import type { DialectCheck } from "./report.ts";

const HEX = /^#[0-9a-fA-F]{6}$/;
const MAX_OFFERED = 4;

const CODES = {
  front: "unknown-front",
  side: "unknown-side",
  part: "unknown-part",
  section: "unknown-section",
  instrument: "unknown-instrument",
  colour: "unknown-colour",
} as const satisfies { readonly [K in NameKind]: string };

/** Names in quotes, checked before the script runs: also in a line that is never reached. */
export const checkNames: DialectCheck = (node, { names, ownFields, report }) => {
  if (names === null || !ts.isCallExpression(node) || !ts.isPropertyAccessExpression(node.expression)) return;
  const word = node.expression.name.text;
  const parameter = Object.hasOwn(NAME_PARAMETERS, word) && !ownFields.has(word) ? NAME_PARAMETERS[word] : undefined;
  const argument = parameter === undefined ? undefined : node.arguments[parameter.argument];
  if (parameter === undefined || argument === undefined || !ts.isStringLiteralLike(argument)) return;
  const known = names[parameter.kind];
  const name = argument.text;
  if (known.includes(name) || (parameter.kind === "colour" && HEX.test(name))) return;
  const meant = near(name, known);
  const code = CODES[parameter.kind];
  if (meant === null) return report(code, argument, { name, names: known.slice(0, MAX_OFFERED).join(", ") });
  report(
    code,
    argument,
    { name, meant },
    { node: argument, at: "instead", text: JSON.stringify(meant), label: `Write "${meant}"` },
  );
};
