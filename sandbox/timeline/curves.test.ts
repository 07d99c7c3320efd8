import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildFront, buildShow, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import { listLights } from "../square/lights.ts";
import { relativeLuminance } from "./colour.ts";
import { createCursor } from "./cursor.ts";
import { createTracer } from "./curves.ts";
import { buildTracks } from "./tracks.ts";

/** 0 relay, 1 and 2 dimmers, 3 colour. */
const layout = buildFront("relay", "dimmer", "dimmer", { kind: "colour" });
const trace = (cues: Parameters<typeof buildShow>[1]) => {
  const timeline = buildShow(layout, cues);
  const lights = listLights(layout);
  return { timeline, curves: lights.map(createTracer(timeline, lights, buildTracks(timeline))) };
};

describe("createTracer", () => {
  it("has two points where a light jumps and none where it rests", () => {
    const { curves } = trace([on(1, 1, 80), off(9, 1)]);
    expect([...(curves[1]?.tick ?? [])].map((tick) => Math.round(tick * 1000) / 1000)).toEqual([
      959.999, 960, 8639.999, 8640, 30_719.999, 30_720,
    ]);
    expect([...(curves[1]?.level ?? [])]).toEqual([0, 80, 80, 0, 0, 0]);
  });
  it("meets what sampling says at every moment, within what a straight line can be off in 1/16 beat", () => {
    const beat = fc.integer({ min: 0, max: 127 }).map((quarter) => quarter / 4);
    const length = fc.constantFrom(0.25, 1, 4);
    const lights = fc.subarray([0, 1, 3], { minLength: 1 });
    const level = fc.integer({ min: 0, max: 100 });
    const someCue = fc.oneof(
      fc.tuple(beat, lights, level).map((a) => on(...a)),
      fc.tuple(beat, lights).map((a) => off(...a)),
      fc.tuple(beat, lights, level, length).map((a) => fadeTo(...a)),
      fc.tuple(beat, lights, length).map((a) => pulse(...a)),
      fc.tuple(beat, lights, fc.constantFrom(0xff_00_00, 0x00_ff_00), length).map((a) => colour(...a)),
    );
    fc.assert(
      fc.property(
        fc.array(someCue, { maxLength: 25 }),
        fc.array(fc.integer({ min: 0, max: 30_719 }), { minLength: 20, maxLength: 20 }),
        (cues, ticks) => {
          const { timeline, curves } = trace(cues);
          const cursor = createCursor(timeline, layout);
          for (const tick of ticks) {
            const frame = cursor.seek(tick);
            for (const light of [1, 3]) {
              const curve = curves[light];
              if (curve === undefined) continue;
              const rgb = [0, 1, 2].map((channel) => frame.rgb[light * 3 + channel] ?? 0) as [number, number, number];
              const shown = light === 3 ? relativeLuminance(...rgb) : rgb[0];
              // A pulse of a quarter beat loses half its light between two points; where it meets a level there
              // is a bend that the straight line cuts by at most a quarter of that.
              expect(Math.abs(valueAt(curve.tick, curve.luminance, tick) - shown)).toBeLessThan(0.14);
            }
            expect(valueAt(curves[0]?.tick ?? new Float64Array(0), curves[0]?.luminance ?? [], tick) > 0.5).toBe(
              (frame.level[0] ?? 0) > 0,
            );
          }
        },
      ),
      { numRuns: 100 },
    );
  });
});

/** The straight line between the points beside a moment. */
function valueAt(ticks: Float64Array, values: ArrayLike<number>, tick: number): number {
  let next = ticks.findIndex((point) => point > tick);
  if (next < 0) next = ticks.length;
  if (next === 0) return 0;
  const from = values[next - 1] ?? 0;
  if (next === ticks.length) return from;
  const [start, end] = [ticks[next - 1] ?? 0, ticks[next] ?? 0];
  return from + (((values[next] ?? 0) - from) * (tick - start)) / (end - start);
}
