import { describe, expect, it } from "vitest";
import { parseDeskKey } from "./desk-keys.ts";
import { buildQueueRow, buildRubric } from "./marking.fixture.ts";
import { findNeighbour, findNextToMark, orderQueue, presentQueue } from "./queue.ts";
import { countPoints, findCurrent, findReleaseObstacle, pressLevel } from "./rubric.ts";

const rows = orderQueue([
  buildQueueRow("zoe", { state: "marked", handedInAt: 1 }),
  buildQueueRow("june", { handedInAt: 30 }),
  buildQueueRow("dara", { state: "revise", handedInAt: 5 }),
  buildQueueRow("ada", { handedInAt: 20 }),
]);

describe("orderQueue", () => {
  it("puts the longest waiting first, then sent back, then marked", () => {
    expect(rows.map((row) => row.submissionId)).toEqual(["ada", "june", "dara", "zoe"]);
  });
  it("gives neighbours in that order and nothing past the ends", () => {
    expect(findNeighbour(rows, "ada", 1)?.submissionId).toBe("june");
    expect(findNeighbour(rows, "ada", -1)).toBeNull();
    expect(findNeighbour(rows, "zoe", 1)).toBeNull();
    expect(findNeighbour(rows, "nobody", 1)).toBeNull();
  });
  it("goes on to what waits below, else above, never to itself", () => {
    expect(findNextToMark(rows, "ada")?.submissionId).toBe("june");
    expect(findNextToMark(rows, "june")?.submissionId).toBe("ada");
    expect(findNextToMark([buildQueueRow("ada")], "ada")).toBeNull();
  });
  it("is counted in words", () => {
    expect(presentQueue(rows)).toBe("2 to mark, 1 sent back");
  });
});

describe("pressLevel", () => {
  const rubric = buildRubric();
  it("sets the current criterion and goes on to the next", () => {
    const first = pressLevel(rubric, { levels: {}, currentId: "song" }, 3);
    expect(first).toEqual({ levels: { song: 3 }, currentId: "loop" });
    expect(pressLevel(rubric, { ...first, currentId: "square" }, 4)).toEqual({
      levels: { song: 3, square: 4 },
      currentId: "square",
    });
  });
  it("ignores levels that the rubric does not have", () => {
    const state = { levels: {}, currentId: "song" };
    expect(pressLevel(rubric, state, 5)).toBe(state);
    expect(pressLevel(rubric, { levels: {}, currentId: null }, 2)).toEqual({ levels: {}, currentId: null });
  });
  it("begins with the first open criterion and counts points", () => {
    expect(findCurrent(rubric, { song: 2 })).toBe("loop");
    expect(findCurrent(rubric, { song: 2, loop: 1, square: 1 })).toBe("song");
    expect(countPoints(rubric, { song: 2, loop: 4 })).toEqual({ got: 6, of: 12 });
  });
  it("names what is missing before the release", () => {
    expect(findReleaseObstacle(rubric, {})).toBe("3 criteria have no level yet.");
    expect(findReleaseObstacle(rubric, { song: 1, loop: 1 })).toBe("“Uses the square” has no level yet.");
    expect(findReleaseObstacle(rubric, { song: 1, loop: 1, square: 1 })).toBeNull();
  });
});

describe("parseDeskKey", () => {
  const press = (key: string, target: EventTarget | null = document.body, more = {}) =>
    parseDeskKey({ key, target, ctrlKey: false, metaKey: false, altKey: false, ...more });
  const buildElement = (html: string) => {
    const holder = document.createElement("div");
    holder.innerHTML = html;
    return holder.querySelector("[data-me]");
  };

  it("reads levels, moves and the release", () => {
    expect(press("3")).toEqual({ kind: "level", level: 3 });
    expect(press("J")).toEqual({ kind: "next" });
    expect(press("g")).toEqual({ kind: "release" });
    expect(press("5")).toBeNull();
  });
  it("leaves text alone, in fields and in dialogs", () => {
    expect(press("g", buildElement("<textarea data-me></textarea>"))).toBeNull();
    expect(press("1", buildElement("<div role='dialog'><p data-me></p></div>"))).toBeNull();
  });
  it("takes the digit on a level's own radio button", () => {
    expect(press("2", buildElement("<input type='radio' data-me>"))).toEqual({ kind: "level", level: 2 });
  });
  it("gives Space to the button that has the focus, and plays otherwise", () => {
    expect(press(" ", buildElement("<button data-me></button>"))).toBeNull();
    expect(press(" ")).toEqual({ kind: "play" });
  });
  it("leaves the browser's own shortcuts alone", () => {
    expect(press("c", document.body, { ctrlKey: true })).toBeNull();
  });
});
