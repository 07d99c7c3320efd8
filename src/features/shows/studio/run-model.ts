import type { Finding, RunOutcome } from "../../../../sandbox/engine/model.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";

/** What the studio knows of runs. Kept in one object, so that a late answer can be told from a new one. */
export interface RunState {
  /** The number of the newest run that was heard of; answers to older ones are dropped. */
  readonly run: number;
  readonly isRunning: boolean;
  /** The newest outcome, good or not. */
  readonly outcome: RunOutcome | null;
  /** The source of that outcome. */
  readonly ranSource: string | null;
  /** The last timeline that was complete: what is on stage. */
  readonly onStage: Timeline | null;
  /** What the show check found in `onStage`; null while it has not been looked at. */
  readonly checked: readonly Finding[] | null;
  /** Why a run came to nothing (the worker failed), in words. */
  readonly failure: string | null;
}

export type RunEvent =
  | { readonly type: "started"; readonly run: number }
  | { readonly type: "finished"; readonly run: number; readonly source: string; readonly outcome: RunOutcome }
  | { readonly type: "failed"; readonly run: number; readonly reason: string }
  | { readonly type: "checked"; readonly timeline: Timeline; readonly findings: readonly Finding[] };

export const FIRST_RUN_STATE: RunState = {
  run: 0,
  isRunning: false,
  outcome: null,
  ranSource: null,
  onStage: null,
  checked: null,
  failure: null,
};

export function reduceRun(state: RunState, event: RunEvent): RunState {
  if (event.type === "checked") return event.timeline === state.onStage ? { ...state, checked: event.findings } : state;
  if (event.run < state.run) return state;
  const heard = { ...state, run: event.run, isRunning: event.type === "started", failure: null };
  if (event.type === "started") return heard;
  if (event.type === "failed") return { ...heard, failure: event.reason };
  const { outcome, source } = event;
  if (!outcome.ok) return { ...heard, outcome, ranSource: source };
  return { ...heard, outcome, ranSource: source, onStage: outcome.timeline, checked: null };
}

/** What the ribbon shows: the newest run as far as it came, else what is on stage. */
export function findRibbonTimeline({ outcome, onStage }: RunState): Timeline | null {
  return outcome?.timeline ?? onStage;
}

/** All findings about the newest run: those of the run itself, then those of the show check. */
export function listFindings({ outcome, checked }: RunState): readonly Finding[] {
  return outcome?.ok
    ? [...outcome.findings, ...(checked ?? [])].sort((a, b) => RANK[a.severity] - RANK[b.severity])
    : (outcome?.findings ?? []);
}

/** Notes about cables and boxes: nothing that a script is wrong about, and of use to others than its author. */
const SET_UP_RULES: ReadonlySet<string> = new Set(["circuit-inrush", "circuit-everything-on", "relay-wear"]);

/** The findings for the author of a script, and the notes for whoever sets up the square. */
export function splitFindings(findings: readonly Finding[]): { readonly own: Finding[]; readonly setUp: Finding[] } {
  const isSetUp = ({ rule, severity }: Finding) => severity === "note" && SET_UP_RULES.has(rule);
  return { own: findings.filter((finding) => !isSetUp(finding)), setUp: findings.filter(isSetUp) };
}

const RANK = { stop: 0, warn: 1, note: 2 } as const;

/** Lines that wrote a cue of the timeline, rising. */
export function listActLines(timeline: Timeline | null): readonly number[] {
  if (!timeline) return [];
  const lines = new Set<number>();
  for (const chain of timeline.chains) {
    const line = chain.at(-1);
    if (line !== undefined) lines.add(line);
  }
  return [...lines].sort((a, b) => a - b);
}

/** Why the preview is gentle by itself, or null when the flash check has passed. */
export function findGentleReason({ onStage, checked }: RunState): string | null {
  if (!onStage) return null;
  if (checked === null) return "The flash check is not done yet.";
  const isFlashing = checked.some((finding) => finding.severity === "stop" && finding.rule.includes("flash"));
  return isFlashing ? "This show flashes too often. See Check." : null;
}

/** One sentence about the newest run, for the live region and the script's head. */
export function presentRun(state: RunState): string {
  const { isRunning, outcome, failure } = state;
  if (failure) return failure;
  if (!outcome) return isRunning ? "Running." : "Not run yet.";
  if (!outcome.ok) return `Line ${outcome.problem.range.line}: ${outcome.problem.sentence.replaceAll("`", "")}`;
  return outcome.cueCount === 1 ? "Ran: 1 cue." : `Ran: ${outcome.cueCount} cues.`;
}
