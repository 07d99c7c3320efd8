import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import type { Finding, Problem, RunOutcome } from "../engine/model.ts";
import { encodeTimeline } from "../timeline/codec.ts";
import { describeShow } from "../timeline/describe.ts";
import { ribbonCells, type RibbonCells } from "../timeline/ribbon.ts";
import { checkShow, mergeFindings } from "./index.ts";

/** Everything that is kept of a run: what came out of it, what was found in it, and its pictures. */
export interface JudgedRun {
  /** Null when the script ran to its end. */
  readonly problem: Problem | null;
  /** SHA-256 of the show in hex; null when there was a problem. */
  readonly hash: string | null;
  readonly cueCount: number;
  /** Of the run and of the show check, grave ones first. */
  readonly findings: readonly Finding[];
  /** The timeline as bytes and its ribbon: of what was written before a problem, null when that is nothing. */
  readonly timeline: Uint8Array | null;
  readonly ribbon: RibbonCells | null;
  /** One sentence in words. */
  readonly description: string;
}

/** Gives what is kept of a run on its square and song: checked, drawn and described. */
export function judgeRun(outcome: RunOutcome, layout: Layout, song: BeatMap): JudgedRun {
  const { timeline } = outcome;
  return {
    problem: outcome.ok ? null : outcome.problem,
    hash: outcome.ok ? outcome.hash : null,
    cueCount: outcome.cueCount,
    findings: mergeFindings([outcome.findings, timeline ? checkShow({ timeline, layout, song }) : []]),
    timeline: timeline && encodeTimeline(timeline),
    ribbon: timeline && ribbonCells(timeline, layout),
    description: timeline ? describeShow(timeline, layout, song).summary : "Nothing lights up.",
  };
}
