import { describe, expect, it } from "vitest";
import { buildBoard, findOpeningWeek, listShares, listWeeks, toMonday } from "./board.ts";
import { findFirstPlace, findSlotPlace, stepFrom } from "./board-keys.ts";
import { buildLineup, buildNight, buildSlot } from "./lineup.fixture.ts";
import { listTray } from "./tray.ts";

const MONDAY = "2026-12-07";

describe("listWeeks", () => {
  it("begins with the Monday before the first night and ends with the week of the last", () => {
    expect(listWeeks(buildLineup().season)).toEqual([
      "2026-11-30",
      "2026-12-07",
      "2026-12-14",
      "2026-12-21",
      "2026-12-28",
    ]);
    expect(toMonday("2026-12-13")).toBe("2026-12-07");
  });
  it("opens with tonight's week, or the first while the season is still ahead", () => {
    expect(findOpeningWeek(buildLineup())).toBe(MONDAY);
    expect(findOpeningWeek(buildLineup({ tonight: "2026-11-02" }))).toBe("2026-11-30");
    expect(findOpeningWeek(buildLineup({ tonight: "2027-02-02" }))).toBe("2026-12-28");
  });
});

describe("buildBoard", () => {
  it("tells slots, free times, dark times and closed nights apart", () => {
    const lineup = buildLineup({ slots: [buildSlot("07 17:20 foxes")] });
    lineup.nights[1] = buildNight("2026-12-08", { opensAt: "17:20" });
    const board = buildBoard(lineup, MONDAY);
    expect(board.cells[1]?.[0]).toMatchObject({ kind: "slot", show: { title: "Nine Foxes" } });
    expect(board.cells[0]?.[0]).toMatchObject({ kind: "free", startsAt: "17:00" });
    expect(board.cells[0]?.[1]).toEqual({ kind: "rest", reason: "dark" });
    expect(board.cells[0]?.[6]).toEqual({ kind: "rest", reason: "Market day" });
    expect(board.columns[0]).toMatchObject({ showCount: 1, freeCount: 2 });
  });

  it("keeps a slot outside the offered times in a row of its own, with nothing free in that row", () => {
    const board = buildBoard(buildLineup({ slots: [buildSlot("09 17:35 foxes")] }), MONDAY);
    expect(board.times).toEqual(["17:00", "17:20", "17:35", "17:40"]);
    expect(board.cells[2]?.map((cell) => cell.kind)).toEqual(["rest", "rest", "slot", "rest", "rest", "rest", "rest"]);
  });

  it("shows the worst finding of a slot", () => {
    const slot = buildSlot("07 17:00 foxes");
    const finding = { slotId: slot.id, forwardId: slot.forwardId, cause: "", sentence: "", fix: null };
    const lineup = buildLineup({
      slots: [slot],
      findings: [
        { ...finding, rule: "same-class-twice", severity: "warn" },
        { ...finding, rule: "overlap", severity: "stop" },
      ],
    });
    expect(buildBoard(lineup, MONDAY).cells[0]?.[0]).toMatchObject({ finding: { rule: "overlap" } });
    expect(buildBoard(lineup, MONDAY).columns[0]).toMatchObject({ stopCount: 1, lookCount: 0 });
  });
});

describe("stepFrom", () => {
  const lineup = buildLineup({ slots: [buildSlot("07 17:00 foxes")] });
  lineup.nights[1] = buildNight("2026-12-08", { closedReason: "Storm" });
  const board = buildBoard(lineup, MONDAY);

  it("leaps over what is dark or closed", () => {
    expect(stepFrom(board, { row: 0, column: 0 }, "ArrowRight")).toEqual({ row: 0, column: 2 });
  });
  it("stays at the edge, and where only closed nights follow", () => {
    expect(stepFrom(board, { row: 0, column: 0 }, "ArrowUp")).toEqual({ row: 0, column: 0 });
    expect(stepFrom(board, { row: 0, column: 5 }, "ArrowRight")).toEqual({ row: 0, column: 5 });
  });
  it("begins at the first time free, or at the first slot when nothing is free", () => {
    expect(findFirstPlace(board, (cell) => cell.kind === "free")).toEqual({ row: 1, column: 0 });
    expect(findSlotPlace(board, "slot-07-1700")).toEqual({ row: 0, column: 0 });
    expect(findFirstPlace(buildBoard(lineup, "2026-12-21"))).toBeNull();
  });
});

describe("listTray", () => {
  const lineup = buildLineup({
    slots: [buildSlot("07 17:00 foxes"), buildSlot("07 17:40 foxes"), buildSlot("09 17:00 foxes")],
  });
  it("puts the show with the fewest nights first and counts a night once", () => {
    expect(listTray(lineup, "", "fewest").map(({ show, nightCount }) => [show.title, nightCount])).toEqual([
      ["Slow Snow", 0],
      ["Nine Foxes", 2],
    ]);
  });
  it("finds by title, name or school, whatever the case and the order of the words", () => {
    expect(listTray(lineup, "INTERMEDIATE slow", "title").map(({ show }) => show.title)).toEqual(["Slow Snow"]);
    expect(listTray(lineup, "idris", "title").map(({ show }) => show.title)).toEqual(["Nine Foxes"]);
    expect(listTray(lineup, "moths", "title")).toEqual([]);
  });
});

describe("listShares", () => {
  it("counts shows and slots by school, most slots first", () => {
    const lineup = buildLineup({
      slots: [
        buildSlot("07 17:00 snow"),
        buildSlot("08 17:00 snow"),
        buildSlot("09 17:00 snow"),
        buildSlot("09 17:20 foxes"),
      ],
    });
    expect(listShares(lineup)).toEqual([
      { schoolName: "Quillhaven Intermediate", showCount: 1, slotCount: 3, share: 0.75 },
      { schoolName: "Tarn Road Middle School", showCount: 1, slotCount: 1, share: 0.25 },
    ]);
  });
});
