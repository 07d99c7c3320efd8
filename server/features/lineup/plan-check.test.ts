import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CHANGEOVER_SECONDS, checkPlan, type Plan, type PlannedShow } from "./plan-check.ts";

const TIMES = ["18:00", "18:02", "18:04", "18:20", "18:40"];

function show(forwardId: string, overrides: Partial<PlannedShow> = {}): PlannedShow {
  return {
    forwardId,
    title: forwardId,
    className: forwardId,
    schoolName: "Tarn Road",
    seconds: 90,
    runs: true,
    stopCount: 0,
    isOnCurrentLayout: true,
    ...overrides,
  };
}

function plan(overrides: Partial<Plan> = {}): Plan {
  return {
    times: TIMES,
    tonight: "2026-12-01",
    nights: [
      { id: "night-fri", date: "2026-12-04", opensAt: "17:30", closesAt: "21:00", closedReason: null },
      { id: "night-sat", date: "2026-12-05", opensAt: "17:30", closesAt: "21:00", closedReason: null },
    ],
    slots: [],
    shows: [],
    ...overrides,
  };
}

const slot = (forwardId: string, startsAt: string, nightId = "night-fri") => ({
  id: `slot-${forwardId}`,
  nightId,
  startsAt,
  forwardId,
});
const rules = (of: Plan) => checkPlan(of).map((finding) => `${finding.severity} ${finding.rule}`);

describe("checkPlan", () => {
  it("says nothing about shows that fit", () => {
    expect(
      checkPlan(
        plan({ shows: [show("bells"), show("frost")], slots: [slot("bells", "18:00"), slot("frost", "18:20")] }),
      ),
    ).toEqual([]);
  });

  it("lets a show start the second the changeover ends, and stops it one second earlier", () => {
    const ending = (seconds: number) =>
      plan({
        shows: [show("bells", { seconds }), show("frost")],
        slots: [slot("bells", "18:00"), slot("frost", "18:02")],
      });
    expect(rules(ending(120 - CHANGEOVER_SECONDS))).toEqual([]);
    expect(rules(ending(121 - CHANGEOVER_SECONDS))).toEqual(["stop overlap"]);
  });

  it("offers the nearest free time of the same night for an overlap", () => {
    const [finding] = checkPlan(
      plan({ shows: [show("bells"), show("frost")], slots: [slot("bells", "18:00"), slot("frost", "18:02")] }),
    );
    expect(finding).toMatchObject({
      rule: "overlap",
      slotId: "slot-frost",
      sentence: '"bells" and the changeover last until 18:03, but "frost" starts at 18:02.',
      fix: { kind: "move", nightId: "night-fri", startsAt: "18:04", label: "Move to 18:04" },
    });
  });

  it("lets a show end at quiet hour to the second", () => {
    const closing = (closesAt: string, seconds: number) =>
      plan({
        nights: [{ id: "night-fri", date: "2026-12-04", opensAt: "17:30", closesAt, closedReason: null }],
        shows: [show("bells", { seconds })],
        slots: [slot("bells", "18:40")],
      });
    expect(rules(closing("18:42", 120))).toEqual([]);
    expect(rules(closing("18:42", 121))).toEqual(["stop past-quiet-hour"]);
  });

  it("counts a time after midnight to the night before", () => {
    const late = plan({
      times: ["23:50", "00:10"],
      nights: [{ id: "night-fri", date: "2026-12-04", opensAt: "20:00", closesAt: "00:30", closedReason: null }],
      shows: [show("bells"), show("frost")],
      slots: [slot("bells", "00:10"), slot("frost", "23:50")],
    });
    expect(checkPlan(late)).toEqual([]);
  });

  it("stops a show before the night opens", () => {
    const early = plan({
      nights: [{ id: "night-fri", date: "2026-12-04", opensAt: "18:10", closesAt: "21:00", closedReason: null }],
      shows: [show("bells")],
      slots: [slot("bells", "18:00")],
    });
    expect(checkPlan(early)[0]).toMatchObject({
      severity: "stop",
      cause: "before the night opens",
      fix: { startsAt: "18:20" },
    });
  });

  it("moves a show off a closed night to the nearest open one, or off the plan when there is none", () => {
    const closed = {
      id: "night-fri",
      date: "2026-12-04",
      opensAt: "17:30",
      closesAt: "21:00",
      closedReason: "Market day",
    };
    const of = plan({ nights: [closed, plan().nights[1]!], shows: [show("bells")], slots: [slot("bells", "18:00")] });
    expect(checkPlan(of)[0]).toMatchObject({
      rule: "closed-night",
      fix: { kind: "move", nightId: "night-sat", startsAt: "18:00", label: "Move to Sat 5 Dec, 18:00" },
    });
    expect(checkPlan({ ...of, nights: [closed] })[0]?.fix).toMatchObject({ kind: "remove" });
  });

  it("stops a show that does not run or has a stop, and takes it off", () => {
    const of = plan({
      shows: [
        show("bells", { runs: false }),
        show("frost", { stopCount: 2 }),
        show("geese", { isOnCurrentLayout: false }),
      ],
      slots: [slot("bells", "18:00"), slot("frost", "18:20"), slot("geese", "18:40")],
    });
    expect(rules(of)).toEqual(["stop does-not-run", "stop show-has-stop", "warn layout-changed"]);
    expect(checkPlan(of)[1]?.fix).toMatchObject({ kind: "remove", slotId: "slot-frost" });
  });

  it("warns of one class twice in a row, not of classes of one name at two schools", () => {
    const two = (schoolName: string) =>
      plan({
        shows: [show("bells", { className: "7B" }), show("frost", { className: "7B", schoolName })],
        slots: [slot("bells", "18:00"), slot("frost", "18:20")],
      });
    expect(rules(two("Tarn Road"))).toEqual(["warn same-class-twice"]);
    expect(rules(two("Intermediate"))).toEqual([]);
  });

  it("notes approved shows without a place", () => {
    expect(checkPlan(plan({ shows: [show("bells")] }))).toEqual([
      expect.objectContaining({ rule: "not-placed", severity: "note", slotId: null, forwardId: "bells", fix: null }),
    ]);
  });

  it("leaves nights that are over alone", () => {
    const of = plan({
      tonight: "2026-12-05",
      shows: [show("bells", { runs: false })],
      slots: [slot("bells", "18:00")],
    });
    expect(checkPlan(of)).toEqual([]);
  });

  it("offers only moves after which that show has no stop of place", () => {
    const places = fc.uniqueArray(
      fc.record({
        night: fc.constantFrom("night-fri", "night-sat"),
        time: fc.constantFrom(...TIMES),
        seconds: fc.integer({ min: 30, max: 900 }),
      }),
      {
        selector: (place) => place.night + place.time,
        maxLength: 8,
      },
    );
    fc.assert(
      fc.property(places, (drawn) => {
        const of = plan({
          shows: drawn.map((place, n) => show(`show-${n}`, { seconds: place.seconds })),
          slots: drawn.map((place, n) => slot(`show-${n}`, place.time, place.night)),
        });
        for (const finding of checkPlan(of)) {
          if (finding.fix?.kind !== "move") continue;
          const { slotId, nightId, startsAt } = finding.fix;
          const moved = {
            ...of,
            slots: of.slots.map((one) => (one.id === slotId ? { ...one, nightId, startsAt } : one)),
          };
          expect(checkPlan(moved).filter((one) => one.slotId === slotId && one.severity === "stop")).toEqual([]);
        }
      }),
      { seed: 7 },
    );
  });
});
