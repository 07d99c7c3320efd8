import type { GuestLuck, GuestReport, GuestTables } from "../guest.ts";
import { MAX_CALL_DEPTH } from "../guest.ts";
import { chance, oneOf, roll } from "./chance.ts";
import { hue } from "./colour.ts";
import { scriptConsole } from "./console.ts";
import { takeBuffer } from "./cues.ts";
import { harden } from "./harden.ts";
import { Lights } from "./lights.ts";
import { missingItem } from "./list-items.ts";
import { draw } from "./luck.ts";
import { Section, song } from "./song.ts";
import { Front, square } from "./square.ts";
import { Stop, fail, state, toTick, type ScriptFrames } from "./state.ts";
import { at, beatsIn, now, repeat, together, wait, waitUntil } from "./time.ts";

/**
 * The entrance of the library: what the host calls, and what the marked script is given. Kept apart
 * from the global object, which a script could otherwise read.
 */
const words = Object.freeze({
  square,
  song,
  wait,
  waitUntil,
  now,
  at,
  together,
  repeat,
  beatsIn,
  hue,
  roll,
  chance,
  oneOf,
  console: scriptConsole,
});

/** What the marked script calls by itself, under a name that no script may use. */
const marks = Object.freeze({
  none: Object.freeze([]),
  maxDepth: MAX_CALL_DEPTH,
  lend(frames: ScriptFrames): void {
    state.frames = frames;
  },
  tooDeep(name: string): never {
    return fail("calls-itself", { name });
  },
  item: missingItem,
});

type Script = (given: typeof words, lent: typeof marks) => void;

function describeThrown(thrown: unknown): void {
  if (state.failure !== null || thrown instanceof Stop) return;
  if (thrown === null) {
    // Without room for an error the engine throws null.
    state.failure = { code: "engine", values: {}, name: "InternalError", message: "out of memory" };
    return;
  }
  if (thrown instanceof Error) {
    const { name, message, stack } = thrown;
    const isEngine =
      name === "InternalError" ||
      name === "TypeError" ||
      name === "ReferenceError" ||
      name === "RangeError" ||
      name === "SyntaxError";
    state.failure = {
      code: isEngine ? "engine" : "thrown",
      values: {},
      name: String(name).slice(0, 100),
      message: String(message).slice(0, 300),
      stack: String(stack).slice(0, 2000),
    };
    return;
  }
  const isPlain = typeof thrown === "string" || typeof thrown === "number" || typeof thrown === "boolean";
  state.failure = { code: "thrown", values: {}, message: isPlain ? String(thrown).slice(0, 300) : "" };
}

/** What the host holds. */
export const library = {
  /** Takes the tables and closes the realm. */
  open(tables: string): void {
    state.tables = JSON.parse(tables) as GuestTables;
    state.endTick = toTick(state.tables.song.beats.length - 1);
    harden(draw, [words, marks, Lights, Front, Section, Stop]);
  },
  /** Takes the luck of the script that comes next. */
  deal(luck: string): void {
    state.luck = JSON.parse(luck) as GuestLuck;
  },
  /** Runs the marked script to its end or to its first problem. */
  run(script: Script): void {
    try {
      script(words, marks);
    } catch (thrown) {
      describeThrown(thrown);
    }
  },
  /** What the run had to say, as JSON. */
  report(): string {
    const { frames } = state;
    const report: GuestReport = {
      failure: state.failure,
      sites: [...frames.callers.slice(0, frames.depth()), frames.site()],
      notes: state.notes,
      findings: state.findings,
      tick: toTick(Math.min(state.clock, 4_000_000)),
    };
    return JSON.stringify(report);
  },
  buffer: takeBuffer,
};
