import type { RunOutcome } from "../../sandbox/engine/model.ts";
import { encodeCanonical } from "../../sandbox/timeline/canonical.ts";

/** The end of a run that was ended from outside. */
export const KILLED = "killed";

/** How a run ended; equal on every host. */
export interface RunEnd {
  /** One word: a code, "ran" or "killed". */
  readonly end: string;
  /** Everything else that came out of it, as SHA-256; empty for a run that was ended from outside. */
  readonly digest: string;
  /** Interpreter polls. */
  readonly fuel: number;
  /** SHA-256 of the timeline; empty where there is none, and for what went straight into the engine. */
  readonly timeline: string;
}

/** The end of a run that was ended from outside. */
export const KILLED_END: RunEnd = { end: KILLED, digest: "", fuel: 0, timeline: "" };

/** SHA-256 in hex; both hosts have the same function for it. */
export async function sha256(bytes: Uint8Array): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", bytes.slice());
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, "0")).join("");
}

/** The end of a run through the whole pipeline. */
export async function endOfOutcome(outcome: RunOutcome): Promise<RunEnd> {
  const { notes, findings, fuel, cueCount, timeline } = outcome;
  const problem = outcome.ok ? null : outcome.problem;
  if (problem?.details?.startsWith("Stopped after")) return KILLED_END;
  const cues = timeline === null ? "" : await sha256(encodeCanonical(timeline));
  const said = new TextEncoder().encode(JSON.stringify([problem, notes, findings, cueCount, cues]));
  return { end: problem?.code ?? "ran", digest: await sha256(said), fuel, timeline: cues };
}
