import { describe, expect, it } from "vitest";
import type { ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { applyChange, type Change, findObstacle, invertChange, presentChange } from "./change.ts";
import { buildLineup, buildSlot } from "./lineup.fixture.ts";
import { findPublishObstacle, listPublicationChanges } from "./publication.ts";

const foxes = buildSlot("07 17:00 foxes");
const snow = buildSlot("08 17:20 snow");
const lineup = buildLineup({ slots: [foxes, snow] });
const moveFoxesOntoSnow: Change = { kind: "move", slotId: foxes.id, nightId: snow.nightId, startsAt: snow.startsAt };

describe("applyChange", () => {
  it("swaps when the time is taken", () => {
    const after = applyChange(lineup, moveFoxesOntoSnow);
    expect(after.slots.map((slot) => [slot.id, slot.nightId, slot.startsAt])).toEqual([
      [foxes.id, snow.nightId, "17:20"],
      [snow.id, foxes.nightId, "17:00"],
    ]);
  });
  it("leaves the plan as it was when a slot is moved onto itself", () => {
    expect(
      applyChange(lineup, { kind: "move", slotId: foxes.id, nightId: foxes.nightId, startsAt: "17:00" }).slots,
    ).toEqual(lineup.slots);
  });
});

describe("invertChange", () => {
  const changes: Change[] = [
    { kind: "place", forwardId: foxes.forwardId, nightId: snow.nightId, startsAt: "17:40" },
    moveFoxesOntoSnow,
    { kind: "pin", slotId: foxes.id, isPinned: true },
    { kind: "remove", slotId: snow.id },
  ];
  it.each(changes)("takes back $kind", (change) => {
    const after = applyChange(lineup, change);
    const back = invertChange(lineup, after, change);
    const places = (slots: typeof lineup.slots) => slots.map(({ id: _, ...slot }) => slot);
    expect(back).not.toBeNull();
    if (back) expect(places(applyChange(after, back).slots)).toEqual(places(lineup.slots));
  });
  it("keeps the pin of a slot that was taken off", () => {
    const pinned = buildLineup({ slots: [buildSlot("07 17:00 foxes", true)] });
    expect(invertChange(pinned, buildLineup(), { kind: "remove", slotId: foxes.id })).toMatchObject({
      kind: "place",
      isPinned: true,
    });
  });
  it("gives nothing when the slot was taken off meanwhile", () => {
    expect(invertChange(lineup, buildLineup(), moveFoxesOntoSnow)).toBeNull();
  });
});

describe("findObstacle", () => {
  it("names the show in the way of a placing", () => {
    expect(
      findObstacle(lineup, { kind: "place", forwardId: foxes.forwardId, nightId: snow.nightId, startsAt: "17:20" }),
    ).toContain("Slow Snow is there");
  });
  it("keeps pinned shows where they are, as the one moved and as the one in the way", () => {
    const pinned = buildLineup({ slots: [foxes, { ...snow, isPinned: true }] });
    expect(findObstacle(pinned, moveFoxesOntoSnow)).toContain("Slow Snow is pinned there");
    expect(findObstacle(pinned, { kind: "remove", slotId: snow.id })).toContain("Slow Snow is pinned");
    expect(findObstacle(lineup, moveFoxesOntoSnow)).toBeNull();
  });
});

describe("a night that is over", () => {
  const later = { ...lineup, tonight: "2026-12-08" };
  it("keeps its shows and takes no other", () => {
    expect(findObstacle(later, { kind: "remove", slotId: foxes.id })).toBe("That night is over: it stays as it was.");
    expect(
      findObstacle(later, { kind: "place", forwardId: snow.forwardId, nightId: foxes.nightId, startsAt: "17:40" }),
    ).toBe("That night is over.");
    expect(findObstacle(later, { kind: "remove", slotId: snow.id })).toBeNull();
  });
});

describe("presentChange", () => {
  it("says where a show went and which one it changed places with", () => {
    expect(presentChange(lineup, moveFoxesOntoSnow)).toBe(
      "Nine Foxes moved to Tuesday 8 December, 17:20. Slow Snow took its place.",
    );
  });
});

describe("publication", () => {
  const published = (text: string, title: string): ProgrammeShow => {
    const slot = buildSlot(text);
    return {
      slotId: slot.id,
      date: `2026-12-${text.slice(0, 2)}`,
      startsAt: slot.startsAt,
      title,
      publicName: "",
      schoolName: "",
      songTitle: "",
      seconds: 1,
      description: "",
      ribbon: null,
    };
  };
  it("lists what is new, moved and gone, in the order of the nights", () => {
    const moved = { ...published("07 17:00 foxes", "Nine Foxes"), startsAt: "17:40" };
    expect(listPublicationChanges(lineup, [moved, published("12 17:00 moths", "Paper Moths")])).toEqual([
      {
        slotId: foxes.id,
        kind: "moved",
        title: "Nine Foxes",
        place: "from Monday 7 December, 17:40 to Monday 7 December, 17:00",
      },
      { slotId: snow.id, kind: "new", title: "Slow Snow", place: "Tuesday 8 December, 17:20" },
      { slotId: "slot-12-1700", kind: "gone", title: "Paper Moths", place: "Saturday 12 December, 17:00" },
    ]);
  });
  it("is held up by stops, and by nothing to publish", () => {
    const stop = {
      rule: "overlap",
      severity: "stop",
      slotId: null,
      forwardId: null,
      cause: "",
      sentence: "",
      fix: null,
    } as const;
    expect(findPublishObstacle({ ...lineup, findings: [stop] })).toBe("1 stop to clear, then it can go out.");
    expect(findPublishObstacle(buildLineup())).toBe("No show is placed yet.");
    expect(findPublishObstacle({ ...lineup, publication: { number: 1, publishedAt: 0, by: "Petra Holm" } })).toBe(
      "Nothing changed since the last publication.",
    );
    expect(findPublishObstacle({ ...lineup, changeCount: 2 })).toBeNull();
  });
});
