import { hostile, type HostileScript } from "../hostile-script.ts";

/** Loops without an end. */
export const LOOPS: readonly HostileScript[] = [
  hostile("endless while", "while (true) {}", "endless", "out-of-fuel"),
  hostile(
    "loop that swallows errors",
    "for (;;) { try { throw 1; } catch (e) {} finally {} }",
    "no-try",
    "out-of-fuel",
  ),
  hostile(
    "loop in a finally",
    "function f() { try { return 1; } finally { for (;;) {} } }\nf();",
    "no-try",
    "out-of-fuel",
  ),
  hostile("endless repeat", "repeat(1e15, () => {});", "too-much-work", "out-of-fuel"),
  hostile("endless waiting", "for (;;) wait(0);", "endless", "out-of-fuel"),
  hostile(
    "list that grows while it is read",
    "const a = [1]; for (const x of a) a.push(x);",
    "too-big",
    "out of memory",
  ),
  hostile(
    "loop through a getter",
    "const o = { get x() { for (;;) {} } };\nconsole.log(o.x);",
    "no-accessor",
    "out-of-fuel",
  ),
  hostile(
    "loop through valueOf",
    "const o = { valueOf() { for (;;) {} } };\nconst n = o * 2;\nconsole.log(n);",
    "endless",
    "out-of-fuel",
  ),
];
