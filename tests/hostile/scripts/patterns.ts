import { hostile, type HostileScript } from "../hostile-script.ts";

/** Regular expressions that never come to an end, or nest. */
export const PATTERNS: readonly HostileScript[] = [
  hostile(
    "endless backtracking",
    `const found = /^(a+)+$/.test("${"a".repeat(35)}b");\nconsole.log(found);`,
    "too-much-work",
    "out-of-fuel",
  ),
  hostile(
    "looking behind for ever",
    `const found = /(?<=^(a+)+)c/.test("${"a".repeat(35)}c");\nconsole.log(found);`,
    "ran",
    "ran",
  ),
  hostile("empty loop in a pattern", 'const found = /()*?a/.test("b".repeat(1e5));\nconsole.log(found);', "ran", "ran"),
  hostile(
    "huge count in a pattern",
    'const found = /(?:a{1000}){1000}/.test("a".repeat(2e6));\nconsole.log(found);',
    "ran",
    "ran",
  ),
  hostile(
    "nested pattern",
    `const found = /${"(".repeat(75)}a${")".repeat(75)}/.test("a");\nconsole.log(found);`,
    "ran",
    "ran",
  ),
  hostile(
    "pattern nested deeply",
    `const r = /${"(".repeat(5_000)}a${")".repeat(5_000)}/;\nconsole.log(r.test("a"));`,
    "too-deep",
    null,
  ),
  hostile(
    "pattern from a text",
    'const r = new RegExp("(".repeat(20000) + ")".repeat(20000));\nconsole.log(r.test("a"));',
    "not-here",
    "SyntaxError",
  ),
  hostile(
    "split by a pattern",
    `const parts = "${"a".repeat(30)}".split(/(a*)*b/);\nconsole.log(parts.length);`,
    "too-much-work",
    "out-of-fuel",
  ),
];
