import type { Layout, Side } from "../../../../shared/contracts/square.ts";
import type { PictureMessage } from "./picture.worker.ts";
import type { StageSize } from "./stage.ts";

/** Where a picture is put: boxes on the page that hold nothing else on their ground. */
export interface PictureBoxes {
  readonly stage: HTMLElement;
  readonly strip: HTMLElement;
}

export interface PictureOptions {
  readonly boxes: PictureBoxes;
  readonly layout: Layout;
  /** The picture can not be drawn; nothing more will come. */
  readonly onFailed: () => void;
  /** Tests pass their own. */
  readonly makeWorker?: () => Worker;
}

const makePictureWorker = (): Worker =>
  new Worker(new URL("./picture.worker.ts", import.meta.url), { type: "module", name: "picture" });

/**
 * The square's picture on the page: the stage, and below it the strip of all sides. A worker draws it; the
 * page only hands over each frame's light. While the worker draws, a newer frame takes the place of one
 * that waits, so that a slow computer shows fewer frames and never late ones.
 */
export class Picture {
  readonly #worker: Worker;
  readonly #canvases: readonly HTMLCanvasElement[];
  /** The newest light that was asked for; null before the first. */
  #wanted: Float32Array | null = null;
  #isWaiting = false;
  #isDrawing = false;
  /** Goes to the worker and comes back. */
  #spare: Float32Array<ArrayBuffer> | null = null;

  constructor({ boxes, layout, onFailed, makeWorker = makePictureWorker }: PictureOptions) {
    this.#worker = makeWorker();
    this.#worker.addEventListener("error", onFailed);
    this.#worker.addEventListener("message", ({ data }: MessageEvent<Float32Array<ArrayBuffer>>) => {
      this.#spare = data;
      this.#isDrawing = false;
      if (this.#isWaiting) this.#send();
    });
    // Made here and not by the page: a canvas can be handed over only once.
    this.#canvases = [addCanvas(boxes.stage), addCanvas(boxes.strip)];
    const [stage, strip] = this.#canvases.map((canvas) => canvas.transferControlToOffscreen());
    if (stage && strip) this.#tell({ kind: "open", stage, strip, layout }, [stage, strip]);
  }

  setStageSize(size: StageSize): void {
    this.#tell({ kind: "size-stage", size });
    this.#redraw();
  }

  setStripSize(size: StageSize): void {
    this.#tell({ kind: "size-strip", size });
    this.#redraw();
  }

  /** Turns to a side; `first` is the place of the first front shown where not all fit. */
  look(side: Side, first = 0): void {
    this.#tell({ kind: "look", side, first });
    this.#redraw();
  }

  /** Shows the square under `rgb`: three linear channels a light in walking order. The light is copied. */
  draw(rgb: Float32Array): void {
    if (this.#wanted?.length === rgb.length) this.#wanted.set(rgb);
    else this.#wanted = rgb.slice();
    this.#redraw();
  }

  dispose(): void {
    this.#worker.terminate();
    for (const canvas of this.#canvases) canvas.remove();
  }

  #redraw(): void {
    this.#isWaiting = this.#wanted !== null;
    if (this.#isWaiting && !this.#isDrawing) this.#send();
  }

  #send(): void {
    if (!this.#wanted) return;
    const rgb = this.#spare?.length === this.#wanted.length ? this.#spare : new Float32Array(this.#wanted.length);
    rgb.set(this.#wanted);
    this.#spare = null;
    this.#isWaiting = false;
    this.#isDrawing = true;
    this.#tell({ kind: "draw", rgb }, [rgb.buffer]);
  }

  #tell(message: PictureMessage, transfer: Transferable[] = []): void {
    this.#worker.postMessage(message, transfer);
  }
}

function addCanvas(box: HTMLElement): HTMLCanvasElement {
  const canvas = document.createElement("canvas");
  box.prepend(canvas);
  return canvas;
}
