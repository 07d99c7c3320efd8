import * as Comlink from "comlink";
import { finishRun } from "../../sandbox/engine/finish.ts";
import type { GuestTables, GuestWork } from "../../sandbox/engine/guest.ts";
import type { Problem, RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { type PreparedRun, prepareRun } from "../../sandbox/engine/prepare.ts";
import type { RuntimeResult } from "../../sandbox/engine/runtime.ts";
import { buildTables } from "../../sandbox/engine/tables.ts";
import * as assist from "../../sandbox/language/assist.ts";
import type { NameTable } from "../../sandbox/language/names.ts";
import { createScriptService, type ScriptService } from "../../sandbox/language/type-check.ts";
import { listTypeNotes } from "../../sandbox/language/type-notes.ts";
import { describeShow, type ShowDescription } from "../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { ribbonCells, type RibbonCells, type RibbonSize } from "../../sandbox/timeline/ribbon.ts";
import { hashHost } from "./browser-hash.ts";

/** All that reads scripts, and the compiler with it: one file for two workers, one of which runs scripts and one of which helps the editor. */

/** What does not change from one run of a show to the next. */
export type RunSetting = Pick<RunInput, "layout" | "song" | "songId">;

/** What the engine is to run, or the outcome of a script that it can not run. */
export type PrepareAnswer = { readonly work: GuestWork } | { readonly outcome: RunOutcome };

let setting: RunSetting | null = null;
/** The run that waits for its result. The page runs one at a time; a newer one takes its place. */
let waiting: { readonly input: RunInput; readonly prepared: PreparedRun } | null = null;

/** The steps of a run before and after the engine, and what is made of a timeline. */
const runs = {
  /** Takes the square and the song of the runs that follow, and gives the tables that the engine is to open with. */
  open: (next: RunSetting): GuestTables => {
    setting = next;
    return buildTables(next.layout, next.song);
  },
  /** Checks and marks a script. Throws before `open`. */
  prepare: (source: string, seed: number): PrepareAnswer => {
    if (!setting) throw new Error("A run needs a square and a song.");
    const input = { ...setting, source, seed };
    const prepared = prepareRun(input);
    if (!prepared.ok) return { outcome: prepared };
    waiting = { input, prepared };
    return { work: prepared.work };
  },
  /** The outcome of the script that was prepared last. Throws when none was. */
  finish: (result: RuntimeResult): Promise<RunOutcome> => {
    if (!waiting) throw new Error("No run waits for its result.");
    return finishRun(hashHost, waiting.input, waiting.prepared.compiled, result);
  },
  /** The ribbon of a timeline. A call of its own, after the answer of the run: the lights come first. */
  drawRibbon: (timeline: Timeline, layout: RunInput["layout"], size: RibbonSize): RibbonCells =>
    ribbonCells(timeline, layout, size),
  /** A show in words. */
  describe: (timeline: Timeline, { layout, song }: Pick<RunSetting, "layout" | "song">): ShowDescription =>
    describeShow(timeline, layout, song),
};

let checker: { readonly key: string; readonly script: ScriptService } | null = null;

/** The checker for these names with this text; made anew only when the names change. */
function withText(names: NameTable, text: string): ScriptService {
  const key = JSON.stringify(names);
  if (checker?.key !== key) checker = { key, script: createScriptService(names) };
  checker.script.setText(text);
  return checker.script;
}

/** What an editor asks of the type checker. Every question brings the text: the answer is about that, and no other. */
const questions = {
  listNotes: (names: NameTable, text: string): readonly Problem[] => listTypeNotes(withText(names, text), names),
  findHover: (names: NameTable, text: string, at: number) => assist.findHover(withText(names, text), at),
  listOffers: (names: NameTable, text: string, at: number) => assist.listOffers(withText(names, text), at),
  findSignature: (names: NameTable, text: string, at: number) => assist.findSignature(withText(names, text), at),
  findDefinition: (names: NameTable, text: string, at: number) => assist.findDefinition(withText(names, text), at),
  listRenamePlaces: (names: NameTable, text: string, at: number) => assist.listRenamePlaces(withText(names, text), at),
  findNameFault: (names: NameTable, text: string, name: string) => assist.findNameFault(withText(names, text), name),
  listLayoutChanges: (names: NameTable, text: string) => assist.listLayoutChanges(withText(names, text)),
};

/** What a page calls of the worker beside the engine. */
export type ScriptWorker = typeof runs;
/** What a page calls of a worker that helps the editor. */
export type LanguageWorker = typeof questions;

Comlink.expose({ ...runs, ...questions });
