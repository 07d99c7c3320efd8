/**
 * What scripts have of the language's own library: the parts of ECMAScript 2022 that are in, and no
 * more, so that completion offers nothing that a run would refuse. Declared by us from the standard
 * (ECMA-262, 13th edition): the compiler's own text also knows dates, promises and the like.
 */
export const LIBRARY_DECLARATIONS = `
interface Object { toString(): string; valueOf(): Object; hasOwnProperty(key: PropertyKey): boolean }
interface ObjectConstructor {
  new (value?: any): Object; (value?: any): any; readonly prototype: Object;
  keys(of: {}): string[]; values<T>(of: { [key: string]: T } | ArrayLike<T>): T[];
  entries<T>(of: { [key: string]: T } | ArrayLike<T>): [string, T][];
  assign<T extends {}, U>(target: T, source: U): T & U; freeze<T>(value: T): Readonly<T>;
  fromEntries<T>(entries: Iterable<readonly [PropertyKey, T]>): { [key: string]: T };
  hasOwn(of: object, key: PropertyKey): boolean;
}
declare const Object: ObjectConstructor;
interface Function {
  apply(self: any, values?: any): any; call(self: any, ...values: any[]): any; bind(self: any, ...values: any[]): any;
  readonly length: number; readonly name: string; readonly prototype: any; toString(): string;
}
interface FunctionConstructor { readonly prototype: Function }
interface CallableFunction extends Function {}
interface NewableFunction extends Function {}
interface IArguments { [index: number]: any; length: number }
type PropertyKey = string | number | symbol;
type Partial<T> = { [K in keyof T]?: T[K] };
type Required<T> = { [K in keyof T]-?: T[K] };
type Readonly<T> = { readonly [K in keyof T]: T[K] };
type Pick<T, K extends keyof T> = { [P in K]: T[P] };
type Record<K extends keyof any, T> = { [P in K]: T };
type Exclude<T, U> = T extends U ? never : T;
type Extract<T, U> = T extends U ? T : never;
type Omit<T, K extends keyof any> = Pick<T, Exclude<keyof T, K>>;
type NonNullable<T> = T & {};
type ReturnType<T extends (...values: any) => any> = T extends (...values: any) => infer R ? R : any;
type Parameters<T extends (...values: any) => any> = T extends (...values: infer P) => any ? P : never;
interface ThisType<T> {}
interface TemplateStringsArray extends ReadonlyArray<string> { readonly raw: readonly string[] }
interface Symbol { toString(): string }
interface SymbolConstructor { readonly iterator: unique symbol }
declare const Symbol: SymbolConstructor;
interface IteratorYieldResult<T> { done?: false; value: T }
interface IteratorReturnResult<T> { done: true; value: T }
type IteratorResult<T, R = any> = IteratorYieldResult<T> | IteratorReturnResult<R>;
interface Iterator<T, R = any, N = any> { next(...values: [] | [N]): IteratorResult<T, R> }
interface Iterable<T, R = any, N = any> { [Symbol.iterator](): Iterator<T, R, N> }
interface IterableIterator<T, R = any, N = any> extends Iterator<T, R, N> { [Symbol.iterator](): IterableIterator<T, R, N> }
interface ArrayLike<T> { readonly length: number; readonly [index: number]: T }
interface ConcatArray<T> { readonly length: number; readonly [index: number]: T; slice(from?: number, to?: number): T[] }
interface ReadonlyArray<T> extends Iterable<T> {
  readonly length: number; readonly [index: number]: T;
  at(place: number): T | undefined; concat(...more: (T | ConcatArray<T>)[]): T[];
  entries(): IterableIterator<[number, T]>; keys(): IterableIterator<number>; values(): IterableIterator<T>;
  every(test: (value: T, place: number) => unknown): boolean; some(test: (value: T, place: number) => unknown): boolean;
  filter(test: (value: T, place: number) => unknown): T[]; find(test: (value: T, place: number) => unknown): T | undefined;
  findIndex(test: (value: T, place: number) => unknown): number; findLast(test: (value: T, place: number) => unknown): T | undefined;
  forEach(action: (value: T, place: number) => void): void; includes(value: T): boolean;
  indexOf(value: T): number; lastIndexOf(value: T): number; join(between?: string): string;
  map<U>(change: (value: T, place: number) => U): U[]; flat<U>(this: readonly (readonly U[])[]): U[];
  flatMap<U>(change: (value: T, place: number) => U | readonly U[]): U[];
  reduce<U>(step: (sum: U, value: T, place: number) => U, start: U): U; reduce(step: (sum: T, value: T, place: number) => T): T;
  slice(from?: number, to?: number): T[]; toReversed(): T[]; toSorted(compare?: (a: T, b: T) => number): T[];
  toString(): string;
}
interface Array<T> extends ReadonlyArray<T> {
  length: number; [index: number]: T;
  fill(value: T, from?: number, to?: number): this; push(...values: T[]): number; pop(): T | undefined;
  shift(): T | undefined; unshift(...values: T[]): number; reverse(): T[]; sort(compare?: (a: T, b: T) => number): this;
  splice(from: number, count?: number, ...values: T[]): T[];
}
interface ArrayConstructor {
  new <T = any>(length?: number): T[]; <T = any>(length?: number): T[]; readonly prototype: any[];
  isArray(value: any): value is any[]; of<T>(...values: T[]): T[];
  from<T>(list: Iterable<T> | ArrayLike<T>): T[];
  from<T, U>(list: Iterable<T> | ArrayLike<T>, change: (value: T, place: number) => U): U[];
}
declare const Array: ArrayConstructor;
interface String extends Iterable<string> {
  readonly length: number; readonly [index: number]: string;
  at(place: number): string | undefined; charAt(place: number): string; charCodeAt(place: number): number;
  concat(...more: string[]): string; endsWith(end: string): boolean; includes(part: string): boolean;
  indexOf(part: string): number; lastIndexOf(part: string): number; match(pattern: RegExp | string): RegExpMatchArray | null;
  matchAll(pattern: RegExp): IterableIterator<RegExpMatchArray>; padEnd(length: number, fill?: string): string;
  padStart(length: number, fill?: string): string; repeat(times: number): string;
  replace(part: string | RegExp, by: string | ((found: string, ...rest: any[]) => string)): string;
  replaceAll(part: string | RegExp, by: string | ((found: string, ...rest: any[]) => string)): string;
  search(pattern: RegExp): number; slice(from?: number, to?: number): string; split(by: string | RegExp, most?: number): string[];
  startsWith(start: string): boolean; substring(from: number, to?: number): string; toLowerCase(): string;
  toUpperCase(): string; toString(): string; trim(): string; trimEnd(): string; trimStart(): string; valueOf(): string;
}
interface StringConstructor { new (value?: any): String; (value?: any): string; readonly prototype: String; fromCharCode(...codes: number[]): string }
declare const String: StringConstructor;
interface Boolean { valueOf(): boolean }
interface BooleanConstructor { new (value?: any): Boolean; (value?: any): boolean; readonly prototype: Boolean }
declare const Boolean: BooleanConstructor;
interface Number { toFixed(digits?: number): string; toPrecision(digits?: number): string; toString(base?: number): string; valueOf(): number }
interface NumberConstructor {
  new (value?: any): Number; (value?: any): number; readonly prototype: Number;
  isFinite(value: unknown): boolean; isInteger(value: unknown): boolean; isNaN(value: unknown): boolean;
  parseFloat(text: string): number; parseInt(text: string, base?: number): number;
  readonly MAX_SAFE_INTEGER: number; readonly MIN_SAFE_INTEGER: number; readonly MAX_VALUE: number; readonly MIN_VALUE: number; readonly EPSILON: number;
}
declare const Number: NumberConstructor;
interface Math {
  readonly PI: number; readonly E: number; readonly SQRT2: number; readonly LN2: number;
  abs(x: number): number; acos(x: number): number; asin(x: number): number; atan(x: number): number; atan2(y: number, x: number): number;
  cbrt(x: number): number; ceil(x: number): number; cos(x: number): number; exp(x: number): number; floor(x: number): number;
  hypot(...x: number[]): number; log(x: number): number; log10(x: number): number; log2(x: number): number;
  max(...x: number[]): number; min(...x: number[]): number; pow(x: number, y: number): number; random(): number; round(x: number): number;
  sign(x: number): number; sin(x: number): number; sqrt(x: number): number; tan(x: number): number; trunc(x: number): number;
}
declare const Math: Math;
interface Map<K, V> extends Iterable<[K, V]> {
  readonly size: number; clear(): void; delete(key: K): boolean; forEach(action: (value: V, key: K) => void): void;
  get(key: K): V | undefined; has(key: K): boolean; set(key: K, value: V): this;
  entries(): IterableIterator<[K, V]>; keys(): IterableIterator<K>; values(): IterableIterator<V>;
}
interface MapConstructor { new <K = any, V = any>(entries?: Iterable<readonly [K, V]> | null): Map<K, V>; readonly prototype: Map<any, any> }
declare const Map: MapConstructor;
interface Set<T> extends Iterable<T> {
  readonly size: number; add(value: T): this; clear(): void; delete(value: T): boolean;
  forEach(action: (value: T) => void): void; has(value: T): boolean; values(): IterableIterator<T>;
}
interface SetConstructor { new <T = any>(values?: Iterable<T> | null): Set<T>; readonly prototype: Set<any> }
declare const Set: SetConstructor;
interface JSON { parse(text: string): any; stringify(value: any, change?: null, space?: number | string): string }
declare const JSON: JSON;
interface RegExpMatchArray extends Array<string> { index?: number; input?: string; groups?: { [name: string]: string } }
interface RegExp { exec(text: string): RegExpMatchArray | null; test(text: string): boolean; readonly source: string; readonly flags: string; lastIndex: number }
interface RegExpConstructor { readonly prototype: RegExp }
interface Error { name: string; message: string; stack?: string }
interface ErrorConstructor { new (message?: string): Error; (message?: string): Error; readonly prototype: Error }
declare const Error: ErrorConstructor;
declare const NaN: number;
declare const Infinity: number;
declare function isNaN(value: number): boolean;
declare function isFinite(value: number): boolean;
declare function parseInt(text: string, base?: number): number;
declare function parseFloat(text: string): number;
`;
