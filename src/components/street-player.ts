import { buildStreet, hashUnit, type Street, type StreetOptions } from "./street-geometry.ts";
import { paintBackdrop, paintFrontLight } from "./street-painting.ts";

export type StreetLighting = "slow" | "one" | "none";

const FRAME_MS = 1000 / 9;
const CYCLE_S = 26;
const FADE_S = 3.2;
const LIT_SHARE = 0.58;
const STILL_AT_S = 9;
const MAX_PIXEL_RATIO = 2;
const COLOURS = ["246 177 61", "255 215 154", "246 177 61", "255 160 74", "255 243 220"];

interface Layer {
  canvas: HTMLCanvasElement;
  /** Device pixels from the scene's left edge. */
  x: number;
}

/** The light of one house at a time, 0 to 1: every house has its own place in a slow round, so some are always coming and some going. */
export function streetLevel(house: number, houses: number, seconds: number): number {
  // Neighbours follow each other with a step of three houses: it reads as somebody walking about, not as a wave.
  const place = ((house * 3) % houses) / houses + hashUnit(house, 77) * 0.08;
  const since = ((seconds / CYCLE_S + 1 - place) % 1) * CYCLE_S;
  const rise = Math.min(1, since / FADE_S);
  const fall = Math.min(1, Math.max(0, (CYCLE_S * LIT_SHARE - since) / FADE_S));
  const level = Math.min(rise, fall);
  return level * level * (3 - 2 * level);
}

/** Draws a street on a canvas and, while it plays and is in the window, its lights nine times a second. */
export class StreetPlayer {
  readonly #canvas: HTMLCanvasElement;
  readonly #street: Street;
  readonly #lighting: StreetLighting;
  readonly #ratio: number;
  readonly #backdrop: Layer;
  readonly #lights: Layer[];
  #observer: IntersectionObserver | null = null;
  #frame = 0;
  #isVisible = false;

  constructor(canvas: HTMLCanvasElement, options: StreetOptions, lighting: StreetLighting) {
    this.#canvas = canvas;
    this.#street = buildStreet(options);
    this.#lighting = lighting;
    this.#ratio = Math.min(MAX_PIXEL_RATIO, window.devicePixelRatio || 1);
    canvas.width = Math.round(options.width * this.#ratio);
    canvas.height = Math.round(options.height * this.#ratio);
    this.#backdrop = this.#layer(0, options.width, (pen) => paintBackdrop(pen, this.#street));
    this.#lights = this.#street.fronts.map((front, index) => {
      const reach = Math.max(front.width, front.height);
      const colour = COLOURS[Math.floor(hashUnit(index + options.seed, 12) * COLOURS.length)] ?? "246 177 61";
      return this.#layer(front.x + front.width / 2 - reach, reach * 2, (pen) =>
        paintFrontLight(pen, front, this.#street, colour),
      );
    });
  }

  /** A canvas as high as the scene that holds only the given span, to keep a light's memory to its own house. */
  #layer(from: number, width: number, paint: (pen: CanvasRenderingContext2D) => void): Layer {
    const canvas = document.createElement("canvas");
    const x = Math.floor(from * this.#ratio);
    canvas.width = Math.ceil(width * this.#ratio);
    canvas.height = this.#canvas.height;
    const pen = canvas.getContext("2d");
    if (pen) {
      pen.setTransform(this.#ratio, 0, 0, this.#ratio, -x, 0);
      paint(pen);
    }
    return { canvas, x };
  }

  #level(house: number, seconds: number): number {
    if (this.#lighting === "none") return 0;
    if (this.#lighting === "one") return house === Math.floor(this.#street.fronts.length / 2) ? 1 : 0;
    return streetLevel(house, this.#street.fronts.length, seconds);
  }

  #draw(seconds: number) {
    const pen = this.#canvas.getContext("2d");
    if (!pen) return;
    pen.globalAlpha = 1;
    pen.drawImage(this.#backdrop.canvas, 0, 0);
    this.#lights.forEach((light, house) => {
      const level = this.#level(house, seconds);
      if (level < 0.02) return;
      pen.globalAlpha = level;
      pen.drawImage(light.canvas, light.x, 0);
    });
  }

  /** Draws one settled moment. */
  drawStill() {
    this.#draw(STILL_AT_S);
  }

  /** Lets the houses light up and go dark until `dispose`; rests while the picture is out of the window. */
  play() {
    this.drawStill();
    let last = 0;
    const step = (now: number) => {
      if (!this.#isVisible) return;
      if (now - last >= FRAME_MS) {
        last = now;
        this.#draw(STILL_AT_S + now / 1000);
      }
      this.#frame = requestAnimationFrame(step);
    };
    this.#observer = new IntersectionObserver(([entry]) => {
      const isVisible = entry?.isIntersecting ?? false;
      if (isVisible === this.#isVisible) return;
      this.#isVisible = isVisible;
      if (isVisible) this.#frame = requestAnimationFrame(step);
    });
    this.#observer.observe(this.#canvas);
  }

  /** Stops playing and gives the layers' memory back. */
  dispose() {
    this.#observer?.disconnect();
    this.#isVisible = false;
    cancelAnimationFrame(this.#frame);
    for (const layer of [this.#backdrop, ...this.#lights]) layer.canvas.width = 0;
  }
}
