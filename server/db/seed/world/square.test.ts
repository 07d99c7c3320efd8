import { describe, expect, it } from "vitest";
import { BOX_KINDS } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { frontBox, listFronts, listLights } from "../../../../sandbox/square/lights.ts";
import { CONTINUOUS_SHARE } from "./figures.ts";
import { DEMO_SQUARE, LARGE_SQUARE, SQUARE_230 } from "./square.ts";

const outlets = (layout: Layout) => layout.fronts.flatMap((front) => front.boxes.flatMap((box) => box.outlets));

describe("the demo square", () => {
  it("has 40 fronts on four sides, ten each, and a tree on none", () => {
    for (const side of SIDES) expect(DEMO_SQUARE.fronts.filter((front) => front.side === side)).toHaveLength(10);
    expect(DEMO_SQUARE.fronts.filter((front) => front.side === null).map((front) => front.name)).toEqual(["tree"]);
  });

  it("has 121 outlets of all four kinds of box, and two strips", () => {
    expect(outlets(DEMO_SQUARE)).toHaveLength(121);
    expect(outlets(DEMO_SQUARE).filter((outlet) => outlet.pixels === 60)).toHaveLength(2);
    const kinds = new Set(DEMO_SQUARE.fronts.flatMap((front) => front.boxes.map((box) => box.kind)));
    expect([...kinds].sort()).toEqual([...BOX_KINDS].sort());
    expect(listFronts(DEMO_SQUARE).filter(({ front }) => frontBox(front) === "mixed").length).toBeGreaterThan(2);
  });

  it("has 239 single lights, the larger one 419", () => {
    expect(listLights(DEMO_SQUARE)).toHaveLength(239);
    expect(listLights(LARGE_SQUARE)).toHaveLength(419);
  });

  it("begins with the bakery and ends with the tree", () => {
    const walked = listFronts(DEMO_SQUARE);
    expect(walked[0]?.front.name).toBe("bakery");
    expect(walked.at(-1)?.front.name).toBe("tree");
  });

  it("gives every box an id of its own", () => {
    const ids = DEMO_SQUARE.fronts.flatMap((front) => front.boxes.map((box) => box.id));
    expect(new Set(ids).size).toBe(ids.length);
  });

  it.each([
    ["120 V", DEMO_SQUARE],
    ["120 V, long strips", LARGE_SQUARE],
    ["230 V", SQUARE_230],
  ] as const)("keeps every circuit of the %s square within 80 %% of its breaker with all lights on", (_, layout) => {
    for (const circuit of layout.circuits) {
      const watts = outlets(layout)
        .filter((outlet) => outlet.circuit === circuit.id)
        .reduce((sum, outlet) => sum + outlet.watts, 0);
      expect(watts).toBeGreaterThan(0);
      expect(watts / circuit.volts, circuit.id).toBeLessThanOrEqual(circuit.breakerAmps * CONTINUOUS_SHARE);
    }
  });
});
