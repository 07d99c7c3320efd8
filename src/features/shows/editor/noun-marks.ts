import { syntaxTree } from "@codemirror/language";
import {
  Decoration,
  MatchDecorator,
  ViewPlugin,
  type DecorationSet,
  type EditorView,
  type ViewUpdate,
} from "@codemirror/view";

/** Whether a name is one of the two nouns of the language; they stand out in every script. */
export function isOurNoun(text: string): boolean {
  return text === "square" || text === "song";
}

const noun = Decoration.mark({ class: "syn-object" });
const finder = new MatchDecorator({
  regexp: /\b(?:square|song)\b/g,
  decorate: (add, from, to, _match, view) => {
    if (syntaxTree(view.state).resolveInner(from, 1).name === "VariableName") add(from, to, noun);
  },
});

/** Marks `square` and `song`, but not in comments and texts. */
export const nounMarks = ViewPlugin.fromClass(
  class {
    decorations: DecorationSet;
    constructor(view: EditorView) {
      this.decorations = finder.createDeco(view);
    }
    update(update: ViewUpdate) {
      const isParsed = syntaxTree(update.startState) !== syntaxTree(update.state);
      this.decorations = isParsed ? finder.createDeco(update.view) : finder.updateDeco(update, this.decorations);
    }
  },
  { decorations: (plugin) => plugin.decorations },
);
