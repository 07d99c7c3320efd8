import { acceptCompletion, closeBrackets, closeBracketsKeymap, completionKeymap } from "@codemirror/autocomplete";
import { defaultKeymap, history, historyKeymap, indentWithTab } from "@codemirror/commands";
import { javascript } from "@codemirror/lang-javascript";
import { bracketMatching, indentOnInput, indentUnit, syntaxHighlighting } from "@codemirror/language";
import { highlightSelectionMatches, search, searchKeymap } from "@codemirror/search";
import { Annotation, EditorState, Prec, type Extension } from "@codemirror/state";
import {
  drawSelection,
  EditorView,
  highlightActiveLine,
  highlightActiveLineGutter,
  keymap,
  lineNumbers,
} from "@codemirror/view";
import type { Problem } from "../../../../sandbox/engine/model.ts";
import { adoptEditorStyles } from "./adopt-styles.ts";
import { completeScript } from "./completion.ts";
import { LanguageClient } from "./language-client.ts";
import { type AskName, languageKeys, layOut } from "./language-keys.ts";
import { languageNotes } from "./language-notes.ts";
import { languageTooltips } from "./language-tooltips.ts";
import "./editor.css";
import { createGlowLines, type GlowLines } from "./glow-lines.ts";
import { nounMarks } from "./noun-marks.ts";
import { problemNotes, showProblem } from "./problem-note.ts";
import { type ScriptNames, toNameTable } from "./script-names.ts";
import { syntaxClasses } from "./syntax-classes.ts";

export interface ScriptEditorOptions {
  readonly parent: HTMLElement;
  readonly source: string;
  readonly names: ScriptNames;
  /** Id of the text that says how to leave the editor by keyboard. */
  readonly hintId: string;
  readonly onChange: (source: string) => void;
  readonly onRun: () => void;
  readonly onSave: () => void;
  readonly askName: AskName;
}

/** Marks changes that the program made, so that they are not taken for the author's typing. */
const fromOutside = Annotation.define<true>();

/** The script editor. One instance a studio; React only holds its element. `dispose` at the end. */
export class ScriptEditor {
  readonly #view: EditorView;
  readonly #glow: GlowLines = createGlowLines();
  readonly #language: LanguageClient;
  #names: ScriptNames;

  constructor(options: ScriptEditorOptions) {
    adoptEditorStyles();
    this.#names = options.names;
    this.#language = new LanguageClient(toNameTable(options.names));
    this.#view = new EditorView({
      parent: options.parent,
      state: EditorState.create({
        doc: options.source,
        extensions: [this.#createKeys(options), this.#createExtensions(options)],
      }),
    });
  }

  get source(): string {
    return this.#view.state.doc.toString();
  }

  /** Replaces the whole script (another version was chosen); undo brings the old one back. */
  replace(source: string): void {
    if (source === this.source) return;
    this.#view.dispatch({
      changes: { from: 0, to: this.#view.state.doc.length, insert: source },
      annotations: fromOutside.of(true),
    });
  }

  setNames(names: ScriptNames): void {
    this.#names = names;
    this.#language.setNames(toNameTable(names));
  }

  /** Lays the script out by the rules of the language; one undo step. */
  layOut(): Promise<void> {
    return layOut(this.#language, this.#view);
  }

  setProblem(problem: Problem | null): void {
    showProblem(this.#view, problem);
  }

  /** The lines that lit something in the run on stage get a bead in the margin. */
  setActLines(lines: readonly number[]): void {
    this.#glow.setLines(this.#view, lines);
  }

  /** How strongly each line lights the square now; cheap enough for every frame. */
  setGlow(byLine: ArrayLike<number>): void {
    this.#glow.book.set(byLine);
  }

  /** Puts text in at the cursor, on a line of its own, and the cursor behind it. */
  insert(text: string): void {
    const { state } = this.#view;
    const { head } = state.selection.main;
    const line = state.doc.lineAt(head);
    const isBlank = line.text.trim() === "";
    const from = isBlank ? head : line.to;
    const indent = /^\s*/.exec(line.text)?.[0] ?? "";
    const insert = isBlank ? text : `\n${indent}${text}`;
    this.#view.dispatch({
      changes: { from, insert },
      selection: { anchor: from + insert.length },
      scrollIntoView: true,
      userEvent: "input",
    });
    this.focus();
  }

  /** Brings a line (from 1) to the middle and puts the cursor there. */
  goToLine(line: number): void {
    const { doc } = this.#view.state;
    const { from } = doc.line(Math.min(Math.max(1, line), doc.lines));
    this.#view.dispatch({ selection: { anchor: from }, effects: EditorView.scrollIntoView(from, { y: "center" }) });
    this.focus();
  }

  focus(): void {
    this.#view.focus();
  }

  dispose(): void {
    this.#language.dispose();
    this.#view.destroy();
  }

  #createKeys({ onRun, onSave }: ScriptEditorOptions): Extension {
    const own = [
      { key: "Mod-Enter", run: () => (onRun(), true) },
      { key: "Mod-s", run: () => (onSave(), true) },
      { key: "Tab", run: acceptCompletion },
    ];
    // Escape, then Tab leaves the editor: CodeMirror lets the next Tab through for two seconds.
    return [
      Prec.high(keymap.of(own)),
      keymap.of([
        ...closeBracketsKeymap,
        ...completionKeymap,
        ...searchKeymap,
        ...historyKeymap,
        ...defaultKeymap,
        indentWithTab,
      ]),
    ];
  }

  #createExtensions({ hintId, onChange, askName }: ScriptEditorOptions): Extension {
    return [
      lineNumbers(),
      this.#glow.extension,
      history(),
      drawSelection(),
      indentUnit.of("  "),
      EditorState.tabSize.of(2),
      indentOnInput(),
      bracketMatching(),
      closeBrackets(),
      highlightActiveLine(),
      highlightActiveLineGutter(),
      highlightSelectionMatches(),
      search({ top: true }),
      javascript({ typescript: true }),
      syntaxHighlighting(syntaxClasses),
      nounMarks,
      completeScript(() => this.#names, this.#language),
      languageNotes(this.#language),
      languageTooltips(this.#language),
      languageKeys(this.#language, askName),
      problemNotes,
      EditorView.lineWrapping,
      EditorView.contentAttributes.of({
        "aria-label": "Script",
        "aria-describedby": hintId,
        // It takes the focus anyway; checkers of accessibility look for the attribute.
        tabindex: "0",
        autocapitalize: "off",
        autocorrect: "off",
        spellcheck: "false",
      }),
      EditorView.updateListener.of((update) => {
        if (update.docChanged && !update.transactions.some((transaction) => transaction.annotation(fromOutside)))
          onChange(update.state.doc.toString());
      }),
    ];
  }
}
