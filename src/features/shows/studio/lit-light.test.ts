import { describe, expect, it } from "vitest";
import { LayoutSchema } from "../../../../shared/contracts/square.ts";
import { listLights } from "../../../../sandbox/square/lights.ts";
import { silhouetteFor } from "../../../../sandbox/square/silhouette.ts";
import { buildTimeline } from "../../../../sandbox/timeline/build.ts";
import { createCursor } from "../../../../sandbox/timeline/cursor.ts";
import { findLitLight, presentLitLight } from "./lit-light.ts";

const outlet = (number: number, part: string, pixels?: number) => ({
  number,
  part,
  watts: 60,
  circuit: "c1",
  ...(pixels && { pixels }),
});
const layout = LayoutSchema.parse({
  version: 1,
  name: "Quillhaven square",
  mains: { volts: 120, hertz: 60 },
  circuits: [{ id: "c1", volts: 120, breakerAmps: 20 }],
  fronts: [
    {
      id: "bakery",
      name: "bakery",
      side: "north",
      order: 0,
      silhouette: silhouetteFor("bakery"),
      boxes: [
        { id: "dimmer", kind: "dimmer", outlets: [outlet(1, "roof")] },
        { id: "colour", kind: "colour", outlets: [outlet(1, "windows"), outlet(2, "strip", 3)] },
      ],
    },
  ],
});
const lights = listLights(layout);
const timeline = buildTimeline(
  { language: 1, songId: "s", layoutHash: "h", seed: 1, lightCount: lights.length, endTick: 9600, isComplete: true },
  [
    { tick: 0, action: "on", lights: [0], level: 4000, chain: [9] },
    { tick: 960, action: "colour", lights: [1], colour: 0xff_d7_00, length: 0, chain: [3] },
    { tick: 960, action: "on", lights: [1], level: 7300, chain: [12, 4] },
    { tick: 1920, action: "pulse", lights: [2], colour: 0x12_34_56, length: 960, chain: [5] },
  ],
);
const cursor = createCursor(timeline, layout);

describe("findLitLight", () => {
  it("tells the brightest light, its colour's name and the line that acts", () => {
    const lit = findLitLight(timeline, cursor.seek(960), lights);
    expect(lit).toEqual({ part: "windows", level: 73, colour: "gold", line: 4, callers: [12] });
    expect(lit && presentLitLight(lit)).toBe("windows at 73, gold");
  });

  it("names no colour for a plain string of lamps", () => {
    expect(findLitLight(timeline, cursor.seek(0), lights)).toEqual({
      part: "roof",
      level: 40,
      colour: null,
      line: 9,
      callers: [],
    });
  });

  it("counts the pixels of a strip, and writes a colour without a name as it is", () => {
    expect(findLitLight(timeline, cursor.seek(1920), lights.slice(2))).toMatchObject({
      part: "strip, light 1",
      colour: "#123456",
      line: 5,
    });
  });

  it("is null where all is dark", () => {
    expect(findLitLight(timeline, cursor.seek(0), lights.slice(1))).toBeNull();
  });
});
