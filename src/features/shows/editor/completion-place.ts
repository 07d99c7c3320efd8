import { NAME_PARAMETERS, type NameKind } from "../../../../sandbox/language/words.ts";

/** What may stand at the end of a text that is being typed. `from` is where it starts in that text. */
export type CompletionPlace =
  | { readonly kind: "name"; readonly names: NameKind; readonly from: number }
  | { readonly kind: "member"; readonly of: "square" | "song" | "section" | "lights"; readonly from: number }
  | { readonly kind: "word"; readonly from: number };

/**
 * Looks at the script up to the cursor and tells what fits there, or null inside comments, other
 * texts and after things whose members are not ours (a number, `Math`).
 */
export function findCompletionPlace(before: string): CompletionPlace | null {
  const lineStart = before.lastIndexOf("\n") + 1;
  const line = before.slice(lineStart);
  if (isInComment(line)) return null;
  const open = findOpenText(line);
  if (open !== null) return findNamePlace(line.slice(0, open), lineStart + open + 1);
  const member = /\.\s*([A-Za-z]\w*)?$/.exec(line);
  if (member) return findMemberPlace(before, line.slice(0, member.index), before.length - (member[1]?.length ?? 0));
  const word = /[A-Za-z]\w*$/.exec(line);
  return word ? { kind: "word", from: lineStart + word.index } : null;
}

function isInComment(line: string): boolean {
  const slashes = line.indexOf("//");
  return slashes >= 0 && findOpenText(line.slice(0, slashes)) === null;
}

/** Where a text that is still open begins on the line, or null. */
function findOpenText(line: string): number | null {
  let open: number | null = null;
  for (let i = 0; i < line.length; i += 1) {
    const letter = line[i] ?? "";
    if (open !== null && letter === "\\") i += 1;
    else if (open !== null && letter === line[open]) open = null;
    else if (open === null && /["'`]/.test(letter)) open = i;
  }
  return open;
}

/** Inside a text: it is a name when it is that argument of a word that takes one. */
function findNamePlace(beforeText: string, from: number): CompletionPlace | null {
  const call = /([A-Za-z]+)\s*\(([^()]*)$/.exec(beforeText);
  const word = call?.[1];
  if (!call || !word) return null;
  const parameter = NAME_PARAMETERS[word];
  const argument = (call[2] ?? "").split(",").length - 1;
  return parameter?.argument === argument ? { kind: "name", names: parameter.kind, from } : null;
}

function findMemberPlace(script: string, owner: string, from: number): CompletionPlace | null {
  const trimmed = owner.trimEnd();
  if (/(^|[^\w.])\d+$/.test(trimmed) || trimmed === "") return null;
  const name = /([A-Za-z_]\w*)$/.exec(trimmed)?.[1];
  if (name === "square" || name === "song") return { kind: "member", of: name, from };
  if (name && /^(Math|console|JSON|Object|Array|Number|String)$/.test(name)) return null;
  if (/\.\s*(section\s*\([^()]*\)|sections\s*\[[^\]]*\])$/.test(trimmed))
    return { kind: "member", of: "section", from };
  if (name && isSection(script, name)) return { kind: "member", of: "section", from };
  return { kind: "member", of: "lights", from };
}

/** Whether the script gave a section this name: `const chorus = song.section(...)`, `for (const part of song.sections)`. */
function isSection(script: string, name: string): boolean {
  return new RegExp(`\\b${name}\\s*(=\\s*song\\s*\\.\\s*section\\s*\\(|of\\s+song\\s*\\.\\s*sections\\b)`).test(script);
}
