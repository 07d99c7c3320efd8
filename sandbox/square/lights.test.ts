import { describe, expect, it } from "vitest";
import type { Front, Layout } from "../../shared/contracts/square.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { canonicalLayout, layoutHash } from "./layout-hash.ts";
import { frontBox, listFronts, listLights } from "./lights.ts";
import { silhouetteFor } from "./silhouette.ts";

const front = (name: string, side: Front["side"], order: number, boxes: Front["boxes"]): Front => ({
  id: name,
  name,
  side,
  order,
  silhouette: silhouetteFor(name),
  boxes,
});
const relay = (id: string, parts: string[]): Front["boxes"][number] => ({
  id,
  kind: "relay",
  outlets: parts.map((part, n) => ({ number: n + 1, part, watts: 100, circuit: "a" })),
});

const SMALL: Layout = {
  version: 1,
  name: "small",
  mains: { volts: 120, hertz: 60 },
  circuits: [{ id: "a", volts: 120, breakerAmps: 20 }],
  fronts: [
    front("tree", null, 0, [
      { id: "tree-c", kind: "colour", outlets: [{ number: 1, part: "strip", watts: 9, circuit: "a", pixels: 3 }] },
    ]),
    front("west-house", "west", 0, [relay("w", ["door"])]),
    front("north-right", "north", 1, [relay("nr", ["windows", "roof"])]),
    front("north-left", "north", 0, [
      relay("nl", ["roof"]),
      { id: "nl-d", kind: "dimmer", outlets: [{ number: 1, part: "door", watts: 60, circuit: "a" }] },
    ]),
    front("east-house", "east", 0, [relay("e", ["roof"])]),
    front("south-house", "south", 0, [relay("s", ["roof"])]),
  ],
};

describe("walking order (LANGUAGE rule 10)", () => {
  it("goes clockwise from the north-west, each side left to right, the tree last", () => {
    expect(listFronts(SMALL).map((walked) => walked.front.id)).toEqual([
      "north-left",
      "north-right",
      "east-house",
      "south-house",
      "west-house",
      "tree",
    ]);
  });

  it("takes parts as the layout lists them and pixels left to right", () => {
    expect(listLights(SMALL).map((light) => light.id)).toEqual([
      "north-left/roof",
      "north-left/door",
      "north-right/windows",
      "north-right/roof",
      "east-house/roof",
      "south-house/roof",
      "west-house/door",
      "tree/strip/1",
      "tree/strip/2",
      "tree/strip/3",
    ]);
  });

  it("numbers lights by their place, and fronts hold the numbers of theirs", () => {
    const lights = listLights(DEMO_SQUARE);
    expect(lights.every((light, place) => light.index === place)).toBe(true);
    for (const walked of listFronts(DEMO_SQUARE))
      for (const index of walked.lights)
        expect(lights[index]).toMatchObject({ frontIndex: walked.index, frontId: walked.front.id });
    expect(listFronts(DEMO_SQUARE).flatMap((walked) => walked.lights)).toEqual(lights.map((light) => light.index));
  });

  it("shares the watts of a strip over its pixels and keeps the sum", () => {
    const pixels = listLights(SMALL).filter((light) => light.pixels === 3);
    expect(pixels.map((light) => light.watts)).toEqual([3, 3, 3]);
    expect(pixels.map((light) => light.pixel)).toEqual([1, 2, 3]);
  });

  it("knows what each kind of box can do", () => {
    const byId = new Map(listLights(SMALL).map((light) => [light.id, light]));
    expect(byId.get("north-left/roof")).toMatchObject({ isSwitched: true, hasColour: false });
    expect(byId.get("north-left/door")).toMatchObject({ isSwitched: false, hasColour: false });
    expect(byId.get("tree/strip/2")).toMatchObject({ isSwitched: false, hasColour: true });
    expect(listFronts(SMALL).map((walked) => frontBox(walked.front))).toEqual([
      "mixed",
      "relay",
      "relay",
      "relay",
      "relay",
      "colour",
    ]);
  });
});

describe("the layout's hash", () => {
  const reversed = <Value>(value: Value): Value =>
    Array.isArray(value)
      ? (value.map(reversed) as Value)
      : value !== null && typeof value === "object"
        ? (Object.fromEntries(
            Object.entries(value)
              .reverse()
              .map(([key, field]) => [key, reversed(field)]),
          ) as Value)
        : value;

  it("does not depend on the order of keys, but on every value", () => {
    expect(canonicalLayout(reversed(DEMO_SQUARE))).toBe(canonicalLayout(DEMO_SQUARE));
    const changed = { ...DEMO_SQUARE, name: "another" };
    expect(canonicalLayout(changed)).not.toBe(canonicalLayout(DEMO_SQUARE));
    expect(JSON.parse(canonicalLayout(DEMO_SQUARE))).toEqual(JSON.parse(JSON.stringify(DEMO_SQUARE)));
  });

  it("hashes the canonical text with the host's function", () => {
    expect(layoutHash(SMALL, (text) => `hash of ${text.length}`)).toBe(`hash of ${canonicalLayout(SMALL).length}`);
  });
});
