import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { CompiledScript } from "../language/compile.ts";
import { createFinding, isRunFinding } from "../language/finding.ts";
import { createProblem } from "../language/problem.ts";
import { layoutHash } from "../square/layout-hash.ts";
import { listLights } from "../square/lights.ts";
import { encodeCanonical } from "../timeline/canonical.ts";
import { LANGUAGE_VERSION, type Timeline } from "../timeline/model.ts";
import { decodeTimelineBuffer, type DecodedHead } from "./decode.ts";
import { explainFailure } from "./explain.ts";
import type { GuestFinding, GuestReport } from "./guest.ts";
import type { Finding, Problem, RunInput, RunOutcome, RunReport, ScriptNote } from "./model.ts";
import type { RuntimeResult } from "./runtime.ts";

/** What reading a result takes of a host. */
export interface HashHost {
  /** SHA-256 as lower-case hex. */
  sha256(bytes: Uint8Array): Promise<string> | string;
  /** UTF-8. */
  encodeText(text: string): Uint8Array;
}

/** The outcome of a run, from what the engine gave back; a value for any result. */
export async function finishRun(
  host: HashHost,
  input: RunInput,
  compiled: CompiledScript,
  result: RuntimeResult,
): Promise<RunOutcome> {
  const hash = await layoutHash(input.layout, async (text) => host.sha256(host.encodeText(text)));
  const problem = explainFailure(compiled, result);
  const head: DecodedHead = {
    language: LANGUAGE_VERSION,
    songId: input.songId,
    layoutHash: hash,
    seed: input.seed >>> 0,
    lightCount: listLights(input.layout).length,
    endTick: (input.song.beats.length - 1) * TICKS_PER_BEAT,
    isComplete: problem === null,
  };
  const decoded = readTimeline(result, head, compiled);
  const report = readReport(compiled, result, decoded.timeline);
  const stopped = problem ?? decoded.problem;
  if (stopped !== null || decoded.timeline === null)
    return {
      ok: false,
      problem: stopped ?? wholeScriptProblem(compiled, "No result."),
      timeline: decoded.timeline,
      ...report,
    };
  return {
    ok: true,
    timeline: decoded.timeline,
    hash: await host.sha256(encodeCanonical(decoded.timeline)),
    ...report,
  };
}

interface Decoded {
  readonly timeline: Timeline | null;
  readonly problem: Problem | null;
}

/** The timeline of a result; a damaged one, which only a broken engine can hand out, is a problem. */
function readTimeline(result: RuntimeResult, head: DecodedHead, compiled: CompiledScript): Decoded {
  if (result.buffer === null) return { timeline: null, problem: null };
  try {
    return {
      timeline: decodeTimelineBuffer(result.buffer, head, (site) => compiled.marked.sites[site]?.line ?? 1),
      problem: null,
    };
  } catch (error) {
    const details = error instanceof Error ? `${error.name}: ${error.message}` : String(error);
    return { timeline: null, problem: wholeScriptProblem(compiled, details) };
  }
}

function wholeScriptProblem(compiled: CompiledScript, details: string): Problem {
  const [excerpt = ""] = compiled.text.split("\n");
  return createProblem(
    "could-not-run",
    {},
    { range: { line: 1, column: 1, endLine: 1, endColumn: 1 }, excerpt: excerpt.slice(0, 60), details },
  );
}

function readReport(compiled: CompiledScript, result: RuntimeResult, timeline: Timeline | null): RunReport {
  const lineOf = (site: number): number => compiled.marked.sites[site]?.line ?? 1;
  const report: Pick<GuestReport, "notes" | "findings"> = result.report ?? { notes: [], findings: [] };
  const notes: ScriptNote[] = report.notes.map(({ site, text, tick }) => ({ line: lineOf(site), text, tick }));
  const ofRun = report.findings.flatMap((finding) => toFinding(finding, lineOf) ?? []);
  return { notes, findings: [...compiled.findings, ...ofRun], fuel: result.fuel, cueCount: timeline?.cues.count ?? 0 };
}

function toFinding(finding: GuestFinding, lineOf: (site: number) => number): Finding | null {
  if (!isRunFinding(finding.rule)) return null;
  const moments = [...new Set(finding.ticks)].sort((a, b) => a - b);
  return createFinding(finding.rule, finding.values, { moments, lines: [lineOf(finding.site)] });
}
