import type { Finding } from "../engine/model.ts";
import { createLightsCursor } from "../timeline/cursor.ts";
import type { CheckContext } from "./context.ts";
import { SEVERITIES, type CheckRule } from "./severities.ts";

/** A finding holds at most this many moments and lights: enough to show where, not everything. */
export const MOST_PLACES = 50;

/** What a rule says; the rest of a finding follows from the rule. */
export interface FindingParts {
  readonly sentence: string;
  readonly hint?: string;
  readonly measured?: Finding["measured"];
  readonly moments?: Iterable<number>;
  /** Light indexes. */
  readonly lights?: Iterable<number>;
  readonly lines?: Iterable<number>;
}

/** Gives a finding of a rule: places sorted, each once, cut to the most that a finding holds. */
export function buildFinding(context: CheckContext, rule: CheckRule, parts: FindingParts): Finding {
  const { sentence, hint, measured, moments = [], lights = [], lines = [] } = parts;
  return {
    rule,
    severity: SEVERITIES[rule].severity,
    sentence,
    ...(hint === undefined ? {} : { hint }),
    ...(measured === undefined ? {} : { measured }),
    moments: sortedOnce(moments).slice(0, MOST_PLACES),
    lights: sortedOnce(lights)
      .slice(0, MOST_PLACES)
      .flatMap((light) => context.lights[light]?.id ?? []),
    lines: sortedOnce(lines),
  };
}

/** Gives the innermost line of a cue: where the action itself is written. */
export function lineOfCue({ timeline }: Pick<CheckContext, "timeline">, cue: number): number {
  return timeline.chains[timeline.cues.chain[cue] ?? 0]?.at(-1) ?? 1;
}

/** Gives the innermost lines of the cues that light these lights right after a tick; dark ones have none. */
export function linesAt(context: CheckContext, tick: number, lights: Iterable<number>): number[] {
  const cursor = createLightsCursor(context.timeline, context.lights, context.tracks);
  // A rise is timed where its line crosses the step, just before the jump: look right behind it.
  return [...lights].flatMap((light) => {
    const cue = cursor.seekLight(light, tick + 1).cue[light] ?? -1;
    return cue < 0 ? [] : [lineOfCue(context, cue)];
  });
}

function sortedOnce(numbers: Iterable<number>): number[] {
  return [...new Set(numbers)].sort((a, b) => a - b);
}
