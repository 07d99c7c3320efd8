import { hostile, type HostileScript } from "../hostile-script.ts";

/** Thrown things with traps, and texts that are hardly scripts. */
export const TEXTS: readonly HostileScript[] = [
  hostile("thrown thing with traps", "class T { toString() { for (;;) {} } }\nthrow new T();", "thrown", "thrown"),
  hostile("error with a huge text", 'throw new Error("x".repeat(1e7));', "thrown", "thrown"),
  hostile(
    "error with a name that loops",
    'const e = new Error("x"); e.name = { toString() { for (;;) {} } };\nthrow e;',
    "endless",
    "out-of-fuel",
  ),
  hostile(
    "error with a getter that throws",
    'throw Object.defineProperty(new Error("x"), "message", { get() { throw 1; } });',
    "unknown-skill",
    "broken",
  ),
  hostile(
    "error that claims to be the engine's",
    'const e = new Error("stack overflow"); e.name = "InternalError";\nthrow e;',
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "error with a stack of its own",
    'const e = new Error("x"); e.name = "TypeError"; e.stack = "at script.js:99999:99999";\nthrow e;',
    "could-not-run",
    "TypeError",
  ),
  hostile("throws nothing", "throw undefined;", "thrown", "thrown"),
  hostile("throws null", "throw null;", "too-big", "out of memory"),
  hostile("throws lights", "throw square.all;", "thrown", "thrown"),
  hostile("random bytes", "\u0000\u0001\uD800\uFFFF😀 let \u200b = ", "unreadable", "unreadable"),
  hostile("lone surrogates", 'console.log("\uD800", "\uDC00".length, `\uDFFF`);\nthrow "\uD800";', "thrown", "thrown"),
  hostile(
    "line ends of all kinds",
    "wait(1);\r\nwait(1);\rwait(1);\u2028wait(1);\u2029wait(-1);",
    "negative-time",
    "negative-time",
  ),
  hostile("right to left", "/* \u202e } \u2066 */ wait(-1); // \u2069", "negative-time", "negative-time"),
  hostile("a page in a script", "</script><script>alert(1)</script>", "unreadable", "unreadable"),
  hostile("a comment without an end", `/* ${"*".repeat(50_000)}`, "unreadable", "unreadable"),
  hostile("html comment", "<!-- wait(1)\n--> wait(1)\nwait(-1);", "unreadable", "negative-time"),
  hostile("hash bang", "#!/usr/bin/env node\nwait(-1);", "unreadable", "unreadable"),
  hostile("old octal numbers", "wait(-010);", "unreadable", "unreadable"),
  hostile("names that look alike", "const wаit = 1; waіt(2);", "unknown-word", "ReferenceError"),
];
