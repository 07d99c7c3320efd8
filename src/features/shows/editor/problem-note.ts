import { StateEffect, StateField, type EditorState, type Extension, type Text } from "@codemirror/state";
import { Decoration, EditorView, keymap, WidgetType, type DecorationSet } from "@codemirror/view";
import type { Problem, SourceRange } from "../../../../sandbox/engine/model.ts";
import { appendWords } from "./append-words.ts";

const setProblem = StateEffect.define<Problem | null>();

/** The problem under its line: what is wrong, what to try, and a button where the fix is certain. */
class ProblemWidget extends WidgetType {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super();
    this.problem = problem;
  }

  override eq(other: WidgetType): boolean {
    return other instanceof ProblemWidget && other.problem === this.problem;
  }

  override toDOM(view: EditorView): HTMLElement {
    const { sentence, hint, fix } = this.problem;
    const note = document.createElement("div");
    note.className = "problem-note";
    note.setAttribute("role", "note");
    note.setAttribute("aria-label", `Problem in line ${this.problem.range.line}`);
    const mark = document.createElement("span");
    mark.className = "problem-note-mark";
    mark.setAttribute("aria-hidden", "true");
    mark.textContent = "!";
    const words = document.createElement("p");
    appendWords(words, sentence);
    if (!fix && hint !== "") {
      words.append(" ");
      appendWords(words, hint);
    }
    note.append(mark, words);
    if (fix) note.append(createFixButton(view, fix.label));
    return note;
  }

  override ignoreEvent(): boolean {
    return true;
  }
}

function createFixButton(view: EditorView, label: string): HTMLButtonElement {
  const button = document.createElement("button");
  button.type = "button";
  button.className = "problem-note-fix";
  appendWords(button, label);
  button.addEventListener("click", () => {
    applyFix(view);
    view.focus();
  });
  return button;
}

interface ShownProblem {
  readonly problem: Problem | null;
  readonly decorations: DecorationSet;
}

const shownProblem = StateField.define<ShownProblem>({
  create: () => ({ problem: null, decorations: Decoration.none }),
  update(shown, transaction) {
    for (const effect of transaction.effects)
      if (effect.is(setProblem))
        return { problem: effect.value, decorations: decorate(transaction.state, effect.value) };
    return transaction.docChanged ? { ...shown, decorations: shown.decorations.map(transaction.changes) } : shown;
  },
  provide: (field) => EditorView.decorations.from(field, (shown) => shown.decorations),
});

function decorate(state: EditorState, problem: Problem | null): DecorationSet {
  if (!problem) return Decoration.none;
  const { from, to } = toOffsets(state.doc, problem.range);
  const below = state.doc.lineAt(from).to;
  const note = Decoration.widget({ widget: new ProblemWidget(problem), block: true, side: 1 }).range(below);
  if (to <= from) return Decoration.set([note]);
  return Decoration.set([Decoration.mark({ class: "problem-mark" }).range(from, to), note], true);
}

/** Offsets of a range whose lines and columns count from 1; beyond the text it is cut off. */
export function toOffsets(text: Text, range: SourceRange): { from: number; to: number } {
  const offset = (line: number, column: number) => {
    const found = text.line(Math.min(Math.max(line, 1), text.lines));
    return Math.min(found.to, found.from + Math.max(0, column - 1));
  };
  const from = offset(range.line, range.column);
  return { from, to: Math.max(from, offset(range.endLine, range.endColumn)) };
}

/** Puts the certain fix of the shown problem into the script. Gives back whether there was one. */
function applyFix(view: EditorView): boolean {
  const fix = view.state.field(shownProblem).problem?.fix;
  if (!fix) return false;
  const { from, to } = toOffsets(view.state.doc, fix.range);
  view.dispatch({
    changes: { from, to, insert: fix.text },
    selection: { anchor: from + fix.text.length },
    effects: setProblem.of(null),
    userEvent: "input.fix",
  });
  return true;
}

/** Shows problems under their lines; Alt-Enter and Ctrl-. take the fix. */
export const problemNotes: Extension = [
  shownProblem,
  keymap.of([
    { key: "Alt-Enter", run: applyFix },
    { key: "Mod-.", run: applyFix },
  ]),
];

/** Shows one problem, or none. */
export function showProblem(view: EditorView, problem: Problem | null): void {
  view.dispatch({ effects: setProblem.of(problem) });
}
