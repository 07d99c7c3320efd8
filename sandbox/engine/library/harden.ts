/**
 * Closes the realm before a script runs: no way to compile text, no shared prototype that can be
 * changed, no clock and no second source of luck. The engine leaves out Date, Proxy, WeakRef and
 * promises when it makes the realm (see `runtime.ts`). The bundle keeps the library's own copies of
 * the globals that it goes on using.
 */

/** Globals that stay: what the language has, and what the library itself was built on. */
const KEPT = new Set([
  "Array",
  "Boolean",
  "Error",
  "Infinity",
  "JSON",
  "Map",
  "Math",
  "NaN",
  "Number",
  "Object",
  "RangeError",
  "RegExp",
  "Set",
  "String",
  "TypeError",
  "globalThis",
  "isFinite",
  "isNaN",
  "parseFloat",
  "parseInt",
  "undefined",
]);

/** Prototypes without a global name, by one of their values. */
function hiddenPrototypes(): object[] {
  const found: object[] = [];
  const samples: object[] = [
    [][Symbol.iterator](),
    ""[Symbol.iterator](),
    new Map()[Symbol.iterator](),
    new Set()[Symbol.iterator](),
    "".matchAll(/a/g),
    function* () {}.prototype as object,
    (function* () {})(),
    function* () {},
    async function () {},
    async function* () {},
    async function* () {}.prototype as object,
    new Uint8Array(0),
    new Uint16Array(0),
    new Uint32Array(0),
    Symbol.prototype,
    BigInt.prototype,
    new ArrayBuffer(0),
  ];
  for (const sample of samples) {
    for (
      let proto = Object.getPrototypeOf(sample) as object | null;
      proto !== null;
      proto = Object.getPrototypeOf(proto) as object | null
    )
      found.push(proto);
  }
  return found;
}

/** Errors get a name and a message by assignment; on a frozen prototype that needs a setter. */
function allowOwn(proto: object, key: string): void {
  const inherited = (proto as { [key: string]: unknown })[key];
  Object.defineProperty(proto, key, {
    get: () => inherited,
    set(this: object, value: unknown) {
      Object.defineProperty(this, key, { value, writable: true, enumerable: false, configurable: true });
    },
    enumerable: false,
    configurable: false,
  });
}

/** Freezes a value and everything that can be reached from it by property or prototype. */
function freezeDeep(root: unknown): void {
  const waiting: unknown[] = [root];
  const seen = new Set<unknown>();
  for (let value = waiting.pop(); value !== undefined || waiting.length > 0; value = waiting.pop()) {
    if ((typeof value !== "object" && typeof value !== "function") || value === null || seen.has(value)) continue;
    seen.add(value);
    Object.freeze(value);
    waiting.push(Object.getPrototypeOf(value));
    for (const key of Reflect.ownKeys(value)) {
      const held = Object.getOwnPropertyDescriptor(value, key);
      if (held !== undefined) waiting.push(held.value, held.get, held.set);
    }
  }
}

/** Closes the realm. Runs once, after the library is loaded and before the script is. */
export function harden(random: () => number, roots: readonly unknown[]): void {
  Math.random = random;
  const hidden = hiddenPrototypes();
  for (const proto of [...hidden, Function.prototype]) {
    // What a function's `constructor` gives can compile text.
    const made = Object.getOwnPropertyDescriptor(proto, "constructor")?.value as unknown;
    if (typeof made === "function" && made.name.endsWith("Function"))
      Object.defineProperty(proto, "constructor", { value: undefined });
  }
  for (const kind of [Error, TypeError, RangeError, ReferenceError, SyntaxError, EvalError, URIError]) {
    allowOwn(kind.prototype, "name");
    allowOwn(kind.prototype, "message");
  }
  for (const proto of hidden) freezeDeep(proto);
  const globals = globalThis as { [name: string]: unknown };
  for (const key of Reflect.ownKeys(globals)) {
    // What goes is frozen too: a value of the library may still lead to it.
    if (key !== "globalThis") freezeDeep(globals[key as string]);
    if (typeof key !== "string" || !KEPT.has(key)) delete globals[key as string];
  }
  for (const root of roots) freezeDeep(root);
  Object.freeze(globalThis);
}
