import type { WordEntry } from "../../../../sandbox/language/reference/index.ts";

/** What completion shows and puts in. */
export type Shape = Pick<WordEntry, "word" | "usage" | "meaning" | "snippet">;

const shape = (word: string, usage: string, meaning: string, snippet: string): Shape => ({
  word,
  usage,
  meaning,
  snippet,
});

/** Shapes of code that beginners use again and again: the language's own idioms. */
export const CODE_SHAPES: readonly Shape[] = [
  shape(
    "for of",
    "for (const front of square.fronts)",
    "Does it for each of a list.",
    "for (const ${front} of ${square.fronts}) {\n\t${}\n}",
  ),
  shape(
    "for count",
    "for (let turn = 0; turn < 4; turn += 1)",
    "Does it a number of times.",
    "for (let ${turn} = 0; ${turn} < ${4}; ${turn} += 1) {\n\t${}\n}",
  ),
  shape("if", "if (test)", "Does it only when the test is true.", "if (${test}) {\n\t${}\n}"),
  shape("function", "function name()", "Gives steps a name.", "function ${name}(${}) {\n\t${}\n}"),
  shape("const", "const name = value;", "Gives a value a name.", "const ${name} = ${value};"),
  shape("let", "let name = value;", "A name whose value may change.", "let ${name} = ${value};"),
  shape(
    "one after the other",
    "for (…) { front.pulse(1); wait(0.5); }",
    "Light runs along a side.",
    'for (const front of square.side("${north}")) {\n\tfront.pulse(${1});\n\twait(${0.5});\n}',
  ),
  shape(
    "on the drums",
    'at(song.hits("drums"), …)',
    "Flashes with each hit of an instrument.",
    'at(song.hits("${drums}"), () => {\n\t${square.all.pulse(1);}\n});',
  ),
  shape(
    "in each bar",
    "at(song.bars, …)",
    "Does it in every bar.",
    "at(song.bars, () => {\n\t${square.all.pulse(1);}\n});",
  ),
  shape(
    "breathe",
    "fadeTo(90, 2); wait(2); fadeTo(20, 2);",
    "Lights swell and sink.",
    "square.all.fadeTo(${90}, ${2});\nwait(${2});\nsquare.all.fadeTo(${20}, ${2});\nwait(${2});",
  ),
];
