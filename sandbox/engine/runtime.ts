import type { QuickJSContext, QuickJSHandle, QuickJSRuntime, QuickJSWASMModule } from "quickjs-emscripten-core";
import {
  FUEL_LIMIT,
  GUEST_MEMORY_BYTES,
  GUEST_STACK_BYTES,
  JOBS_PER_SLICE,
  MAX_REPORT_LENGTH,
  REPORT_FUEL,
} from "./limits.ts";
import type { GuestReport, GuestTables, GuestWork } from "./guest.ts";
import { LIBRARY } from "./library.generated.ts";

/** How a run of the marked script ended, as the engine tells it. */
export type RuntimeEnd =
  /** To its end or to a problem that the library knows; see the report. */
  | "ended"
  /** All fuel used up. */
  | "out-of-fuel"
  /** The engine could not read the marked script. */
  | "unreadable"
  /** The engine ran out of memory or stack, or failed in a way of its own. */
  | "broken";

export interface RuntimeResult {
  readonly end: RuntimeEnd;
  /** The engine's words, when it failed. */
  readonly details: string;
  /** null when the engine could not even tell that. */
  readonly report: GuestReport | null;
  /** The cues, copied out of the guest; null as above. */
  readonly buffer: Uint8Array | null;
  /** Polls that the script used. */
  readonly fuel: number;
}

/** What a run that the host itself broke gives: its stack ended, memory out of bounds. That is the script's doing. */
export function brokenResult(error: unknown): RuntimeResult {
  const details = error instanceof Error ? `${error.name}: ${error.message}` : String(error);
  return { end: "broken", details, report: null, buffer: null, fuel: 0 };
}

/**
 * One QuickJS, for one run. The module instance is used up by it and dropped whole: nothing of a run
 * can reach the next, and disposing after a failure, which can abort, is never needed.
 */
export class GuestRuntime {
  readonly #runtime: QuickJSRuntime;
  readonly #context: QuickJSContext;
  readonly #library: QuickJSHandle;
  #polls = 0;
  #limit = Infinity;

  /** Loads the library and gives it its tables, which takes most of a run's time. Throws whatever the host throws. */
  constructor(module: QuickJSWASMModule, tables: GuestTables) {
    this.#runtime = module.newRuntime({
      memoryLimitBytes: GUEST_MEMORY_BYTES,
      maxStackSizeBytes: GUEST_STACK_BYTES,
      interruptHandler: () => ++this.#polls > this.#limit,
    });
    this.#context = this.#runtime.newContext({
      intrinsics: {
        BaseObjects: true,
        Eval: true,
        RegExp: true,
        RegExpCompiler: true,
        JSON: true,
        MapSet: true,
        TypedArrays: true,
        StringNormalize: true,
        BigInt: true,
        Date: false,
        Proxy: false,
        Promise: false,
      },
    });
    this.#library = this.#must(this.#context.evalCode(LIBRARY, "library.js"));
    this.#tell("open", tables);
  }

  /** Runs a marked script. Throws whatever the host throws; then this and its module are lost. */
  run({ code, luck }: GuestWork): RuntimeResult {
    this.#tell("deal", luck);
    const compiled = this.#context.evalCode(code, "script.js");
    if (compiled.error)
      return { end: "unreadable", details: this.#describe(compiled.error), report: null, buffer: null, fuel: 0 };
    this.#startFuel(FUEL_LIMIT);
    const ran = this.#context.callFunction(
      this.#context.getProp(this.#library, "run"),
      this.#context.undefined,
      compiled.value,
    );
    const jobsDone = !ran.error && this.#drainJobs();
    const fuel = Math.min(this.#polls, FUEL_LIMIT);
    const isOut = this.#polls > FUEL_LIMIT;
    this.#startFuel(REPORT_FUEL);
    const end = isOut ? "out-of-fuel" : jobsDone ? "ended" : "broken";
    const details = ran.error ? this.#describe(ran.error) : "";
    return { end, details, fuel, report: this.#readReport(), buffer: this.#readBuffer() };
  }

  /** Hands the library something as JSON. */
  #tell(name: "open" | "deal", value: unknown): void {
    const text = this.#context.newString(JSON.stringify(value));
    this.#must(this.#context.callFunction(this.#context.getProp(this.#library, name), this.#context.undefined, text));
  }

  #startFuel(limit: number): void {
    this.#polls = 0;
    this.#limit = limit;
  }

  /** Runs what is left in the job queue under the same fuel. The language has no jobs; this keeps it so. */
  #drainJobs(): boolean {
    while (this.#runtime.hasPendingJob()) {
      const done = this.#runtime.executePendingJobs(JOBS_PER_SLICE);
      if (done.error) return false;
    }
    return true;
  }

  #must(result: { readonly error?: QuickJSHandle; readonly value?: QuickJSHandle }): QuickJSHandle {
    if (result.value !== undefined && result.error === undefined) return result.value;
    throw new Error(`The library did not load: ${result.error === undefined ? "" : this.#describe(result.error)}`);
  }

  /** Name and message of an error of the engine; its fields are the engine's own, so reading them runs no script. */
  #describe(error: QuickJSHandle): string {
    const read = (key: string): string => {
      const value = this.#context.getProp(error, key);
      return this.#context.typeof(value) === "string" ? this.#context.getString(value) : "";
    };
    return `${read("name")}: ${read("message")} ${read("stack")}`.slice(0, 1000);
  }

  #readReport(): GuestReport | null {
    const result = this.#context.callFunction(this.#context.getProp(this.#library, "report"), this.#context.undefined);
    if (result.error) return null;
    const text = this.#context.getString(result.value);
    return text.length > MAX_REPORT_LENGTH ? null : (JSON.parse(text) as GuestReport);
  }

  #readBuffer(): Uint8Array | null {
    const result = this.#context.callFunction(this.#context.getProp(this.#library, "buffer"), this.#context.undefined);
    if (result.error) return null;
    return this.#context.getArrayBuffer(result.value).value.slice();
  }
}
