import ts from "typescript";

const LIGHTS: ReadonlySet<string> = new Set(["Group", "Lights", "Fronts"]);
const OWN: Readonly<Record<string, string>> = {
  Front: "a front",
  Square: "the square",
  Song: "the song",
  Section: "a section",
  Note: "a note",
};
const LISTS: ReadonlySet<string> = new Set(["Array", "ReadonlyArray", "ArrayLike"]);
const LONGEST = 24;

/** A type in the words of the language: "a number", "the text "gold"", "lights", "steps to run". */
export function nameKind(checker: ts.TypeChecker, type: ts.Type): string {
  if (type.isStringLiteral()) return type.value.length <= LONGEST ? `the text "${type.value}"` : "a text";
  if (type.isNumberLiteral()) return String(type.value);
  if (type.flags & ts.TypeFlags.NumberLike) return "a number";
  if (type.flags & ts.TypeFlags.StringLike) return "a text";
  if (type.flags & ts.TypeFlags.BooleanLike) return "`true` or `false`";
  if (type.flags & (ts.TypeFlags.Undefined | ts.TypeFlags.Void | ts.TypeFlags.Null)) return "nothing";
  const name = type.symbol?.name ?? type.aliasSymbol?.name ?? "";
  if (LIGHTS.has(name)) return "lights";
  const own = OWN[name];
  if (own !== undefined) return own;
  if (LISTS.has(name) || checker.isTupleType(type)) return "a list";
  if (type.getCallSignatures().length > 0) return "steps to run";
  if (type.isUnion()) return nameUnion(checker, type);
  return `\`${checker.typeToString(type)}\``;
}

/** Kinds of a union, each once: "a number or a list" reads better than the compiler's bars. */
function nameUnion(checker: ts.TypeChecker, type: ts.UnionType): string {
  const kinds = new Set(
    type.types.map((one) => {
      // Names of fronts and the like, and any other text.
      const isText = one.flags & (ts.TypeFlags.StringLike | ts.TypeFlags.Intersection);
      return isText ? "a text" : nameKind(checker, one);
    }),
  );
  // What is surely wanted first, that there may be nothing last.
  return [...kinds].sort((a, b) => Number(a === "nothing") - Number(b === "nothing")).join(" or ");
}

/** As `nameKind`, for what a place takes: that a thing may be left out is not said. */
export function nameWantedKind(checker: ts.TypeChecker, type: ts.Type): string {
  return nameKind(checker, checker.getNonNullableType(type));
}
