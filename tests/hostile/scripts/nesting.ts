import { hostile, type HostileScript } from "../hostile-script.ts";

/** Source texts that end a parser's stack, or are too long: the checks before the engine are their defence. */
export const NESTING: readonly HostileScript[] = [
  hostile("source nested in brackets", "(".repeat(60_000), "too-deep", null),
  hostile("source nested in lists", `${"[".repeat(30_000)}${"]".repeat(30_000)}`, "too-deep", null),
  hostile("source nested in signs", `const x = ${"!".repeat(60_000)}1;`, "too-deep", null),
  hostile("source nested in arrows", `const f = ${"a=>".repeat(20_000)}1;`, "too-deep", null),
  hostile("source nested in questions", `const f = ${"1?".repeat(10_000)}1${":1".repeat(10_000)};`, "too-deep", null),
  hostile("source nested in templates", `const f = ${"`${".repeat(10_000)}1${"}`".repeat(10_000)};`, "too-deep", null),
  hostile("source nested in ifs", `${"if(1)".repeat(12_000)};`, "too-deep", null),
  hostile("source nested in else", `${"if(1)wait(1);else ".repeat(3_000)}wait(1);`, "too-deep", null),
  hostile("source nested in new", `const x = ${"new ".repeat(15_000)}Map();`, "too-deep", null),
  hostile("source nested in awaits", `const x = ${"await ".repeat(10_000)}1;`, "too-deep", null),
  hostile(
    "source nested in strings of brackets",
    `const s = "${"(".repeat(30_000)}";\n${"(".repeat(30_000)}`,
    "too-deep",
    null,
  ),
  hostile("source of one long sum", `const x = ${"1+".repeat(30_000)}1;`, "too-deep", null),
  hostile("source of one long chain", `square.all${".on()".repeat(10_000)};`, "too-deep", null),
  hostile("source of power signs", `const x = ${"2**".repeat(20_000)}1;`, "too-deep", null),
  hostile("source of assignments", `let a; ${"a=".repeat(30_000)}1;`, "too-deep", null),
  hostile(
    "source of types",
    `type A = ${"[".repeat(70)}1${"]".repeat(70)};\nlet a: ${"Array<".repeat(5_000)}number${">".repeat(5_000)};`,
    "too-deep",
    null,
  ),
  hostile("source that is too long", "wait(1);\n".repeat(8_000), "too-long", null),
  hostile("source of one long name", `let ${"a".repeat(60_000)} = 1;`, "ran", "ran"),
  hostile(
    "source of many names",
    Array.from({ length: 5000 }, (_, i) => `let n${i}=${i};`).join(""),
    "too-long",
    "stack overflow",
  ),
  hostile(
    "source of many functions",
    Array.from({ length: 2500 }, (_, i) => `function f${i}(){}`).join(""),
    "ran",
    "ran",
  ),
];
