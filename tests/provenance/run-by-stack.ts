import vm from "node:vm";
import tsBlankSpace from "ts-blank-space";
import ts from "typescript";
import { decodeTimelineBuffer } from "../../sandbox/engine/decode.ts";
import { LIBRARY } from "../../sandbox/engine/library.generated.ts";
import type { RunInput } from "../../sandbox/engine/model.ts";
import { buildTables, listNames } from "../../sandbox/engine/tables.ts";
import { compileScript } from "../../sandbox/language/compile.ts";
import type { Site } from "../../sandbox/language/mark.ts";
import { GLOBAL_WORDS } from "../../sandbox/language/words.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";

/**
 * A second opinion on who wrote each cue: the script without any marks, on the same library, in the
 * engine of Node, whose stack traces say which lines call which. Nothing of the marking transform runs;
 * its table of places serves only to deal the luck of each statement.
 */

const FILE = "show.js";
const LINES_BEFORE = 1;
const KEEP_GLOBAL_OPEN =
  "{ const { freeze } = Object; Object.freeze = (value) => (value === globalThis ? value : freeze(value)); }";

interface Place {
  readonly line: number;
  readonly column: number;
}

/** Where Node's stack says a call is: at the name of what is called, at the word `new`. */
function placeOfCall(file: ts.SourceFile, node: ts.CallExpression | ts.NewExpression): Place {
  const { expression } = node;
  const named = ts.isPropertyAccessExpression(expression) ? expression.name : expression;
  const { line, character } = file.getLineAndCharacterOfPosition(
    (ts.isNewExpression(node) ? node : named).getStart(file),
  );
  return { line: line + 1, column: character + 1 };
}

const keyOf = ({ line, column }: Place): string => `${line}:${column}`;

function indexSites(file: ts.SourceFile, sites: readonly Site[]): Map<string, number> {
  const found = new Map<string, number>();
  sites.forEach(({ node }, index) => {
    if (ts.isCallExpression(node) || ts.isNewExpression(node)) found.set(keyOf(placeOfCall(file, node)), index);
  });
  return found;
}

/** The places in the script that are being run, innermost first. */
function readStack(): Place[] {
  const { prepareStackTrace, stackTraceLimit } = Error;
  Error.stackTraceLimit = Infinity;
  Error.prepareStackTrace = (_, frames) => frames;
  const frames = new Error().stack as unknown as NodeJS.CallSite[];
  Object.assign(Error, { prepareStackTrace, stackTraceLimit });
  return frames
    .filter((frame) => frame.getFileName() === FILE)
    .map((frame) => ({ line: (frame.getLineNumber() ?? 0) - LINES_BEFORE, column: frame.getColumnNumber() ?? 0 }));
}

/** Runs a script that has to run to its end; gives its timeline, with the lines of each cue as Node names them. */
export function runByStack(input: RunInput): Timeline {
  const compiled = compileScript(input.source, listNames(input.layout, input.song));
  if (!compiled.ok) throw new Error(compiled.problem.sentence);
  const { file, text, marked } = compiled;
  const siteAt = indexSites(file, marked.sites);
  const lineOf = new Map<number, number>();
  const callers = (): number[] =>
    readStack()
      .reverse()
      // The outermost frame is the wrapper's own call of the script.
      .slice(1)
      .map((place) => {
        const site = siteAt.get(keyOf(place));
        if (site === undefined) throw new Error(`No call is known at ${keyOf(place)}.`);
        lineOf.set(site, place.line);
        return site;
      });
  // The library reads the callers first, then their number.
  let depth = 0;
  const frames = {
    site: () => callers().at(-1) ?? 0,
    get callers() {
      const outer = callers().slice(0, -1);
      depth = outer.length;
      return outer;
    },
    depth: () => depth,
  };
  const tables = buildTables(input.layout, input.song);
  const luck = { seed: input.seed >>> 0, streamOf: marked.streamOf, streams: marked.streams };
  const realm = vm.createContext({});
  vm.runInContext(KEEP_GLOBAL_OPEN, realm);
  const library = vm.runInContext(LIBRARY, realm) as Library;
  library.open(JSON.stringify(tables));
  library.deal(JSON.stringify(luck));
  const code = `(function ($$w, $$) { "use strict"; const { ${GLOBAL_WORDS.join(", ")} } = $$w; (() => {\n${tsBlankSpace(text)}\n})(); })`;
  const script = vm.runInContext(code, realm, { filename: FILE }) as Script;
  library.run((words, marks) => {
    marks.lend(frames);
    script(words, marks);
  });
  const { failure } = JSON.parse(library.report()) as { failure: unknown };
  if (failure !== null) throw new Error(`The script stopped: ${JSON.stringify(failure)}`);
  const head = {
    language: 1,
    songId: input.songId,
    layoutHash: "none",
    seed: luck.seed,
    lightCount: tables.lightCount,
    endTick: (input.song.beats.length - 1) * TICKS_PER_BEAT,
    isComplete: true,
  };
  return decodeTimelineBuffer(new Uint8Array(library.buffer()), head, (site) => lineOf.get(site) ?? 0);
}

type Script = (words: unknown, marks: { lend(frames: unknown): void }) => void;

interface Library {
  open(tables: string): void;
  deal(luck: string): void;
  run(script: Script): void;
  report(): string;
  buffer(): ArrayBuffer;
}
