import * as Comlink from "comlink";
import type { Problem } from "../../sandbox/engine/model.ts";
import * as assist from "../../sandbox/language/assist.ts";
import type { NameTable } from "../../sandbox/language/names.ts";
import { createScriptService, type ScriptService } from "../../sandbox/language/type-check.ts";
import { listTypeNotes } from "../../sandbox/language/type-notes.ts";

let open: { readonly key: string; readonly script: ScriptService } | null = null;

/** The checker for these names with this text; made anew only when the names change. */
function withText(names: NameTable, text: string): ScriptService {
  const key = JSON.stringify(names);
  if (open?.key !== key) open = { key, script: createScriptService(names) };
  open.script.setText(text);
  return open.script;
}

/** What an editor asks of the type checker. Every question brings the text: the answer is about that, and no other. */
const languageWorker = {
  listNotes: (names: NameTable, text: string): readonly Problem[] => listTypeNotes(withText(names, text), names),
  findHover: (names: NameTable, text: string, at: number) => assist.findHover(withText(names, text), at),
  listOffers: (names: NameTable, text: string, at: number) => assist.listOffers(withText(names, text), at),
  findSignature: (names: NameTable, text: string, at: number) => assist.findSignature(withText(names, text), at),
  findDefinition: (names: NameTable, text: string, at: number) => assist.findDefinition(withText(names, text), at),
  listRenamePlaces: (names: NameTable, text: string, at: number) => assist.listRenamePlaces(withText(names, text), at),
  findNameFault: (names: NameTable, text: string, name: string) => assist.findNameFault(withText(names, text), name),
  listLayoutChanges: (names: NameTable, text: string) => assist.listLayoutChanges(withText(names, text)),
};

export type LanguageWorker = typeof languageWorker;

Comlink.expose(languageWorker);
