import { StateEffect, StateField, type Extension } from "@codemirror/state";
import {
  EditorView,
  hoverTooltip,
  keymap,
  showTooltip,
  ViewPlugin,
  type Tooltip,
  type ViewUpdate,
} from "@codemirror/view";
import type { Hover, Signature } from "../../../../sandbox/language/assist.ts";
import type { LanguageClient } from "./language-client.ts";

/** Time for a hand to pass over a word. */
const HOVER_MS = 350;
/** Time after the last key before the call around the cursor is looked up. */
const PAUSE_MS = 120;

const setInfo = StateEffect.define<Tooltip | null>();

/** The one tooltip that belongs to the cursor: a call being written, or a word that was asked about by key. */
const infoTooltip = StateField.define<Tooltip | null>({
  create: () => null,
  update(shown, transaction) {
    for (const effect of transaction.effects) if (effect.is(setInfo)) return effect.value;
    return shown && transaction.docChanged ? { ...shown, pos: transaction.changes.mapPos(shown.pos) } : shown;
  },
  provide: (field) => showTooltip.from(field),
});

/** Words explain themselves: on hover, by F1 at the cursor, and while a call is written. Escape closes. */
export function languageTooltips(client: LanguageClient): Extension {
  return [
    infoTooltip,
    hoverTooltip(
      async (view, pos) => {
        const hover = await client.ask("findHover", view.state.doc.toString(), pos);
        return hover && { pos: hover.from, end: hover.to, above: true, create: () => ({ dom: renderHover(hover) }) };
      },
      { hoverTime: HOVER_MS },
    ),
    keymap.of([
      { key: "F1", run: (view) => (void showHoverAt(client, view), true), preventDefault: true },
      { key: "Escape", run: closeInfo },
    ]),
    EditorView.domEventHandlers({
      // A dialog or another part of the page has the word now.
      blur: (_, view) => void closeInfo(view),
    }),
    ViewPlugin.define((view) => new CallWatch(client, view)),
  ];
}

async function showHoverAt(client: LanguageClient, view: EditorView): Promise<void> {
  const { head } = view.state.selection.main;
  const hover = await client.ask("findHover", view.state.doc.toString(), head);
  const tooltip = hover && { pos: hover.from, above: true, create: () => ({ dom: renderHover(hover, "status") }) };
  view.dispatch({ effects: setInfo.of(tooltip) });
}

function closeInfo(view: EditorView): boolean {
  if (!view.state.field(infoTooltip)) return false;
  view.dispatch({ effects: setInfo.of(null) });
  // The key goes on to whoever else closes something with it.
  return false;
}

/** Follows the cursor; inside the brackets of a call it shows what the call takes. */
class CallWatch {
  readonly #client: LanguageClient;
  readonly #view: EditorView;
  #timer: ReturnType<typeof setTimeout> | undefined;

  constructor(client: LanguageClient, view: EditorView) {
    this.#client = client;
    this.#view = view;
  }

  update(update: ViewUpdate): void {
    if (!update.docChanged && !update.selectionSet) return;
    clearTimeout(this.#timer);
    const isTyping = update.transactions.some(
      (transaction) => transaction.isUserEvent("input") || transaction.isUserEvent("delete"),
    );
    const isOpen = update.state.field(infoTooltip) !== null;
    if (isTyping || isOpen) this.#timer = setTimeout(() => void this.#look(), PAUSE_MS);
  }

  destroy(): void {
    clearTimeout(this.#timer);
  }

  async #look(): Promise<void> {
    const { state } = this.#view;
    const { head } = state.selection.main;
    const signature = await this.#client.ask("findSignature", state.doc.toString(), head);
    if (this.#view.state !== state && !this.#view.state.doc.eq(state.doc)) return;
    const tooltip = signature && { pos: head, above: true, create: () => ({ dom: renderSignature(signature) }) };
    if (tooltip ?? this.#view.state.field(infoTooltip)) this.#view.dispatch({ effects: setInfo.of(tooltip) });
  }
}

function renderHover({ title, meaning, wordId }: Hover, role?: string): HTMLElement {
  const box = createBox(role);
  const code = document.createElement("code");
  code.textContent = title;
  box.append(code);
  if (meaning !== null) appendText(box, "p", meaning);
  if (wordId !== null) {
    const link = document.createElement("a");
    link.href = `/words#${wordId}`;
    link.target = "_blank";
    link.rel = "noopener";
    link.textContent = "An example";
    box.append(link);
  }
  return box;
}

function renderSignature({ label, parameters, active, meaning }: Signature): HTMLElement {
  const box = createBox("status");
  const code = document.createElement("code");
  const here = parameters[active];
  if (here) {
    const marked = document.createElement("strong");
    marked.textContent = label.slice(here.from, here.to);
    code.append(label.slice(0, here.from), marked, label.slice(here.to));
  } else code.textContent = label;
  box.append(code);
  if (meaning !== null) appendText(box, "p", meaning);
  return box;
}

function createBox(role?: string): HTMLElement {
  const box = document.createElement("div");
  box.className = "script-tip";
  if (role !== undefined) box.setAttribute("role", role);
  return box;
}

function appendText(parent: HTMLElement, tag: string, text: string): void {
  const element = document.createElement(tag);
  element.textContent = text;
  parent.append(element);
}
