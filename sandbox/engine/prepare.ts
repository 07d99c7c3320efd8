import { compileScript, type CompiledScript } from "../language/compile.ts";
import type { GuestWork } from "./guest.ts";
import type { RunInput, RunOutcome } from "./model.ts";
import { listNames } from "./tables.ts";

/** A script that can be run, with what the engine needs of it. */
export interface PreparedRun {
  readonly ok: true;
  readonly compiled: CompiledScript;
  readonly work: GuestWork;
}

/** Checks and marks a script; for one that can not be run the outcome. Never throws. */
export function prepareRun(input: RunInput): PreparedRun | Extract<RunOutcome, { ok: false }> {
  const compiled = compileScript(input.source, listNames(input.layout, input.song));
  if (!compiled.ok)
    return { ok: false, problem: compiled.problem, timeline: null, notes: [], findings: [], fuel: 0, cueCount: 0 };
  const { code, streamOf, streams } = compiled.marked;
  return { ok: true, compiled, work: { code, luck: { seed: input.seed >>> 0, streamOf, streams } } };
}
