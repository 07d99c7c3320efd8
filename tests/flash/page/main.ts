import { REFERENCE_VIEW } from "../../../sandbox/square/geometry.ts";
import { relativeLuminance, srgbToLinear } from "../../../sandbox/timeline/colour.ts";
import type { Layout, Side } from "../../../shared/contracts/square.ts";
import { Stage } from "../../../src/features/shows/stage/stage.ts";
import { buildReferencePicture } from "../../support/reference-picture.ts";

/** Luminance (0 to 1) of a frame in the area of each light: as the stage draws it, and in the reference picture. */
export interface Measured {
  readonly stage: readonly number[];
  readonly reference: readonly number[];
}

declare global {
  interface Window {
    /** Draws frames (three linear channels a light) of one side and measures them. Asked for by the test. */
    measureStage(layout: Layout, side: Side, frames: readonly (readonly number[])[]): Measured[];
  }
}

const LINEAR = Float64Array.from({ length: 256 }, (_, value) => srgbToLinear(value));

window.measureStage = (layout, side, frames) => {
  const canvas = document.querySelector("canvas");
  const pixels = canvas?.getContext("2d", { alpha: false });
  if (!canvas || !pixels) throw new Error("The page has no canvas to draw on.");
  const stage = new Stage(canvas, layout, { hasBloom: false });
  stage.setSize({ width: REFERENCE_VIEW.width, height: REFERENCE_VIEW.height, dpr: 1 });
  stage.look(side);
  const picture = buildReferencePicture(layout, side);
  const meansOf = (bytes: ArrayLike<number>, channels: number) =>
    picture.spreads.map(({ pixel }) => {
      let sum = 0;
      for (const at of pixel)
        sum += relativeLuminance(
          LINEAR[bytes[at * channels] ?? 0] ?? 0,
          LINEAR[bytes[at * channels + 1] ?? 0] ?? 0,
          LINEAR[bytes[at * channels + 2] ?? 0] ?? 0,
        );
      return sum / Math.max(1, pixel.length);
    });
  const measured = frames.map((frame) => {
    const rgb = Float32Array.from(frame);
    stage.draw(rgb);
    const { data } = pixels.getImageData(0, 0, canvas.width, canvas.height);
    return { stage: meansOf(data, 4), reference: meansOf(picture.paint(rgb), 3) };
  });
  stage.dispose();
  return measured;
};
