/**
 * Scripts that try to hang, fill, break or leave the engine. `codes` are the problems that may answer
 * them: where memory and fuel race, the engine's order of allocation decides, equally on every host.
 */
export interface HostileScript {
  readonly name: string;
  /** It spends its time in one built-in that the engine can not interrupt: only ending the worker helps. */
  readonly needsKill: boolean;
  readonly source: string;
  readonly codes: readonly string[];
}

const TOO_MUCH = ["too-big", "endless", "too-much-work"];

function hostile(name: string, source: string, ...codes: readonly string[]): HostileScript {
  return { name, source, codes, needsKill: false };
}

function unstoppable(name: string, source: string): HostileScript {
  return { name, source, codes: ["too-much-work"], needsKill: true };
}

export const HOSTILE_SCRIPTS: readonly HostileScript[] = [
  hostile("endless while", "while (true) {}", "endless"),
  hostile("endless for with work", "for (let i = 0; ; i++) { Math.sin(i); }", "endless"),
  hostile("endless do", "do { now(); } while (true);", "endless"),
  hostile("loop that swallows errors", "for (;;) { try { throw 1; } catch (e) {} finally {} }", "no-try"),
  hostile("direct recursion", "function f() { f(); }\nf();", "calls-itself"),
  hostile("mutual recursion", "function a() { b(); }\nfunction b() { a(); }\na();", "calls-itself"),
  hostile("recursion through repeat", "const f = () => repeat(1, f);\nf();", "calls-itself"),
  hostile(
    "recursion through at and inTurn",
    "const f = () => at(1, () => square.all.inTurn(0, f));\nf();",
    "calls-itself",
  ),
  hostile("recursion through sort", "const f = () => [2, 1].toSorted(() => f());\nf();", "calls-itself"),
  hostile("recursion through replace", 'const f = () => "a".replace(/a/, () => f());\nf();', "calls-itself"),
  hostile(
    "recursion through toString",
    "class T { toString() { return `${new T()}`; } }\nconsole.log(`${new T()}`);",
    "calls-itself",
  ),
  hostile(
    "recursion through JSON",
    "const o = { toJSON() { return JSON.stringify(o); } };\nJSON.stringify(o);",
    "calls-itself",
  ),
  hostile(
    "recursion with many variables",
    `function f(n) { ${Array.from({ length: 200 }, (_, i) => `const v${i} = n + ${i};`).join(" ")} return f(n + v1); }\nf(1);`,
    "calls-itself",
  ),
  hostile("recursive constructor", "class A { constructor() { new A(); } }\nnew A();", "calls-itself"),
  hostile("recursive default", "function f(a = f()) { return a; }\nf();", "calls-itself"),
  hostile("source nested in brackets", "(".repeat(60_000), "too-deep"),
  hostile("source nested in lists", `${"[".repeat(30_000)}${"]".repeat(30_000)}`, "too-deep"),
  hostile("source nested in blocks", `${"{".repeat(30_000)}${"}".repeat(30_000)}`, "too-deep"),
  hostile("source nested in signs", `const x = ${"!".repeat(60_000)}1;`, "too-deep"),
  hostile("source nested in arrows", `const f = ${"a=>".repeat(20_000)}1;`, "too-deep"),
  hostile("source nested in questions", `const f = ${"1?".repeat(10_000)}1${":1".repeat(10_000)};`, "too-deep"),
  hostile("source nested in templates", `const f = ${"`${".repeat(10_000)}1${"}`".repeat(10_000)};`, "too-deep"),
  hostile("source nested in ifs", `${"if(1)".repeat(12_000)};`, "too-deep"),
  hostile("source nested in else", `${"if(1)wait(1);else ".repeat(3_000)}wait(1);`, "too-deep"),
  hostile("source of one long sum", `const x = ${"1+".repeat(30_000)}1;`, "too-deep"),
  hostile("source of one long chain", `square.all${".on()".repeat(10_000)};`, "too-deep"),
  hostile("source of power signs", `const x = ${"2**".repeat(20_000)}1;`, "too-deep"),
  hostile(
    "source of types",
    `type A = ${"[".repeat(70)}1${"]".repeat(70)};\nlet a: ${"Array<".repeat(5_000)}number${">".repeat(5_000)};`,
    "too-deep",
  ),
  hostile("source that is too long", "wait(1);\n".repeat(8_000), "too-long"),
  hostile(
    "nested regular expression",
    `/${"(".repeat(70)}a${")".repeat(70)}/.test("a"); new Array(1e9) + "";`,
    "unused-answer",
    ...TOO_MUCH,
    "too-deep",
  ),
  hostile(
    "deep list for JSON",
    "let a = []; for (let i = 0; i < 200000; i++) a = [a];\nJSON.stringify(a);",
    "calls-itself",
    ...TOO_MUCH,
  ),
  hostile("deep text for JSON", 'JSON.parse("[".repeat(200000));', "calls-itself", "could-not-run", ...TOO_MUCH),
  hostile("doubling text", 'let s = "x"; for (;;) s += s;', ...TOO_MUCH),
  hostile("long padding", '"x".padStart(1e9);', ...TOO_MUCH),
  hostile("long repetition", '"x".repeat(2 ** 29);', ...TOO_MUCH),
  unstoppable("join of a huge list", 'const a = new Array(1e9); console.log(a.join("x").length);'),
  hostile("fill of a huge list", "new Array(2 ** 32 - 1).fill(1);", ...TOO_MUCH),
  unstoppable("search of a huge list", "const a = new Array(2 ** 32 - 1); console.log(a.indexOf(1));"),
  unstoppable("search of a list-like", "Array.prototype.includes.call({ length: 2 ** 53 - 1 }, 1);"),
  unstoppable("reversal of a list-like", "Array.prototype.reverse.call({ length: 2 ** 53 - 1 });"),
  hostile("list from a length", "Array.from({ length: 1e9 });", ...TOO_MUCH),
  unstoppable(
    "endless sort",
    "const a = []; for (let i = 0; i < 300000; i++) a.push((i * 7919) % 300007); for (;;) a.sort();",
  ),
  hostile("endless backtracking", `/^(a+)+$/.test("${"a".repeat(35)}b");`, "unused-answer", ...TOO_MUCH),
  hostile(
    "backtracking in a variable",
    `const found = /^(a+)+$/.test("${"a".repeat(35)}b"); console.log(found);`,
    ...TOO_MUCH,
  ),
  hostile("replacement that blows up", 'let s = "aaaa"; for (;;) s = s.replaceAll("a", "aaaa");', ...TOO_MUCH),
  hostile("split of a long text", 'const s = "x".repeat(5e6); for (;;) { const letters = s.split(""); }', ...TOO_MUCH),
  hostile("lists of lists", "const a = []; for (;;) a.push(new Array(1000).fill(0));", ...TOO_MUCH),
  hostile("growing map", "const m = new Map(); for (let i = 0; ; i++) m.set(i, [i, i]);", ...TOO_MUCH),
  hostile("growing closures", "const a = []; for (let i = 0; ; i++) a.push(() => i);", ...TOO_MUCH),
  hostile("spread of a huge list", "Math.max(...new Array(1e6).fill(1));", ...TOO_MUCH),
  hostile(
    "flat of a list in itself",
    "const a = [1]; a.push(a); a.flat(Infinity);",
    "calls-itself",
    "unused-list",
    ...TOO_MUCH,
  ),
  hostile("list that grows while it is read", "const a = [1]; for (const x of a) a.push(x);", ...TOO_MUCH),
  hostile("promise", "Promise.resolve().then(() => { for (;;) {} });", "no-async"),
  hostile("async", "async function f() { for (;;) await 0; }\nf();", "no-async"),
  hostile("generator", "function* g() { for (;;) yield 1; }\nconsole.log([...g()]);", "no-generator"),
  hostile("proxy", "let p = {}; for (let i = 0; i < 1e5; i++) p = new Proxy(p, {});", "not-here"),
  hostile("whole numbers without end", "let n = 2n; for (;;) n *= n;", "no-bigint"),
  hostile("function from text", "[].map.constructor('return 1')();", "not-a-function", "unknown-skill"),
  hostile(
    "function from a constructor of a constructor",
    "const k = 'constructor'; console.log([][k][k]('return this')());",
    "not-a-function",
    "nothing-there",
    "unknown-skill",
  ),
  hostile("shared prototype", "Array.prototype.map = () => 1;", "can-not-change"),
  hostile("prototype by its name", "const o = {}; o.__proto__.polluted = 1;", "unknown-skill", "can-not-change"),
  hostile(
    "prototype by text",
    'const o = {}; const k = "__proto__"; o[k].polluted = 1;',
    "unknown-skill",
    "can-not-change",
  ),
  hostile(
    "prototype by two texts",
    'const o = {}; const k = "__proto__"; const p = o[k]; p["polluted"] = 1;',
    "can-not-change",
    "nothing-there",
  ),
  hostile("overwriting a word", "wait = () => 1;", "taken-word"),
  hostile("overwriting Math", "Object.assign(Math, { random: () => 0 });", "can-not-change"),
  hostile("the global object", "console.log(globalThis);", "not-here"),
  hostile("the global object by this", "console.log((function () { return this; })());", "no-this"),
  hostile("marks of the engine", "$$l = 3;", "taken-word"),
  hostile("module", 'import("fs").then(fs => fs.readFileSync("/etc/passwd"));', "no-import"),
  hostile("endless notes", 'for (;;) console.log("x".repeat(1e5));', "too-many-notes", ...TOO_MUCH),
  hostile(
    "notes of a list in itself",
    "const a = []; for (let i = 0; i < 200; i++) a.push(a); for (let i = 0; i < 2000; i++) console.log(a);",
    "too-many-notes",
    ...TOO_MUCH,
  ),
  hostile("endless cues", "for (;;) { square.all.on(); wait(0.001); }", "too-many-cues", "too-many-changes"),
  hostile("cues at a standstill", "for (;;) square.all[0].on();", "clock-stood-still"),
  hostile("cues behind the end", "waitUntil(song.end); for (;;) { square.all[0].on(); wait(1); }", "too-many-cues"),
  hostile(
    "endless selections",
    "for (;;) { square.all.shuffled().on(); wait(0.001); }",
    "too-many-changes",
    ...TOO_MUCH,
  ),
  hostile("time without end", "for (;;) wait(1e308);", "not-finite", ...TOO_MUCH),
  hostile("thrown thing with traps", "class T { toString() { for (;;) {} } }\nthrow new T();", "thrown", ...TOO_MUCH),
  hostile("error with a huge text", 'throw new Error("x".repeat(1e7));', "thrown", ...TOO_MUCH),
  hostile(
    "random bytes",
    "\u0000\u0001\uD800\uFFFF😀 let \u200b = ",
    "unreadable",
    "missing-bracket",
    "missing-name",
    "curly-quotes",
    "unknown-word",
  ),
];
