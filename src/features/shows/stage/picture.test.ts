import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { Picture } from "./picture.ts";
import type { PictureMessage } from "./picture.worker.ts";

/** A worker that draws when it is told to. */
class FakeWorker extends EventTarget {
  readonly heard: PictureMessage[] = [];
  /** The light of each frame that it was asked to draw: the first channel says which. */
  readonly drawn: (number | undefined)[] = [];
  readonly terminate = vi.fn();

  postMessage(message: PictureMessage): void {
    this.heard.push(message);
    if (message.kind === "draw") this.drawn.push(message.rgb[0]);
  }

  finishFrame(): void {
    const rgb = this.heard.flatMap((message) => (message.kind === "draw" ? [message.rgb] : [])).at(-1);
    this.dispatchEvent(new MessageEvent("message", { data: rgb }));
  }
}

const light = (value: number) => Float32Array.of(value, 0, 0);

describe("Picture", () => {
  let worker: FakeWorker;
  let boxes: { stage: HTMLElement; strip: HTMLElement };
  let onFailed: ReturnType<typeof vi.fn<() => void>>;
  let picture: Picture;
  // jsdom has no canvas that can be handed over.
  beforeEach(() => {
    Object.assign(HTMLCanvasElement.prototype, { transferControlToOffscreen: () => ({}) });
    worker = new FakeWorker();
    boxes = { stage: document.createElement("div"), strip: document.createElement("div") };
    onFailed = vi.fn<() => void>();
    picture = new Picture({ boxes, layout: {} as Layout, onFailed, makeWorker: () => worker as unknown as Worker });
  });
  afterEach(() => {
    Reflect.deleteProperty(HTMLCanvasElement.prototype, "transferControlToOffscreen");
  });

  it("shows the newest frame when the worker is slow, and none twice", () => {
    for (const value of [1, 2, 3]) picture.draw(light(value));
    expect(worker.drawn).toEqual([1]);
    worker.finishFrame();
    expect(worker.drawn).toEqual([1, 3]);
    worker.finishFrame();
    expect(worker.drawn).toEqual([1, 3]);
    picture.draw(light(4));
    expect(worker.drawn).toEqual([1, 3, 4]);
  });

  it("uses one buffer over and over", () => {
    picture.draw(light(1));
    worker.finishFrame();
    picture.draw(light(2));
    const [first, second] = worker.heard.flatMap((message) => (message.kind === "draw" ? [message.rgb] : []));
    expect(second).toBe(first);
  });

  it("draws the last frame again at another size and on another side, and nothing before the first", () => {
    picture.setStageSize({ width: 10, height: 5, dpr: 1 });
    picture.look("east");
    expect(worker.drawn).toEqual([]);
    picture.draw(light(1));
    worker.finishFrame();
    picture.look("south", 3);
    expect(worker.drawn).toEqual([1, 1]);
    expect(worker.heard.at(-2)).toEqual({ kind: "look", side: "south", first: 3 });
  });

  it("puts one canvas into each box, tells of a failure, and leaves nothing behind", () => {
    expect([boxes.stage.childElementCount, boxes.strip.childElementCount]).toEqual([1, 1]);
    worker.dispatchEvent(new Event("error"));
    expect(onFailed).toHaveBeenCalledOnce();
    picture.dispose();
    expect([boxes.stage.childElementCount, boxes.strip.childElementCount]).toEqual([0, 0]);
    expect(worker.terminate).toHaveBeenCalledOnce();
  });
});
