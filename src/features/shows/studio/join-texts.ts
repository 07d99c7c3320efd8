/** Lines (from 1) of a text that the other text has nowhere. */
export function listOwnLines(text: string, other: string): number[] {
  const known = new Set(other.split("\n").map((line) => line.trim()));
  return text.split("\n").flatMap((line, index) => (line.trim() !== "" && !known.has(line.trim()) ? [index + 1] : []));
}

/** One script that holds both: mine, then the lines that only the other has, as comments. */
export function joinTexts(mine: string, theirs: string): string {
  const lines = theirs.split("\n");
  const own = listOwnLines(theirs, mine).map((number) => `// ${lines[number - 1] ?? ""}`);
  return own.length === 0 ? mine : `${mine.trimEnd()}\n\n// Only in the other version:\n${own.join("\n")}\n`;
}
