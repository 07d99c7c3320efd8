import { hostile, type HostileScript } from "../hostile-script.ts";

/** What would run later or bit by bit: promises, generators, proxies and what watches memory. */
export const LATER: readonly HostileScript[] = [
  hostile("promise", "Promise.resolve().then(() => { for (;;) {} });", "no-async", "ReferenceError"),
  hostile("chain of promises", "const f = () => Promise.resolve().then(f);\nf();", "no-async", "ReferenceError"),
  hostile("async", "async function f() { for (;;) await 0; }\nf();", "no-async", "TypeError"),
  hostile(
    "async that allocates",
    "async function f() { const a = []; for (;;) { await 0; a.push(new Array(1000)); } }\nf();",
    "no-async",
    "TypeError",
  ),
  hostile(
    "async generator",
    "async function* g() { for (;;) yield 1; }\n(async () => { for await (const x of g()) {} })();",
    "no-async",
    "TypeError",
  ),
  hostile("thenable", "async function f() { await { then(ok) { for (;;) {} } }; }\nf();", "no-async", "TypeError"),
  hostile("generator", "function* g() { for (;;) yield 1; }\nconsole.log([...g()]);", "no-generator", "out of memory"),
  hostile("generator of generators", "function* g() { yield* g(); }\ng().next();", "no-generator", "stack overflow"),
  hostile("proxy", "let p = {}; for (let i = 0; i < 1e5; i++) p = new Proxy(p, {});", "not-here", "ReferenceError"),
  hostile("reflection", "Reflect.ownKeys(square).forEach(k => console.log(k));", "not-here", "ReferenceError"),
  hostile(
    "cleaning up",
    "const r = new FinalizationRegistry(() => { for (;;) {} }); for (;;) r.register({}, 1);",
    "unknown-word",
    "ReferenceError",
  ),
  hostile(
    "shared memory",
    "const b = new SharedArrayBuffer(1e9); Atomics.wait(new Int32Array(b), 0, 0);",
    "unknown-word",
    "ReferenceError",
  ),
];
