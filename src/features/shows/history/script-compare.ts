import { defaultKeymap, history, historyKeymap } from "@codemirror/commands";
import { javascript } from "@codemirror/lang-javascript";
import { syntaxHighlighting } from "@codemirror/language";
import { getChunks, goToNextChunk, goToPreviousChunk, MergeView, unifiedMergeView } from "@codemirror/merge";
import { EditorState, type Extension } from "@codemirror/state";
import { EditorView, keymap, lineNumbers } from "@codemirror/view";
import { adoptEditorStyles } from "../editor/adopt-styles.ts";
import { nounMarks } from "../editor/noun-marks.ts";
import { syntaxClasses } from "../editor/syntax-classes.ts";

/** A text with its name: "Version 2", "Mine". */
export interface ComparedText {
  readonly name: string;
  readonly source: string;
}

export interface ScriptCompareOptions {
  readonly parent: HTMLElement;
  readonly earlier: ComparedText;
  readonly later: ComparedText;
  /** True: the later text can be changed, and places of the earlier one taken over. */
  readonly isMerge: boolean;
  /** One text under the other, for narrow windows; else side by side. */
  readonly isStacked: boolean;
  /** The later text and in how many places it differs; at the start and after every change. */
  readonly onChange: (source: string, places: number) => void;
}

/** Lines left in sight around a difference; longer stretches that are the same are folded. */
const FOLDED = { margin: 2, minSize: 6 };

/** Two scripts and where they differ. `dispose` at the end. */
export class ScriptCompare {
  readonly #views: readonly EditorView[];
  readonly #dispose: () => void;

  constructor(options: ScriptCompareOptions) {
    adoptEditorStyles();
    const { views, dispose } = options.isStacked ? createStacked(options) : createSideBySide(options);
    this.#views = views;
    this.#dispose = dispose;
  }

  /** Puts the cursor on the next place that differs, or the one before, and brings it into view. */
  goToPlace(step: 1 | -1): void {
    const view = this.#views.at(-1);
    if (!view) return;
    (step > 0 ? goToNextChunk : goToPreviousChunk)(view);
    view.focus();
  }

  dispose(): void {
    this.#dispose();
  }
}

interface Made {
  readonly views: readonly EditorView[];
  readonly dispose: () => void;
}

function createSideBySide({ parent, earlier, later, isMerge, onChange }: ScriptCompareOptions): Made {
  const merge = new MergeView({
    parent,
    a: { doc: earlier.source, extensions: createExtensions(earlier.name, false) },
    b: { doc: later.source, extensions: [createExtensions(later.name, isMerge), report(onChange)] },
    collapseUnchanged: FOLDED,
    ...(isMerge && {
      revertControls: "a-to-b" as const,
      renderRevertControl: () => createTaker("Take this place over"),
    }),
  });
  onChange(later.source, merge.chunks.length);
  return { views: [merge.a, merge.b], dispose: () => merge.destroy() };
}

function createStacked({ parent, earlier, later, isMerge, onChange }: ScriptCompareOptions): Made {
  const view = new EditorView({
    parent,
    state: EditorState.create({
      doc: later.source,
      extensions: [
        createExtensions(later.name, isMerge),
        unifiedMergeView({
          original: earlier.source,
          collapseUnchanged: FOLDED,
          mergeControls: isMerge && createChooser,
        }),
        report(onChange),
      ],
    }),
  });
  onChange(later.source, getChunks(view.state)?.chunks.length ?? 0);
  return { views: [view], dispose: () => view.destroy() };
}

function createExtensions(name: string, isEditable: boolean): Extension {
  return [
    lineNumbers(),
    javascript({ typescript: true }),
    syntaxHighlighting(syntaxClasses),
    nounMarks,
    EditorView.lineWrapping,
    EditorView.contentAttributes.of({
      "aria-label": name,
      tabindex: "0",
      autocapitalize: "off",
      autocorrect: "off",
      spellcheck: "false",
      ...(!isEditable && { "aria-readonly": "true" }),
    }),
    isEditable ? [history(), keymap.of([...historyKeymap, ...defaultKeymap])] : EditorState.readOnly.of(true),
  ];
}

/** The chunks are worked out after the change that an update tells of, so they are read one turn later. */
function report(onChange: ScriptCompareOptions["onChange"]): Extension {
  return EditorView.updateListener.of(({ docChanged, view }) => {
    if (!docChanged) return;
    queueMicrotask(() => onChange(view.state.doc.toString(), getChunks(view.state)?.chunks.length ?? 0));
  });
}

function createTaker(label: string): HTMLElement {
  const button = document.createElement("button");
  button.type = "button";
  button.className = "compare-take";
  button.title = label;
  button.setAttribute("aria-label", label);
  button.textContent = "→";
  return button;
}

function createChooser(type: "accept" | "reject", act: (event: MouseEvent) => void): HTMLElement {
  const button = document.createElement("button");
  button.type = "button";
  button.className = "compare-choose";
  button.textContent = type === "accept" ? "Keep mine" : "Take the other";
  button.addEventListener("click", act);
  return button;
}
