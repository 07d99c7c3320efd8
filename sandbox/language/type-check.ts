import ts from "typescript";
import { buildDeclarations, LIBRARY_DECLARATIONS } from "./declarations/index.ts";
import type { NameTable } from "./names.ts";

/** File names that the type checker sees; none of them exists. */
export const SCRIPT_FILE = "/script.ts";
export const WORDS_FILE = "/words.d.ts";
const LIBRARY_FILE = "/library.d.ts";

/** How strict the checker is with a 12-year-old: it knows `undefined`, and asks for no annotations. */
const OPTIONS: ts.CompilerOptions = {
  target: ts.ScriptTarget.ES2022,
  module: ts.ModuleKind.ESNext,
  noLib: true,
  types: [],
  strict: false,
  strictNullChecks: true,
  strictFunctionTypes: false,
  strictBindCallApply: false,
  // On, so that `const list = []` takes the kind of what is put in; what it says itself is left out (`type-notes.ts`).
  noImplicitAny: true,
  noUncheckedIndexedAccess: false,
  noImplicitThis: false,
  alwaysStrict: true,
  useUnknownInCatchVariables: false,
  allowUnreachableCode: true,
  allowUnusedLabels: true,
  // A script is one piece; without this the checker would take its names for global ones of all files.
  moduleDetection: ts.ModuleDetectionKind.Force,
  newLine: ts.NewLineKind.LineFeed,
};

/** The type checker on one script. Set its text, then ask the service about `SCRIPT_FILE`. */
export interface ScriptService {
  readonly service: ts.LanguageService;
  /** The text that is checked. */
  readonly text: string;
  setText(text: string): void;
}

/** A type checker that knows the language, and the names of a layout and a song. Costs a second at its first question. */
export function createScriptService(names: NameTable): ScriptService {
  const fixed = new Map([
    [LIBRARY_FILE, ts.ScriptSnapshot.fromString(LIBRARY_DECLARATIONS)],
    [WORDS_FILE, ts.ScriptSnapshot.fromString(buildDeclarations(names))],
  ]);
  let text = "";
  let version = 0;
  let snapshot = ts.ScriptSnapshot.fromString(text);
  const isKnown = (file: string) => file === SCRIPT_FILE || fixed.has(file);
  const service = ts.createLanguageService({
    getCompilationSettings: () => OPTIONS,
    getScriptFileNames: () => [...fixed.keys(), SCRIPT_FILE],
    getScriptVersion: (file) => (file === SCRIPT_FILE ? String(version) : "1"),
    getScriptSnapshot: (file) => (file === SCRIPT_FILE ? snapshot : fixed.get(file)),
    getCurrentDirectory: () => "/",
    getDefaultLibFileName: () => LIBRARY_FILE,
    fileExists: isKnown,
    readFile: () => undefined,
    readDirectory: () => [],
    directoryExists: () => false,
    getDirectories: () => [],
  });
  return {
    service,
    get text() {
      return text;
    },
    setText(next) {
      if (next === text) return;
      text = next;
      snapshot = ts.ScriptSnapshot.fromString(next);
      version += 1;
    },
  };
}
