import { describe, expect, it } from "vitest";
import type { Comment, CommentAnchor } from "../../../../shared/contracts/marking.ts";
import { buildTimeline } from "../../../../sandbox/timeline/build.ts";
import { placeComments, presentAnchor, presentMoment } from "./comment-place.ts";

const SONG = {
  bars: [
    { number: 0, start: 0, beats: 1 },
    { number: 1, start: 1, beats: 4 },
    { number: 2, start: 5, beats: 4 },
  ],
};

/** Line 3 lights something at beat 1, line 7 (called from line 12) at beat 5; line 4 lights nothing. */
const TIMELINE = buildTimeline(
  { language: 1, songId: "bells", layoutHash: "0".repeat(64), seed: 1, lightCount: 2, endTick: 9600, isComplete: true },
  [
    { tick: 960, action: "on", lights: [0], level: 10_000, chain: [3] },
    { tick: 4800, action: "on", lights: [1], level: 10_000, chain: [12, 7] },
  ],
);

function buildComment(id: string, anchor: CommentAnchor, createdAt = 0): Comment {
  return {
    id: id,
    authorName: "Ms Marlow",
    isMine: true,
    isTeacher: true,
    versionNumber: 1,
    anchor,
    body: id,
    createdAt,
  };
}

describe("placeComments", () => {
  it("gives a line the flag of its first cue, and a moment the line that lights it", () => {
    const placed = placeComments(
      [buildComment("moment", { kind: "moment", tick: 5000 }), buildComment("line", { kind: "lines", from: 2, to: 3 })],
      TIMELINE,
      SONG,
    );
    expect(placed.map(({ comment, number, line, tick, place }) => [comment.id, number, line, tick, place])).toEqual([
      ["line", 1, 3, 960, "lines 2 to 3"],
      ["moment", 2, 7, 5000, "bar 2"],
    ]);
  });

  it("numbers down the script and puts comments on the whole last", () => {
    const placed = placeComments(
      [
        buildComment("whole", { kind: "whole" }),
        buildComment("late", { kind: "lines", from: 9, to: 9 }),
        buildComment("early", { kind: "lines", from: 4, to: 4 }),
      ],
      TIMELINE,
      SONG,
    );
    expect(placed.map(({ comment, line, tick }) => [comment.id, line, tick])).toEqual([
      ["early", 4, null],
      ["late", 9, null],
      ["whole", null, null],
    ]);
  });

  it("keeps lines and moments apart from a script that did not run", () => {
    const [placed] = placeComments([buildComment("moment", { kind: "moment", tick: 100 })], null, SONG);
    expect(placed).toMatchObject({ line: null, tick: 100, place: "before bar 1" });
  });
});

describe("presentAnchor", () => {
  it("says a line, a span of lines, a bar, or the whole", () => {
    expect(presentAnchor({ kind: "lines", from: 6, to: 6 }, SONG)).toBe("line 6");
    expect(presentAnchor({ kind: "whole" }, SONG)).toBe("the whole show");
    expect(presentMoment(960, SONG)).toBe("bar 1");
    expect(presentMoment(1_000_000, SONG)).toBe("bar 2");
  });
});
