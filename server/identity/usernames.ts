/** Longest username that the contract takes, less room for a number. */
const LONGEST = 26;

/**
 * A username for a display name that none of `taken` has: first name, a dot and the first letter of
 * the last name, in small letters without marks ("Ada Quill" is `ada.q`), with a number when taken.
 * A name in letters that have no small Latin form becomes `student`.
 */
export function makeUsername(displayName: string, taken: ReadonlySet<string>): string {
  const words = displayName
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .split(/[^a-z0-9]+/)
    .filter((word) => word !== "");
  const first = words[0]?.replace(/^[0-9]+/, "") ?? "";
  const initial = words.length > 1 ? (words.at(-1)?.[0] ?? "") : "";
  const base = (first.length < 2 ? "student" : first).slice(0, LONGEST - 2) + (initial === "" ? "" : `.${initial}`);
  let name = base;
  for (let number = 2; taken.has(name); number++) name = `${base}${number}`;
  return name;
}
