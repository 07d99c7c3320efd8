import fontUrl from "@fontsource-variable/bricolage-grotesque/files/bricolage-grotesque-latin-opsz-normal.woff2?url";
import type { Layout, Side } from "../../../../shared/contracts/square.ts";
import { Stage, type StageSize } from "./stage.ts";
import { UnrolledStrip } from "./unrolled-strip.ts";

/** What the page tells the picture. A `draw` is answered with its own buffer, when it is drawn. */
export type PictureMessage =
  | {
      readonly kind: "open";
      readonly stage: OffscreenCanvas;
      readonly strip: OffscreenCanvas;
      readonly layout: Layout;
    }
  | { readonly kind: "size-stage"; readonly size: StageSize }
  | { readonly kind: "size-strip"; readonly size: StageSize }
  | { readonly kind: "look"; readonly side: Side; readonly first: number }
  /** Three linear channels a light in walking order. */
  | { readonly kind: "draw"; readonly rgb: Float32Array<ArrayBuffer> };

/** The letters of signs are painted once: better a moment late than in another hand. */
const FONT_PATIENCE_MS = 1500;

async function loadFont(): Promise<void> {
  const fonts = (self as unknown as { readonly fonts?: FontFaceSet }).fonts;
  if (!fonts) return;
  const font = new FontFace("Bricolage Grotesque", `url(${fontUrl})`, { weight: "200 800" });
  fonts.add(font);
  const patience = new Promise((resolve) => setTimeout(resolve, FONT_PATIENCE_MS));
  // Without it the signs are written in the browser's own hand.
  await Promise.race([font.load().catch(() => undefined), patience]);
}

/** The stage and the strip of the whole square, drawn beside the page, so that drawing never holds it up. */
function open(stageCanvas: OffscreenCanvas, stripCanvas: OffscreenCanvas, layout: Layout) {
  const stage = new Stage(stageCanvas, layout);
  const strip = new UnrolledStrip(stripCanvas, layout);
  // What changes the picture is done with the next frame: a new size empties a canvas, and nobody should see that.
  let changes: (() => void)[] = [];
  return (message: Exclude<PictureMessage, { kind: "open" }>): void => {
    switch (message.kind) {
      case "size-stage":
        changes.push(() => stage.setSize(message.size));
        return;
      case "size-strip":
        changes.push(() => strip.setSize(message.size));
        return;
      case "look":
        changes.push(() => stage.look(message.side, message.first));
        return;
      case "draw":
        for (const change of changes) change();
        changes = [];
        stage.draw(message.rgb);
        strip.draw(message.rgb);
        self.postMessage(message.rgb, { transfer: [message.rgb.buffer] });
    }
  };
}

let take: ReturnType<typeof open> | null = null;
const font = loadFont();

self.addEventListener("message", ({ data }: MessageEvent<PictureMessage>) => {
  // In turn behind the font, which only the first message waits for.
  void font.then(() => {
    if (data.kind === "open") take = open(data.stage, data.strip, data.layout);
    else take?.(data);
  });
});
