import { hostile, type HostileScript } from "../hostile-script.ts";

/** Functions that call themselves, directly and by way of everything that calls back. */
export const RECURSION: readonly HostileScript[] = [
  hostile("direct recursion", "function f() { f(); }\nf();", "calls-itself", "stack overflow"),
  hostile("mutual recursion", "function a() { b(); }\nfunction b() { a(); }\na();", "calls-itself", "stack overflow"),
  hostile("recursion through repeat", "const f = () => repeat(1, f);\nf();", "calls-itself", "calls-itself"),
  hostile(
    "recursion through at and inTurn",
    "const f = () => at(1, () => square.all.inTurn(0, f));\nf();",
    "calls-itself",
    "calls-itself",
  ),
  hostile(
    "recursion through sort",
    "const f = () => [2, 1].toSorted(() => f());\nf();",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through replace",
    'const f = () => "a".replace(/a/, () => f());\nf();',
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through toString",
    "class T { toString() { return `${new T()}`; } }\nconsole.log(`${new T()}`);",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through valueOf",
    "const o = { valueOf() { return o + 1; } };\nconsole.log(o + 1);",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through JSON",
    "const o = { toJSON() { return JSON.stringify(o); } };\nJSON.stringify(o);",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through JSON.parse",
    'const f = () => JSON.parse("[1]", f);\nf();',
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursion through a getter",
    "const o = { get x() { return o.x; } };\nconsole.log(o.x);",
    "no-accessor",
    "stack overflow",
  ),
  hostile(
    "recursion with many arguments",
    "const f = (...a) => f(...a, 1, 2, 3);\nf();",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "recursive constructor",
    "class A { constructor() { new A(); } }\nnew A();",
    "calls-itself",
    "stack overflow",
  ),
  hostile("recursive default", "function f(a = f()) { return a; }\nf();", "calls-itself", "stack overflow"),
  hostile(
    "two hundred calls deep",
    "function f(n) { if (n > 0) f(n - 1); }\nf(200);",
    "calls-itself",
    "stack overflow",
  ),
  hostile("recursion that swallows its end", "function f() { try { f(); } catch { f(); } }\nf();", "no-try", "killed"),
  hostile(
    "deep list for JSON",
    "let a = []; for (let i = 0; i < 200000; i++) a = [a];\nJSON.stringify(a);",
    "calls-itself",
    "stack overflow",
  ),
  hostile("deep text for JSON", 'JSON.parse("[".repeat(200000));', "calls-itself", "SyntaxError"),
  hostile(
    "deep list for text",
    "let a = []; for (let i = 0; i < 200000; i++) a = [a];\nconst s = String(a);\nconsole.log(s);",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "flat of a list in itself",
    "const a = [1]; a.push(a); const b = a.flat(Infinity);\nconsole.log(b);",
    "calls-itself",
    "stack overflow",
  ),
  hostile(
    "deep chain of classes",
    "let C = class {}; for (let i = 0; i < 20000; i++) C = class extends C {};\nnew C();",
    "calls-itself",
    "stack overflow",
  ),
];
