import type { Extension } from "@codemirror/state";
import { EditorView, keymap } from "@codemirror/view";
import type { Span } from "../../../../sandbox/language/assist.ts";
import type { LanguageClient } from "./language-client.ts";

/** Asks for the new name of something in the script; gives null when it is let be. */
export type AskName = (request: {
  readonly name: string;
  /** Why a name does not do, as a sentence; null when it does. */
  readonly findFault: (name: string) => Promise<string | null>;
}) => Promise<string | null>;

/** F12 or a click with Ctrl leads to where a name was made; F2 renames it everywhere; Shift Alt F lays the script out. */
export function languageKeys(client: LanguageClient, askName: AskName): Extension {
  const goTo = (view: EditorView, at: number) => void goToDefinition(client, view, at);
  return [
    keymap.of([
      { key: "F12", run: (view) => (goTo(view, view.state.selection.main.head), true), preventDefault: true },
      { key: "F2", run: (view) => (void rename(client, view, askName), true), preventDefault: true },
      { key: "Shift-Alt-f", run: (view) => (void layOut(client, view), true), preventDefault: true },
    ]),
    EditorView.domEventHandlers({
      mousedown(event, view) {
        if (!event.ctrlKey && !event.metaKey) return false;
        const at = view.posAtCoords({ x: event.clientX, y: event.clientY });
        if (at === null) return false;
        goTo(view, at);
        event.preventDefault();
        return true;
      },
    }),
  ];
}

async function goToDefinition(client: LanguageClient, view: EditorView, at: number): Promise<void> {
  const found = await client.ask("findDefinition", view.state.doc.toString(), at);
  if (!found) return;
  if ("wordId" in found) {
    window.open(`/words#${found.wordId}`, "_blank", "noopener");
    return;
  }
  view.dispatch({
    selection: { anchor: found.from, head: found.to },
    scrollIntoView: true,
    userEvent: "select.definition",
  });
  view.focus();
}

async function rename(client: LanguageClient, view: EditorView, askName: AskName): Promise<void> {
  const { doc, selection } = view.state;
  const text = doc.toString();
  const places = (await client.ask("listRenamePlaces", text, selection.main.head)) ?? [];
  const [first] = places;
  if (!first) return;
  const name = doc.sliceString(first.from, first.to);
  const wanted = await askName({
    name,
    findFault: (next) => client.ask("findNameFault", text, next),
  });
  view.focus();
  // The script may have changed while the name was asked for: then nothing is sure any more.
  if (wanted === null || wanted === name || !view.state.doc.eq(doc)) return;
  view.dispatch({ changes: places.map(({ from, to }) => ({ from, to, insert: wanted })), userEvent: "input.rename" });
}

/** Lays the script out in one undo step; the cursor stays with its text. */
export async function layOut(client: LanguageClient, view: EditorView): Promise<void> {
  const { doc } = view.state;
  const changes = (await client.ask("listLayoutChanges", doc.toString())) ?? [];
  if (changes.length === 0 || !view.state.doc.eq(doc)) return;
  view.dispatch({
    changes: changes.map(({ from, to, text }: Span & { readonly text: string }) => ({ from, to, insert: text })),
    userEvent: "input.layout",
  });
}
