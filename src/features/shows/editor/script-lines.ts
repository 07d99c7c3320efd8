import { typescriptLanguage } from "@codemirror/lang-javascript";
import { highlightCode } from "@lezer/highlight";
import { isOurNoun } from "./noun-marks.ts";
import { syntaxClasses } from "./syntax-classes.ts";

/** A piece of a line with the classes of its token; `className` is empty for plain text. */
export interface TextPiece {
  readonly text: string;
  readonly className: string;
}

/** A script cut into lines of coloured pieces, for reading. */
export function listScriptLines(source: string): TextPiece[][] {
  const lines: TextPiece[][] = [[]];
  highlightCode(
    source,
    typescriptLanguage.parser.parse(source),
    syntaxClasses,
    (text, className) => lines.at(-1)?.push({ text, className: className || (isOurNoun(text) ? "syn-object" : "") }),
    () => lines.push([]),
  );
  return lines;
}
