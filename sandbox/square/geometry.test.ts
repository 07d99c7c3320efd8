import { describe, expect, it } from "vitest";
import { SIDES } from "../../shared/sides.ts";
import { DEMO_SQUARE, LARGE_SQUARE } from "../../server/db/seed/world/square.ts";
import { REFERENCE_VIEW, sideGeometry } from "./geometry.ts";
import { listLights } from "./lights.ts";
import { roofPoints } from "./roof-points.ts";
import { everyStep, inParts, paneArea, pathLength } from "./shapes.ts";
import { silhouetteFor } from "./silhouette.ts";

describe("shapes", () => {
  it("measures panes (plane geometry: rectangle, ellipse, Norman window)", () => {
    expect(paneArea({ shape: "rect", x: 0, y: 0, width: 4, height: 3 })).toBe(12);
    expect(paneArea({ shape: "round", x: 0, y: 0, width: 2, height: 2 })).toBeCloseTo(Math.PI, 12);
    // A 2 wide, 3 high arch: a 2 x 2 rectangle under a half circle of radius 1.
    expect(paneArea({ shape: "arch", x: 0, y: 0, width: 2, height: 3 })).toBeCloseTo(4 + Math.PI / 2, 12);
  });

  it("cuts a path into equal parts and takes their middles", () => {
    const corner = [
      { x: 0, y: 0 },
      { x: 3, y: 0 },
      { x: 3, y: 4 },
    ];
    expect(pathLength(corner)).toBe(7);
    expect(inParts(corner, 7).map(({ x, y }) => [x, y])).toEqual([
      [0.5, 0],
      [1.5, 0],
      [2.5, 0],
      [3, 0.5],
      [3, 1.5],
      [3, 2.5],
      [3, 3.5],
    ]);
    expect(everyStep(corner, 2)).toHaveLength(4);
    expect(
      everyStep(
        [
          { x: 1, y: 1 },
          { x: 1, y: 1 },
        ],
        2,
      ),
    ).toEqual([{ x: 1, y: 1 }]);
  });
});

describe("roofs", () => {
  it("all run from eave to eave, touch the top and never go back", () => {
    for (const roof of [
      "gable",
      "step",
      "parapet",
      "pediment",
      "hip",
      "twin",
      "round",
      "deco",
      "bell",
      "tower",
    ] as const) {
      const points = roofPoints(roof, { width: 10, eave: 5, top: 9 });
      expect(points[0], roof).toMatchObject({ x: 0, y: 5 });
      expect(points.at(-1)?.x, roof).toBeCloseTo(10, 12);
      expect(points.at(-1)?.y, roof).toBeCloseTo(5, 12);
      points.reduce((last, point) => {
        expect(point.x, roof).toBeGreaterThanOrEqual(last.x);
        return point;
      });
      // A tower's roof ends where the tower goes on.
      expect(Math.max(...points.map((point) => point.y)), roof).toBeCloseTo(roof === "tower" ? 5 + 4 * 0.86 : 9, 9);
    }
  });
});

describe("a side of the square", () => {
  it.each(SIDES)("draws every light of the %s side inside the view, with an area", (side) => {
    for (const layout of [DEMO_SQUARE, LARGE_SQUARE]) {
      const fronts = sideGeometry(layout, side);
      const drawn = fronts.flatMap((front) => front.lights);
      const wanted = listLights(layout).filter((light) => light.side === side || light.side === null);
      expect(drawn.map((light) => light.lightIndex)).toEqual(wanted.map((light) => light.index));
      for (const light of drawn) {
        expect(light.area, light.lightId).toBeGreaterThan(1);
        for (const bead of light.beads) {
          expect(bead.x, light.lightId).toBeGreaterThan(0);
          expect(bead.x, light.lightId).toBeLessThan(REFERENCE_VIEW.width);
          expect(bead.y, light.lightId).toBeGreaterThan(0);
          expect(bead.y, light.lightId).toBeLessThan(REFERENCE_VIEW.height);
        }
      }
    }
  });

  it("stands its houses beside each other from edge to edge", () => {
    const houses = sideGeometry(DEMO_SQUARE, "north").filter((front) => front.facade !== null);
    expect(houses).toHaveLength(10);
    houses.reduce((left, right) => {
      expect(right.x).toBeCloseTo(left.x + left.width, 9);
      return right;
    });
    expect(houses[0]?.x).toBeCloseTo(REFERENCE_VIEW.width * 0.012, 9);
  });

  it("walks the pixels of a strip from its left foot over the front to its right foot", () => {
    const hall = sideGeometry(DEMO_SQUARE, "north").find((front) => front.frontId === "town-hall");
    const pixels = hall?.lights.filter((light) => light.part === "strip").map((light) => light.beads[0]) ?? [];
    expect(pixels).toHaveLength(60);
    pixels.reduce((before, pixel) => {
      expect(pixel?.x).toBeGreaterThanOrEqual((before?.x ?? 0) - 1e-9);
      return pixel;
    });
  });

  it("shows a part of a side larger, with the same lights", () => {
    const part = sideGeometry(DEMO_SQUARE, "north", { width: 390, height: 238, first: 4, count: 6 });
    expect(part.filter((front) => front.facade !== null).map((front) => [front.name, front.place])).toEqual([
      ["town hall", 4],
      ["post office", 5],
      ["tea room", 6],
      ["cinema", 7],
      ["clockmaker", 8],
      ["florist", 9],
    ]);
  });

  it("gives a light of any part a place, and a side without houses its tree", () => {
    const [bakery] = DEMO_SQUARE.fronts;
    const box = bakery?.boxes[0];
    if (!bakery || !box) throw new Error("The demo square has no bakery.");
    const odd = {
      ...bakery,
      boxes: [{ ...box, outlets: [{ number: 1, part: "weather-vane", watts: 10, circuit: "north-1" }] }],
    };
    const tree = DEMO_SQUARE.fronts.filter((front) => front.side === null);
    const layout = { ...DEMO_SQUARE, fronts: [odd, ...tree] };
    expect(sideGeometry(layout, "north")[0]?.lights[0]?.beads.length).toBeGreaterThan(3);
    expect(sideGeometry(layout, "south").map((front) => front.name)).toEqual(["tree"]);
  });
});

describe("a silhouette from a name", () => {
  it("is always the same for the same name", () => {
    expect(silhouetteFor("pottery")).toEqual(silhouetteFor("pottery"));
    const looks = new Set(
      ["pottery", "museum", "tailor", "chapel", "weaver"].map((name) => JSON.stringify(silhouetteFor(name))),
    );
    expect(looks.size).toBe(5);
  });
});
