/** A class list as it is pasted: one name a line. */
export interface NameLines {
  /** Names in order, ready to send. */
  readonly names: readonly string[];
  /** Every line that cannot be taken, by its number in the text. */
  readonly problems: readonly { readonly line: number; readonly text: string; readonly reason: string }[];
}

const MAX_LENGTH = 40;
/** One request takes so many, by the contract. */
export const MAX_NAMES = 40;

/** Reads pasted names. Numbers before a name and empty lines are left out; `known` are the names already in the class. */
export function parseNameLines(text: string, known: readonly string[]): NameLines {
  const taken = new Map(known.map((name) => [fold(name), "is in the class already"]));
  const names: string[] = [];
  const problems: { line: number; text: string; reason: string }[] = [];
  text.split(/\r\n|\r|\n/).forEach((raw, index) => {
    const name = raw
      .replace(/^\s*\d+[.)\t ]\s*/, "")
      .replace(/\s+/g, " ")
      .trim();
    if (name === "") return;
    const line = index + 1;
    const add = (reason: string) => problems.push({ line, text: name, reason });
    const twice = taken.get(fold(name));
    if (name.length > MAX_LENGTH) add(`is too long: ${name.length} characters, ${MAX_LENGTH} are the most`);
    else if (!/\p{L}/u.test(name)) add("has no letter");
    else if (/\p{Cc}/u.test(name)) add("has characters that can not be shown");
    else if (name.includes("@")) add("looks like an e-mail address; students need none");
    else if (twice) add(twice);
    else {
      taken.set(fold(name), `is on line ${line} already`);
      names.push(name);
    }
  });
  return { names, problems };
}

const fold = (name: string) => name.trim().toLowerCase();
