import { hostile, type HostileScript } from "../hostile-script.ts";

/** Built-ins that take very long in one call: most of them never ask whether they should stop. */
export const BUILT_INS: readonly HostileScript[] = [
  hostile("join of a huge list", 'const a = new Array(1e9); console.log(a.join("x").length);', "killed", "killed"),
  hostile("reversal of a list-like", "Array.prototype.reverse.call({ length: 2 ** 53 - 1 });", "killed", "killed"),
  hostile(
    "splice of a list-like",
    "Array.prototype.splice.call({ length: 2 ** 53 - 1 }, 0, 0, 1);",
    "could-not-run",
    "TypeError",
  ),
  hostile(
    "endless sort",
    "const a = []; for (let i = 0; i < 300000; i++) a.push((i * 7919) % 300007);\nfor (;;) a.sort();",
    "killed",
    "killed",
  ),
  hostile(
    "split of a long text",
    'const s = "x".repeat(5e6); for (;;) { const letters = s.split(""); }',
    "too-big",
    "out of memory",
  ),
  hostile(
    "replacement that blows up",
    'let s = "aaaa"; for (;;) s = s.replaceAll("a", "aaaa");',
    "too-big",
    "out of memory",
  ),
  hostile("dates in long texts", 'const s = "1".repeat(1e5); for (;;) Date.parse(s);', "not-here", "ReferenceError"),
];
