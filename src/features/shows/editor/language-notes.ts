import { type Diagnostic, lintKeymap, linter } from "@codemirror/lint";
import type { Extension } from "@codemirror/state";
import { keymap } from "@codemirror/view";
import type { Problem } from "../../../../sandbox/engine/model.ts";
import { appendWords } from "./append-words.ts";
import type { LanguageClient } from "./language-client.ts";
import { toOffsets } from "./problem-note.ts";

/** A pause in the typing of this length asks the checker: after the script has run, which comes first. */
const PAUSE_MS = 900;

/** The checker starts this long after the editor: what is needed to run the script is loaded first. */
const FIRST_MS = 4000;

/** What the type checker notices is underlined; the words come on hover, by F8 one after the other, in a list by Ctrl Shift M. */
export function languageNotes(client: LanguageClient): Extension {
  const opened = performance.now();
  return [
    linter(
      async (view) => {
        const early = opened + FIRST_MS - performance.now();
        if (early > 0) await new Promise((resolve) => setTimeout(resolve, early));
        const { doc } = view.state;
        const notes = (await client.ask("listNotes", doc.toString())) ?? [];
        return notes.map((note): Diagnostic => ({
          ...toOffsets(doc, note.range),
          severity: "info",
          message: `${note.sentence} ${note.hint}`,
          renderMessage: () => renderNote(note),
        }));
      },
      { delay: PAUSE_MS },
    ),
    keymap.of(lintKeymap),
  ];
}

function renderNote({ sentence, hint, details }: Problem): HTMLElement {
  const note = document.createElement("div");
  note.className = "script-tip";
  const words = document.createElement("p");
  appendWords(words, `${sentence} ${hint}`);
  note.append(words);
  if (details !== undefined) {
    const more = document.createElement("details");
    const summary = document.createElement("summary");
    summary.textContent = "Details";
    more.append(summary, details);
    note.append(more);
  }
  return note;
}
