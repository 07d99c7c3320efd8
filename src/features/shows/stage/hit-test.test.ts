import { describe, expect, it } from "vitest";
import { LayoutSchema, type Layout } from "../../../../shared/contracts/square.ts";
import { sideGeometry } from "../../../../sandbox/square/geometry.ts";
import { silhouetteFor } from "../../../../sandbox/square/silhouette.ts";
import { findHit } from "./hit-test.ts";

function buildLayout(): Layout {
  const outlets = ["roof", "windows", "door"].map((part, i) => ({ number: i + 1, part, watts: 100, circuit: "c1" }));
  const front = (id: string, order: number) => ({
    id,
    name: id,
    side: "north",
    order,
    silhouette: silhouetteFor(id),
    boxes: [{ id: `${id}-box`, kind: "dimmer", outlets }],
  });
  const tree = {
    ...front("tree", 0),
    side: null,
    silhouette: { ...silhouetteFor("tree"), roof: "tree", top: 0.56 },
    boxes: [{ id: "tree-box", kind: "colour", outlets: [{ number: 1, part: "star", watts: 50, circuit: "c1" }] }],
  };
  return LayoutSchema.parse({
    version: 1,
    name: "Quillhaven square",
    mains: { volts: 120, hertz: 60 },
    circuits: [{ id: "c1", volts: 120, breakerAmps: 20 }],
    fronts: [front("bakery", 0), front("library", 1), front("florist", 2), tree],
  });
}

const fronts = sideGeometry(buildLayout(), "north", { width: 766, height: 350 });

describe("findHit", () => {
  it("finds the light under every lamp and pane of every house that no tree hides", () => {
    for (const front of fronts.filter((candidate) => candidate.facade))
      for (const light of front.lights) {
        const [bead] = light.beads;
        if (!bead) throw new Error(`${light.lightId} has no lamps`);
        const hit = findHit(fronts, bead.x, bead.y);
        if (hit?.front.tree) continue;
        expect(hit?.light?.lightId).toBe(light.lightId);
      }
  });

  it("gives the front without a light between its lights", () => {
    const [house] = fronts;
    if (!house?.facade) throw new Error("no house");
    const gaps = Array.from({ length: 40 }, (_, i) =>
      findHit(fronts, house.x + house.width / 2, house.groundY - i * 4),
    );
    expect(gaps.some((hit) => hit?.front.frontId === house.frontId && hit.light === null)).toBe(true);
  });

  it("takes the tree before the house behind it", () => {
    const tree = fronts.find((front) => front.tree);
    if (!tree) throw new Error("no tree");
    expect(findHit(fronts, tree.x + tree.width / 2, tree.y + tree.height * 0.6)?.front.frontId).toBe("tree");
  });

  it("finds nothing in the sky or on the paving", () => {
    expect(findHit(fronts, 5, 5)).toBeNull();
    expect(findHit(fronts, 400, 345)).toBeNull();
  });
});
