import { describe, expect, it } from "vitest";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { runScript } from "../../tests/support/run-script.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { PROBLEMS } from "./problems/index.ts";

/**
 * Each problem as a pupil meets it: script, code, line and column, the sentence where the design
 * fixes it, and the square where the small one does not do. Every one of them runs through the whole
 * engine, and every code of the catalogue has one.
 */
const CASES: readonly (readonly [code: string, place: string, script: string, sentence?: string, layout?: Layout])[] = [
  ["not-run", "2:1", "function flash() { wait(1); }\nflash;", "You named `flash`, but you did not run it."],
  ["not-run", "1:1", "square.all.on;", "You named `on`, but you did not run it."],
  ["ran-too-early", "1:7", "at(8, square.all.off());", "This runs right now, not at beat 8."],
  [
    "ran-too-early",
    "2:7",
    "const blink = () => square.all.on();\nat(8, blink());",
    "This runs right now, not at beat 8.",
  ],
  ["not-an-action", "1:11", "repeat(4, 3);", "`repeat` needs steps to run, but it got 3."],
  [
    "unused-list",
    "2:1",
    'const north = square.side("north");\nnorth.reversed();',
    "`reversed` makes a new list. Nothing uses it here.",
  ],
  ["unused-answer", "2:1", "let level = 1;\nlevel + 10;", "You work out a sum here, but nothing keeps the answer."],
  ["unused-name", "2:1", "const level = 1;\nlevel;"],
  ["one-equals", "2:5", "let turn = 1;\nif (turn = 2) wait(1);", "One `=` puts a value in. It does not compare."],
  ["constant", "2:1", "const level = 1;\nlevel = 2;", "`level` is a `const`, so it can not change."],
  ["constant", "2:1", "const level = 1;\nlevel++;"],
  ["taken-word", "1:5", "let song = 1;", "The word `song` has a job here already."],
  ["taken-word", "1:5", "let $$l = 1;"],
  ["taken-word", "1:5", "let class = 1;"],
  ["made-twice", "2:5", "let a = 1;\nlet a = 2;"],
  ["needs-quotes", "1:14", "square.front(bakery).on();", "The name of a front goes in quotes."],
  ["needs-quotes", "1:14", "square.front(tea room).on();", "The name of a front goes in quotes."],
  ["unknown-front", "1:14", 'square.front("bakry").on();', 'No front has the name "bakry". Did you mean "bakery"?'],
  ["unknown-part", "1:14", 'square.parts("rof").on();'],
  ["unknown-side", "1:13", 'square.side("nord").on();'],
  ["unknown-section", "1:14", 'song.section("coda");'],
  ["unknown-instrument", "1:11", 'song.hits("drum");', 'This song has no "drum" in it. Did you mean "drums"?'],
  ["unknown-word", "1:1", "Wait(1);", "I do not know the word `Wait`. Did you mean `wait`?"],
  ["unknown-word", "1:1", "fucntion flash() { wait(1); }"],
  ["out-of-reach", "2:6", "if (now() === 0) { const long = 1; }\nwait(long);"],
  ["not-made-yet", "1:6", "wait(long);\nconst long = 1;"],
  ["unknown-skill", "1:12", "square.all.turnOn();", "Lights can not do `turnOn`."],
  ["unknown-skill", "1:8", 'square.fornt("bakery");'],
  ["unknown-skill", "2:6", "const list = [1];\nlist.fadeTo(1, 2);"],
  ["wait-alone", "1:17", "square.all.on().wait(2);", "Lights can not wait. The script waits."],
  ["no-reading", "1:13", "console.log(square.all.level);", "You can tell lights what to do, but you can not ask them."],
  ["unknown-colour", "1:19", 'square.all.colour("golden");', 'I know no colour "golden". Did you mean "gold"?'],
  ["unknown-colour", "1:15", 'const shade = "#ff00";\nsquare.all.pulse(1, shade);'],
  ["no-such-section", "1:24", 'song.section("chorus", 3);', 'This song has 2 sections named "chorus", not 3.'],
  ["no-such-bar", "1:10", "song.bar(99);", "There is no bar 99. The last bar is 4."],
  ["no-such-beat", "1:13", "song.bar(2, 5);", "Bar 2 has 4 beats, so it has no beat 5."],
  ["wants-a-number", "1:15", 'square.all.on("100");', '`on` needs a number here, but it got the text "100".'],
  ["wants-whole", "1:6", "roll(2.5);"],
  ["wants-text", "1:14", "square.front(3);"],
  ["wants-a-colour", "1:19", "square.all.colour(3);"],
  ["wants-lights", "2:19", "const group = [square.all];\nsquare.all.except(group).on();"],
  ["wants-a-section", "1:20", 'song.hits("drums", 3);'],
  ["wants-a-list", "1:7", "oneOf(3);"],
  ["empty-list", "1:7", "oneOf([]);"],
  ["not-finite", "2:6", "let x;\nwait(x * 2);", "The sum for `wait` has no answer. Is a number missing?"],
  ["missing-value", "1:12", "square.all.fadeTo(50);", "`fadeTo` needs 2 things: a level and the beats."],
  ["missing-value", "1:1", "wait();", "`wait` needs 1 thing: the beats."],
  ["negative-time", "1:6", "wait(-1);", "Time can not run back. You asked for -1 beats."],
  ["already-passed", "2:11", "wait(20);\nwaitUntil(4);", "Beat 4 is over. The clock is at beat 20."],
  ["before-start", "1:4", "at(-2, () => square.all.on());", "The song starts at beat 0. Beat -2 is too soon."],
  [
    "wait-for-place",
    "2:1",
    'const chorus = song.section("chorus");\nwait(chorus.start);',
    "`wait` counts from now. It does not go to a place.",
  ],
  [
    "clock-stood-still",
    "1:1",
    "while (true) { square.all[0].on(); }",
    "This loop never ends. The clock does not move in it.",
  ],
  ["endless", "2:1", "let i = 0;\nwhile (i < 10) { i = i; }", "This loop ran too long, so I stopped it."],
  ["too-much-work", "2:1", "wait(1);\nrepeat(1e9, () => { });", "This script ran too long, so I stopped it."],
  ["too-many-cues", "2:26", "wait(1);\nfor (;;) { square.all[0].on(); wait(0.001); }"],
  ["too-many-changes", "1:23", "for (;;) { square.all.on(); wait(0.001); }", undefined, DEMO_SQUARE],
  ["could-not-run", "2:6", 'wait(1);\nJSON.parse("{");', "I had to stop this script."],
  ["calls-itself", "1:20", "function grow(n) { grow(n + 1); }\ngrow(1);", "`grow` calls itself too many times."],
  ["too-many-notes", "1:24", "while (true) { console.log(1); }"],
  ["too-big", "1:33", 'let s = "a"; while (true) s = s + s;'],
  [
    "missing-bracket",
    "1:33",
    "for (const f of square.fronts)  {\n  f.on();\nwait(1);",
    "The `{` in line 1 has no `}`.",
  ],
  [
    "missing-bracket",
    "3:13",
    "repeat(2, () => {\n  wait(1);\n  if (true) {\n    wait(2);\n});\nwait(3);",
    "The `{` in line 3 has no `}`.",
  ],
  ["missing-bracket", "1:5", "wait(1;", "The `(` in line 1 has no `)`."],
  ["extra-bracket", "1:8", "wait(1));"],
  ["missing-quote", "1:14", 'square.front("bakery).on();\nwait(1);'],
  ["missing-quote", "1:9", "let q = `abc"],
  ["missing-name", "2:10", "wait(1);\nfunction () { wait(1); }"],
  ["missing-name", "1:8", "square.;\nwait(1);"],
  ["unreadable", "2:12", "wait(1);\nlet x = 3 +* 4;", "I can not read this line."],
  ["missing-comma", "1:22", "square.all.fadeTo(50 2);"],
  ["two-steps", "1:9", "wait(1) wait(2)"],
  ["curly-quotes", "1:14", "square.front(“bakery”).on();"],
  ["else-alone", "2:1", "wait(1);\nelse wait(2);"],
  ["name-with-space", "1:5", "let my level = 3;"],
  ["number-first", "1:5", "let 2nd = 3;"],
  ["const-without-value", "1:7", "const x;"],
  ["empty-loop", "1:13", "while (true);"],
  ["not-in-list", "1:1", 'square.side("north")[12].on();', "This list has no number 12. It goes from 0 to 1."],
  ["not-in-list", "2:1", "const list = [1, 2];\nlist[2].toFixed();", "This list has no number 2. It goes from 0 to 1."],
  ["list-is-empty", "2:1", "const list = [];\nlist[0].on();"],
  ["nothing-there", "2:1", "let x;\nx.on();", "There is nothing in `x` here, so `on` does not work."],
  ["not-a-function", "2:1", "const x = 3;\nx();"],
  ["not-a-list", "1:17", "for (const x of 3) wait(1);"],
  ["can-not-change", "1:20", 'song.hits("drums").push(3);'],
  ["thrown", "2:1", 'wait(1);\nthrow new Error("no more");', 'Your script stopped itself here. It says "no more".'],
  ["thrown", "1:1", "throw 3;"],
  ["no-import", "1:1", 'import x from "y";'],
  ["no-import", "1:1", "export const a = 1;"],
  ["no-import", "1:1", 'import("fs");'],
  ["no-eval", "1:1", 'eval("1");'],
  ["no-eval", "1:5", 'new Function("1");'],
  ["no-async", "1:1", "async function f() { }"],
  ["no-async", "1:5", "new Promise(() => { });"],
  ["no-timer", "1:1", "setTimeout(() => wait(1), 100);"],
  ["no-generator", "1:1", "function* f() { }"],
  ["no-enum", "1:1", "enum Colour { Red }"],
  ["no-namespace", "1:1", "namespace A { }"],
  ["no-decorator", "1:1", "@sealed class A { }"],
  ["no-var", "1:1", "var x = 1;"],
  ["no-for-in", "1:1", "for (const k in [1]) wait(1);"],
  ["no-try", "1:1", "try { wait(1); } catch { wait(2); }"],
  ["no-label", "1:1", "again: for (;;) break again;"],
  ["no-accessor", "1:13", "const o = { get x() { return 1; } };"],
  ["no-bigint", "1:11", "const n = 10n;"],
  ["no-any", "1:10", "const x: any = 1;"],
  ["no-cast", "1:11", "const x = <number>1;"],
  ["no-delete", "2:1", "const o = { a: 1 };\ndelete o.a;"],
  ["no-comma", "2:6", "let x = 1;\nx = (1, 2);"],
  ["no-this", "1:13", "console.log(this);"],
  ["no-tag", "1:1", "String.raw`x`;"],
  ["no-with", "2:1", "const o = { a: 1 };\nwith (o) { wait(1); }"],
  ["no-using", "1:1", "using x = 1;"],
  ["not-here", "2:1", "wait(1);\ndebugger;"],
  ["not-here", "1:11", "const d = Date.now();"],
  ["not-here", "1:13", "console.log(window);"],
  ["not-here", "1:11", 'const s = Symbol("x");'],
  ["too-deep", "1:81", `${"[".repeat(90)}${"]".repeat(90)}`],
  ["too-long", "1:1", `// ${"x".repeat(70_000)}`],
];

describe("problems", () => {
  it("are all shown by a script below", () => {
    expect(Object.keys(PROBLEMS).filter((code) => !CASES.some(([shown]) => shown === code))).toEqual([]);
  });

  for (const [code, place, script, sentence, layout] of CASES) {
    it(`${code} at ${place}: ${script.slice(0, 60)}`, async () => {
      const outcome = await runScript(script, layout === undefined ? {} : { layout });
      if (outcome.ok) throw new Error("The script ran.");
      const { problem } = outcome;
      expect([problem.code, `${problem.range.line}:${problem.range.column}`]).toEqual([code, place]);
      if (sentence !== undefined) expect(problem.sentence).toBe(sentence);
      expect(problem.sentence + problem.hint).not.toMatch(/\{\w+\}|undefined|\[\?/);
    });
  }
});

describe("what beginners write and what is right", () => {
  it.each([
    ["a variable that shadows no word", "const bar = 2; const beat = 3; wait(bar + beat);"],
    [
      "own fields named like lights' words",
      "const plan = { level: 50, start: 2 }; wait(plan.start); square.all.on(plan.level);",
    ],
    [
      "a class with this",
      "class Wave { constructor(size) { this.size = size; } go() { return this.size; } }\nwait(new Wave(2).go());",
    ],
    [
      "types, generics and interfaces",
      'interface Row { readonly name: string }\ntype Rows = Row[];\nfunction first<T>(list: T[]): T { return list[0]!; }\nconst rows: Rows = [{ name: "a" }]; console.log(first(rows).name as string);',
    ],
    ["lines without semicolons", "square.all.on()\nwait(1)\nsquare.all.off()\n;[1, 2].forEach(n => wait(n))"],
    [
      "a call on several lines with comments",
      "square.all // all of them\n  .on(\n    /* how bright */ 50, // half\n  )",
    ],
    ["a loop condition with an assignment in brackets of its own name", "let n = 3; while (n > 0) n -= 1;"],
    ["optional chaining", "const maybe = undefined; maybe?.on(); console.log(maybe?.length ?? 0);"],
    [
      "switch, ternary, template text",
      'const n = roll(3); switch (n) { case 1: wait(1); break; default: wait(2); }\nconsole.log(`${n > 1 ? `big ${n}` : "small"}`);',
    ],
    [
      "an error with a name of its own",
      'class Stop extends Error { constructor() { super("x"); this.name = "Stop"; } }\nconst s = new Stop(); console.log(s.name);',
    ],
    ["a getter-free object with a toString", 'const o = { toString() { return "me"; } }; console.log(`${o}`);'],
    ["windows line ends and a byte order mark", "\uFEFFwait(1);\r\nsquare.all.on();\r\n"],
    ["regular expressions", 'console.log("a1b2".replace(/[0-9]/g, ""), /^(a|b)+$/.test("ab"));'],
    [
      "spreading and destructuring",
      "const [a, ...rest] = square.fronts; const { name } = a; console.log(name, rest.length, Math.max(...[1, 2]));",
    ],
    [
      "do while and nested ifs",
      "let i = 0; do { if (i === 1) { i += 1; } else if (i === 2) { i += 2; } else { i += 1; } } while (i < 5);",
    ],
  ])("runs %s", async (_, script) => {
    const outcome = await runScript(script);
    expect(
      outcome.ok ? "runs" : `${outcome.problem.code}: ${outcome.problem.sentence} ${outcome.problem.details ?? ""}`,
    ).toBe("runs");
  });
});
