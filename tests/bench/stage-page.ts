import type { Layout } from "../../shared/contracts/square.ts";
import { createCursor } from "../../sandbox/timeline/cursor.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import { buildTimeline, type WrittenCue } from "../../sandbox/timeline/build.ts";
import { createLinesLit } from "../../sandbox/timeline/lines.ts";
import { GentleFilter } from "../../src/features/shows/stage/gentle-filter.ts";
import { Stage } from "../../src/features/shows/stage/stage.ts";
import { UnrolledStrip } from "../../src/features/shows/stage/unrolled-strip.ts";

/** What a page of the bench can be asked: the studio's picture without the page around it. */
export interface StagePage {
  /** Milliseconds of script for each of so many frames at 60 a second, all lights fading through colours. */
  timeFrames(layout: Layout, frames: number): number[];
  /** Goes on for so many seconds of show time at 20 frames a second; nothing is kept but the picture. */
  play(layout: Layout, seconds: number): Promise<void>;
}

const BEAT_SECONDS = 0.5;
const SIZE = { width: 766, height: 350, strip: 60 };

/** Every light comes up and goes through colours, each a little later than the one before, over and over. */
function fadeEverything(layout: Layout, beats: number) {
  const lights = listLights(layout).map((light) => light.index);
  const cues: WrittenCue[] = [];
  for (let beat = 0; beat < beats - 8; beat += 8) {
    const group = lights.filter((light) => light % 8 === (beat / 8) % 8);
    const colour = Number.parseInt(((beat * 2_654_435) & 0xff_ff_ff).toString(16), 16);
    cues.push({ tick: beat * 960, action: "on", lights, level: 7000, chain: [2] });
    cues.push({ tick: beat * 960, action: "colour", lights, colour, length: 6 * 960, chain: [3] });
    cues.push({ tick: (beat + 2) * 960, action: "fadeTo", lights: group, level: 2000, length: 4 * 960, chain: [9, 4] });
  }
  return buildTimeline(
    {
      language: 1,
      songId: "bench",
      layoutHash: "bench",
      seed: 1,
      lightCount: lights.length,
      endTick: beats * 960,
      isComplete: true,
    },
    cues,
  );
}

function openPicture(layout: Layout, seconds: number) {
  const timeline = fadeEverything(layout, Math.ceil(seconds / BEAT_SECONDS) + 8);
  const cursor = createCursor(timeline, layout);
  const linesLit = createLinesLit(timeline);
  const gentle = new GentleFilter(timeline.lightCount);
  const canvases = [document.createElement("canvas"), document.createElement("canvas")] as const;
  document.body.replaceChildren(...canvases);
  const stage = new Stage(canvases[0], layout);
  const strip = new UnrolledStrip(canvases[1], layout);
  stage.setSize({ width: SIZE.width, height: SIZE.height, dpr: 1 });
  strip.setSize({ width: SIZE.width, height: SIZE.strip, dpr: 1 });
  return {
    draw(second: number) {
      const frame = cursor.seek((second / BEAT_SECONDS) * 960);
      gentle.jumpTo(frame.rgb);
      stage.draw(gentle.rgb);
      strip.draw(gentle.rgb);
      linesLit(frame);
    },
    dispose() {
      stage.dispose();
      document.body.replaceChildren();
    },
  };
}

const nextTurn = () => new Promise<void>((resolve) => requestAnimationFrame(() => resolve()));

const page: StagePage = {
  timeFrames(layout, frames) {
    const picture = openPicture(layout, frames / 60 + 1);
    const times: number[] = [];
    // Sprites of colours are made when they first show.
    for (let frame = 0; frame < 20; frame += 1) picture.draw(frame / 60);
    for (let frame = 0; frame < frames; frame += 1) {
      const start = performance.now();
      picture.draw(frame / 60);
      times.push(performance.now() - start);
    }
    picture.dispose();
    return times;
  },
  async play(layout, seconds) {
    const picture = openPicture(layout, seconds);
    for (let frame = 0; frame < seconds * 20; frame += 1) {
      picture.draw(frame / 20);
      if (frame % 20 === 0) await nextTurn();
    }
    picture.dispose();
  },
};

Object.assign(globalThis, { stagePage: page });
