import ts from "typescript";
import { near } from "../near-name.ts";
import { ACT_WORDS, LIGHTS_MEMBERS, SONG_MEMBERS, SQUARE_MEMBERS } from "../words.ts";
import type { DialectCheck, DialectContext } from "./report.ts";

/** What lists, texts, numbers, maps and the like of TypeScript can do; a name from here is nobody's slip. */
const TYPESCRIPT_MEMBERS: ReadonlySet<string> = new Set(
  (
    "length at concat copyWithin entries every fill filter find findIndex findLast findLastIndex flat flatMap forEach includes indexOf join keys lastIndexOf map pop push reduce reduceRight reverse shift slice some sort splice toReversed toSorted toSpliced unshift values with " +
    "charAt charCodeAt codePointAt endsWith localeCompare match matchAll normalize padEnd padStart repeat replace replaceAll search split startsWith substring toLowerCase toUpperCase trim trimEnd trimStart " +
    "toFixed toPrecision toString valueOf clear delete get has set size add union intersection difference exec test source flags lastIndex index groups input " +
    "name message stack call apply bind prototype constructor description raw isArray from of fromEntries assign freeze parse stringify log " +
    "abs acos asin atan atan2 cbrt ceil cos exp floor hypot log10 log2 log1p max min pow random round sign sin sqrt tan trunc clz32 fround imul cosh sinh tanh expm1 acosh asinh atanh PI E LN2 LN10 LOG2E LOG10E SQRT2 SQRT1_2 " +
    "isInteger isFinite isNaN isSafeInteger parseFloat parseInt MAX_SAFE_INTEGER MIN_SAFE_INTEGER MAX_VALUE MIN_VALUE EPSILON POSITIVE_INFINITY NEGATIVE_INFINITY fromCharCode fromCodePoint hasOwn groupBy"
  ).split(" "),
);

/** Words of the language that hang on something. */
const LANGUAGE_MEMBERS: ReadonlySet<string> = new Set<string>([
  ...LIGHTS_MEMBERS,
  "color",
  ...SQUARE_MEMBERS,
  ...SONG_MEMBERS,
  "beats",
  "pitch",
]);

/** What people ask lights for. */
const READINGS: ReadonlySet<string> = new Set([
  "level",
  "brightness",
  "isOn",
  "isLit",
  "isOff",
  "value",
  "state",
  "getLevel",
  "getColour",
  "getColor",
  "currentLevel",
]);

const WAITS: ReadonlySet<string> = new Set(["wait", "waitUntil", "sleep", "delay"]);

/** `x.wait(2)`, `x.level`, `x.turnOn()`: what nothing in the language can do. */
export const checkMembers: DialectCheck = (node, context) => {
  if (!ts.isPropertyAccessExpression(node) || node.questionDotToken !== undefined) return;
  if (node.expression.kind === ts.SyntaxKind.ThisKeyword || node.expression.kind === ts.SyntaxKind.SuperKeyword) return;
  const name = node.name.text;
  if (context.ownFields.has(name)) return;
  const called = ts.isCallExpression(node.parent) && node.parent.expression === node;
  if (WAITS.has(name) && called) return reportWait(node, context);
  if (READINGS.has(name)) return context.report("no-reading", node, { name: name === "level" ? "level" : "value" });
  const owner = ownerMembers(node.expression, context);
  if (owner !== null) {
    if (!owner.members.includes(name)) reportSkill(node, owner.name, owner.members, context);
    return;
  }
  if (TYPESCRIPT_MEMBERS.has(name) || LANGUAGE_MEMBERS.has(name)) return;
  reportSkill(node, "Lights", LIGHTS_MEMBERS, context);
};

function reportWait(node: ts.PropertyAccessExpression, { file, report }: DialectContext): void {
  const call = node.parent as ts.CallExpression;
  const values = call.arguments.map((argument) => argument.getText(file)).join(", ");
  report("wait-alone", node.name, { name: node.name.text === "waitUntil" ? "waitUntil" : "wait", arguments: values });
}

interface OwnerMembers {
  readonly name: string;
  readonly members: readonly string[];
}

/** What a thing can do whose kind the text shows: `square`, `song`, and lights that came straight from them. */
function ownerMembers(owner: ts.Expression, context: DialectContext): OwnerMembers | null {
  if (ts.isIdentifier(owner)) {
    if (context.scopes.resolve(owner.text, owner) !== null) return null;
    if (owner.text === "square") return { name: "The square", members: SQUARE_MEMBERS };
    if (owner.text === "song") return { name: "The song", members: SONG_MEMBERS };
    return null;
  }
  return isLights(owner) ? { name: "Lights", members: [...LIGHTS_MEMBERS, "color"] } : null;
}

const GIVES_LIGHTS: ReadonlySet<string> = new Set(["front", "side", "parts"]);
const KEEPS_LIGHTS: ReadonlySet<string> = new Set<string>([
  ...ACT_WORDS,
  "color",
  "first",
  "everyNth",
  "reversed",
  "shuffled",
  "and",
  "except",
  "inTurn",
  "part",
]);

function isSquare(node: ts.Expression): boolean {
  return ts.isIdentifier(node) && node.text === "square";
}

function isLights(node: ts.Expression): boolean {
  if (ts.isPropertyAccessExpression(node))
    return isSquare(node.expression) && (node.name.text === "all" || node.name.text === "fronts");
  if (!ts.isCallExpression(node) || !ts.isPropertyAccessExpression(node.expression)) return false;
  const { expression, name } = node.expression;
  if (isSquare(expression)) return GIVES_LIGHTS.has(name.text);
  return KEEPS_LIGHTS.has(name.text) && isLights(expression);
}

function reportSkill(
  node: ts.PropertyAccessExpression,
  owner: string,
  members: readonly string[],
  { report }: DialectContext,
): void {
  const name = node.name.text;
  const meant = near(name, members);
  const skills =
    owner === "Lights"
      ? ACT_WORDS.map((word) => `\`${word}\``).join(", ")
      : members.map((word) => `\`${word}\``).join(", ");
  if (meant === null) return report("unknown-skill", node.name, { owner, name, skills });
  report(
    "unknown-skill",
    node.name,
    { owner, name, meant, skills },
    { node: node.name, at: "instead", text: meant, label: `Write \`${meant}\`` },
  );
}
