import { hostile, type HostileScript } from "../hostile-script.ts";

/** Scripts that fill the memory. */
export const MEMORY: readonly HostileScript[] = [
  hostile("doubling text", 'let s = "x"; for (;;) s += s;', "too-big", "string too long"),
  hostile("long repetition", 'const s = "x".repeat(2 ** 29);\nconsole.log(s.length);', "too-big", "out of memory"),
  hostile("lists of lists", "const a = []; for (;;) a.push(new Array(1000).fill(0));", "too-big", "out of memory"),
  hostile(
    "list from a length",
    "const a = Array.from({ length: 1e9 });\nconsole.log(a.length);",
    "too-big",
    "out of memory",
  ),
  hostile(
    "fill of a huge list",
    "const a = new Array(2 ** 32 - 1).fill(1);\nconsole.log(a.length);",
    "too-big",
    "out of memory",
  ),
  hostile("growing classes", "const a = []; for (;;) a.push(class { x = 1; });", "too-big", "out of memory"),
  hostile("spread of a huge list", "Math.max(...new Array(1e6).fill(1));", "too-big", "RangeError"),
  hostile("spread that doubles", "let a = [1]; for (;;) a = [...a, ...a];", "too-big", "out of memory"),
  hostile("typed list", "const a = new Uint8Array(2 ** 31); for (;;) a.fill(1);", "not-here", "ReferenceError"),
  hostile("whole numbers without end", "let n = 2n; for (;;) n *= n;", "no-bigint", "RangeError"),
];
