import type { EngineHost } from "../../sandbox/engine/engine.ts";
import type { GuestLuck, GuestReport } from "../../sandbox/engine/guest.ts";
import { GuestRuntime } from "../../sandbox/engine/runtime.ts";
import { buildTables } from "../../sandbox/engine/tables.ts";
import { GLOBAL_WORDS, MARK_PREFIX as M } from "../../sandbox/language/words.ts";
import type { RunEnd } from "./ends.ts";
import type { StraightInput } from "./straight-client.ts";

/**
 * Runs a text in the engine as it is: no dialect check, no count of brackets, no types taken off, no
 * marks at its calls, and the marks of the engine in its reach. What holds then is the engine itself.
 * `end`: see `describeEnd`; `digest`: of failure, notes, findings, and the cues as the engine wrote them.
 */
export async function runStraight(host: EngineHost, { source, layout, song, seed }: StraightInput): Promise<RunEnd> {
  const luck: GuestLuck = { seed, streamOf: [0], streams: [[1, 2, 3]] };
  const words = GLOBAL_WORDS.join(",");
  const code = `(function(${M}w,${M}){"use strict";const {${words}}=${M}w;(()=>{\n${source}\n})()})`;
  const module = await host.newModule();
  try {
    const { end, report, buffer, fuel } = new GuestRuntime(module, buildTables(layout, song)).run({ code, luck });
    const said = host.encodeText(JSON.stringify([report?.failure, report?.notes, report?.findings]));
    const kept = new Uint8Array(said.length + (buffer?.length ?? 0));
    kept.set(said);
    if (buffer !== null) kept.set(buffer, said.length);
    return { end: describeEnd(end, report), digest: await host.sha256(kept), fuel, timeline: "" };
  } catch (error) {
    return { end: "host error", digest: error instanceof Error ? error.name : String(error), fuel: 0, timeline: "" };
  }
}

/**
 * How a run ended in one or two words: "ran", a code of the library, the name of an error of the engine
 * (its message for an internal one, "thrown" for the script's own), "out-of-fuel", "unreadable", "broken".
 */
function describeEnd(end: string, report: GuestReport | null): string {
  if (end !== "ended") return end;
  if (report === null) return "no report";
  const { failure } = report;
  if (failure === null) return "ran";
  if (failure.code !== "engine") return failure.code;
  return failure.name === "InternalError" ? (failure.message ?? "") : (failure.name ?? "");
}
