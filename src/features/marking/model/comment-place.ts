import type { Comment, CommentAnchor } from "../../../../shared/contracts/marking.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";

/** A comment with its number on the desk and where it is shown: below a line, at a moment, or both. */
export interface PlacedComment {
  readonly comment: Comment;
  readonly number: number;
  /** The line it stands below; null for the whole. */
  readonly line: number | null;
  /** The tick of its flag; null when its line lights nothing. */
  readonly tick: number | null;
  /** "line 6", "lines 5 to 8", "bar 21", "the whole show". */
  readonly place: string;
}

/** The comments in reading order: down the script, then those on the whole. `timeline` is null when the script did not run. */
export function placeComments(
  comments: readonly Comment[],
  timeline: Timeline | null,
  song: Pick<BeatMap, "bars">,
): readonly PlacedComment[] {
  return comments
    .map((comment) => ({
      comment,
      ...placeAnchor(comment.anchor, timeline),
      place: presentAnchor(comment.anchor, song),
    }))
    .sort(
      (a, b) =>
        (a.line ?? Infinity) - (b.line ?? Infinity) ||
        (a.tick ?? Infinity) - (b.tick ?? Infinity) ||
        a.comment.createdAt - b.comment.createdAt,
    )
    .map((placed, index) => ({ ...placed, number: index + 1 }));
}

function placeAnchor(anchor: CommentAnchor, timeline: Timeline | null): { line: number | null; tick: number | null } {
  if (anchor.kind === "whole") return { line: null, tick: null };
  if (anchor.kind === "lines")
    return { line: anchor.to, tick: timeline && findFirstTick(timeline, anchor.from, anchor.to) };
  return { line: timeline && findLineAt(timeline, anchor.tick), tick: anchor.tick };
}

/** The first moment at which one of these lines lights something. */
function findFirstTick(timeline: Timeline, from: number, to: number): number | null {
  const { cues, chains } = timeline;
  for (let cue = 0; cue < cues.count; cue += 1)
    if (chains[cues.chain[cue] ?? -1]?.some((line) => line >= from && line <= to)) return cues.tick[cue] ?? null;
  return null;
}

/** The innermost line of the cue that was last given at a moment: where a reader looks for what was meant. */
function findLineAt(timeline: Timeline, tick: number): number | null {
  const { cues, chains } = timeline;
  let last: number | null = null;
  for (let cue = 0; cue < cues.count && (cues.tick[cue] ?? 0) <= tick; cue += 1)
    last = chains[cues.chain[cue] ?? -1]?.at(-1) ?? last;
  return last;
}

/** "bar 21", or "before bar 1" of a pick-up. */
export function presentMoment(tick: number, { bars }: Pick<BeatMap, "bars">): string {
  const beat = tick / TICKS_PER_BEAT;
  const bar = bars.findLast((candidate) => candidate.start <= beat) ?? bars[0];
  return bar && bar.number > 0 ? `bar ${bar.number}` : "before bar 1";
}

export function presentAnchor(anchor: CommentAnchor, song: Pick<BeatMap, "bars">): string {
  if (anchor.kind === "whole") return "the whole show";
  if (anchor.kind === "moment") return presentMoment(anchor.tick, song);
  return anchor.from === anchor.to ? `line ${anchor.from}` : `lines ${anchor.from} to ${anchor.to}`;
}
