import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import type { Timeline } from "../timeline/model.ts";

/** What one run needs; the same input gives the same bytes on every host. */
export interface RunInput {
  readonly source: string;
  readonly songId: string;
  readonly song: BeatMap;
  readonly layout: Layout;
  /** 32 bits. */
  readonly seed: number;
}

/** A place in the script: lines and columns count from 1; `end` is exclusive. */
export interface SourceRange {
  readonly line: number;
  readonly column: number;
  readonly endLine: number;
  readonly endColumn: number;
}

/** One thing that stops the script, in words for a 12-year-old. */
export interface Problem {
  /** Stable, kebab-case: an entry of the catalogue in `sandbox/language/problems/`. */
  readonly code: string;
  readonly sentence: string;
  readonly hint: string;
  readonly range: SourceRange;
  readonly excerpt: string;
  /** The original message of the checker or the engine. */
  readonly details?: string;
  /** A certain fix: replace the range by the text. */
  readonly fix?: { readonly range: SourceRange; readonly text: string; readonly label: string };
}

export type Severity = "stop" | "warn" | "note";

/** Something a check says about a run; it stops nothing by itself. */
export interface Finding {
  readonly rule: string;
  readonly severity: Severity;
  readonly sentence: string;
  readonly hint?: string;
  /** Measured value and limit, in the unit named. */
  readonly measured?: { readonly value: number; readonly limit: number; readonly unit: string };
  /** Ticks, sorted; at most 50. */
  readonly moments: readonly number[];
  /** Light ids; at most 50. */
  readonly lights: readonly string[];
  /** Script lines, sorted. */
  readonly lines: readonly number[];
}

/** One `console.log` of the script. */
export interface ScriptNote {
  readonly line: number;
  readonly text: string;
  /** Where the clock was, in ticks. */
  readonly tick: number;
}

export interface RunReport {
  readonly notes: readonly ScriptNote[];
  /** Findings of the run itself (clamped levels, dropped cues, empty groups). */
  readonly findings: readonly Finding[];
  /** Interpreter polls used; one is 10 000 steps. */
  readonly fuel: number;
  readonly cueCount: number;
}

/**
 * A run's outcome is a value, never an exception. `timeline` of a failed run holds what was written
 * before the problem (or null when the script never started).
 */
export type RunOutcome =
  | ({
      readonly ok: true;
      readonly timeline: Timeline;
      /** SHA-256 hex of the canonical light section. */ readonly hash: string;
    } & RunReport)
  | ({ readonly ok: false; readonly problem: Problem; readonly timeline: Timeline | null } & RunReport);
