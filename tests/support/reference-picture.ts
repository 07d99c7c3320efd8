import { REFERENCE_VIEW, sideGeometry } from "../../sandbox/square/geometry.ts";
import type { Bead, Pane } from "../../sandbox/square/shapes.ts";
import { linearToSrgb } from "../../sandbox/timeline/colour.ts";
import type { Layout, Side } from "../../shared/contracts/square.ts";

/** Where one light shines: pixels of the small picture, and how much of each it fills (0 to 1). */
interface Spread {
  readonly lightIndex: number;
  readonly pixel: Uint32Array;
  readonly share: Float32Array;
}

/**
 * The reference picture of a side as pixels: panes and lamps on black, each in its light's colour,
 * without lag and bloom. The picture of 1024 x 768 is shrunk by a whole factor.
 */
export interface ReferencePicture {
  readonly width: number;
  readonly height: number;
  readonly spreads: readonly Spread[];
  /** Gives red, green and blue (sRGB, 0 to 255) of every pixel under a frame's linear light. Fresh. */
  paint(rgb: Float32Array): Uint8Array;
}

/** sRGB of linear light in steps so fine that none is a byte apart. */
const STEPS = 16_384;
const BYTE_OF_STEP = Uint8Array.from({ length: STEPS + 1 }, (_, step) => Math.round(linearToSrgb(step / STEPS)));

export function buildReferencePicture(layout: Layout, side: Side, shrink = 1): ReferencePicture {
  const [width, height] = [REFERENCE_VIEW.width / shrink, REFERENCE_VIEW.height / shrink];
  const spreads = sideGeometry(layout, side)
    .flatMap((front) => front.lights)
    .map(({ lightIndex, panes, beads }): Spread => {
      const shares = new Map<number, number>();
      for (const [x, y] of listPixels(panes, beads)) {
        const pixel = Math.floor(y / shrink) * width + Math.floor(x / shrink);
        shares.set(pixel, (shares.get(pixel) ?? 0) + 1 / (shrink * shrink));
      }
      return { lightIndex, pixel: Uint32Array.from(shares.keys()), share: Float32Array.from(shares.values()) };
    });
  return {
    width,
    height,
    spreads,
    paint(rgb) {
      const linear = new Float32Array(width * height * 3);
      for (const { lightIndex, pixel, share } of spreads)
        for (let channel = 0; channel < 3; channel++) {
          const light = rgb[lightIndex * 3 + channel] ?? 0;
          if (light <= 0) continue;
          for (let place = 0; place < pixel.length; place++) {
            const at = (pixel[place] ?? 0) * 3 + channel;
            // Lights that overlap do not light a pixel twice.
            linear[at] = Math.max(linear[at] ?? 0, light * (share[place] ?? 0));
          }
        }
      const bytes = new Uint8Array(linear.length);
      for (let at = 0; at < bytes.length; at++) bytes[at] = BYTE_OF_STEP[Math.round(STEPS * (linear[at] ?? 0))] ?? 255;
      return bytes;
    },
  };
}

/** The pixels of the whole picture whose middle lies in a pane or a lamp, each once. */
function* listPixels(panes: readonly Pane[], beads: readonly Bead[]): Generator<readonly [number, number]> {
  const seen = new Set<number>();
  const { width, height } = REFERENCE_VIEW;
  const boxes = [
    ...panes.map((pane) => ({ ...pane, holds: (x: number, y: number) => isInPane(pane, x, y) })),
    ...beads.map(({ x, y, radius }) => ({
      x: x - radius,
      y: y - radius,
      width: 2 * radius,
      height: 2 * radius,
      holds: (px: number, py: number) => Math.hypot(px - x, py - y) <= radius,
    })),
  ];
  for (const box of boxes)
    for (let y = Math.max(0, Math.floor(box.y)); y < Math.min(height, box.y + box.height); y++)
      for (let x = Math.max(0, Math.floor(box.x)); x < Math.min(width, box.x + box.width); x++) {
        if (seen.has(y * width + x) || !box.holds(x + 0.5, y + 0.5)) continue;
        seen.add(y * width + x);
        yield [x, y];
      }
}

function isInPane(pane: Pane, x: number, y: number): boolean {
  if (x < pane.x || y < pane.y || x > pane.x + pane.width || y > pane.y + pane.height) return false;
  if (pane.shape === "rect") return true;
  const [middle, radius] = [pane.x + pane.width / 2, pane.width / 2];
  if (pane.shape === "round")
    return Math.hypot((x - middle) / radius, (y - pane.y - pane.height / 2) / (pane.height / 2)) <= 1;
  return y >= pane.y + radius || Math.hypot(x - middle, y - pane.y - radius) <= radius;
}
