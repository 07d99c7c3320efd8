/** The words of the language that stand alone, in the order of the reference. */
export const GLOBAL_WORDS = [
  "wait",
  "waitUntil",
  "now",
  "at",
  "together",
  "repeat",
  "beatsIn",
  "song",
  "square",
  "hue",
  "roll",
  "chance",
  "oneOf",
  "console",
] as const;
export type GlobalWord = (typeof GLOBAL_WORDS)[number];

/** Words that are functions: naming one without `()` does nothing. */
export const GLOBAL_FUNCTIONS: ReadonlySet<string> = new Set<GlobalWord>([
  "wait",
  "waitUntil",
  "now",
  "at",
  "together",
  "repeat",
  "beatsIn",
  "hue",
  "roll",
  "chance",
  "oneOf",
]);

/** What acts on lights. */
export const ACT_WORDS = ["on", "off", "fadeTo", "pulse", "colour"] as const;

/** What makes a new list of lights and changes none. */
export const CHOOSE_WORDS = ["first", "everyNth", "reversed", "shuffled", "split", "and", "except"] as const;

/** Everything that lights can do or tell. `color` is accepted, not offered. */
export const LIGHTS_MEMBERS = [
  ...ACT_WORDS,
  ...CHOOSE_WORDS,
  "lights",
  "inTurn",
  "name",
  "box",
  "length",
  "forEach",
  "filter",
  "map",
  "part",
] as const;

export const SQUARE_MEMBERS = ["all", "fronts", "front", "side", "parts"] as const;
export const SONG_MEMBERS = [
  "start",
  "end",
  "bars",
  "beats",
  "beatsPerBar",
  "bar",
  "section",
  "sections",
  "hits",
  "notes",
  "howLoud",
] as const;

/** Globals of TypeScript that are in; `null`, `true` and the like are not names. */
export const ALLOWED_GLOBALS: ReadonlySet<string> = new Set([
  "Math",
  "Array",
  "String",
  "Number",
  "Boolean",
  "Map",
  "Set",
  "JSON",
  "Object",
  "Error",
  "Infinity",
  "NaN",
  "undefined",
  "isNaN",
  "isFinite",
  "parseInt",
  "parseFloat",
]);

/** Globals from elsewhere that beginners bring along, and what to use. */
export const FOREIGN_GLOBALS: { readonly [name: string]: string } = {
  Date: "Ask `now()` for the beat.",
  performance: "Ask `now()` for the beat.",
  alert: "Use `console.log`.",
  print: "Use `console.log`.",
  prompt: "Keep it in a variable.",
  confirm: "Keep it in a variable.",
  document: "Use `square`.",
  window: "Use `square`.",
  globalThis: "Use `square` or `song`.",
  self: "Use `square`.",
  process: "Use `square` or `song`.",
  require: "Write all of it in this script.",
  module: "Write all of it in this script.",
  fetch: "Write it in this script.",
  Proxy: "Write a function.",
  Reflect: "Write a function.",
  WeakMap: "Use `Map`.",
  WeakSet: "Use `Set`.",
  WeakRef: "Keep it in a variable.",
  Intl: "Use a template text.",
  Symbol: "Use a text.",
  BigInt: "Use a number.",
  RegExp: "Write it between two `/`.",
  ArrayBuffer: "Use a list.",
  DataView: "Use a list.",
  Uint8Array: "Use a list.",
  Int32Array: "Use a list.",
  Float64Array: "Use a list.",
  arguments: "Name the things in the function's brackets.",
};

/** Real-time waits of other places. */
export const TIMERS: ReadonlySet<string> = new Set([
  "setTimeout",
  "setInterval",
  "requestAnimationFrame",
  "queueMicrotask",
  "clearTimeout",
  "clearInterval",
]);

/** The parameters that take a name, and what it is the name of. */
export const NAME_PARAMETERS: { readonly [word: string]: { readonly argument: number; readonly kind: NameKind } } = {
  front: { argument: 0, kind: "front" },
  side: { argument: 0, kind: "side" },
  parts: { argument: 0, kind: "part" },
  part: { argument: 0, kind: "part" },
  section: { argument: 0, kind: "section" },
  hits: { argument: 0, kind: "instrument" },
  notes: { argument: 0, kind: "instrument" },
  colour: { argument: 0, kind: "colour" },
  color: { argument: 0, kind: "colour" },
  pulse: { argument: 1, kind: "colour" },
};
export type NameKind = "front" | "side" | "part" | "section" | "instrument" | "colour";

/** The start of every name that the marked script uses for itself; no script may use it. */
export const MARK_PREFIX = "$$";
