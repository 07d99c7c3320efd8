import * as Comlink from "comlink";
import { createEngine } from "../../sandbox/engine/engine.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { describeShow, type ShowDescription } from "../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { ribbonCells, type RibbonCells, type RibbonSize } from "../../sandbox/timeline/ribbon.ts";
import { createBrowserHost, loadEngineModule } from "./browser-host.worker.ts";

/** What the page calls. The worker runs one script at a time and never ends itself: the page does that. */
export interface RunWorker {
  /** Loads and compiles the engine, so that the first run finds it warm. */
  warmUp(): Promise<void>;
  run(input: RunInput): Promise<RunOutcome>;
  /**
   * The ribbon of a timeline. A call of its own, after the answer of the run: the lights come first.
   */
  drawRibbon(timeline: Timeline, layout: RunInput["layout"], size: RibbonSize): Promise<RibbonCells>;
  /** A show in words. */
  describe(timeline: Timeline, layout: RunInput["layout"], song: RunInput["song"]): Promise<ShowDescription>;
}

const engine = createEngine(createBrowserHost());

const worker: RunWorker = {
  warmUp: async () => {
    await loadEngineModule();
  },
  run: (input) => engine.run(input),
  drawRibbon: (timeline, layout, size) => Promise.resolve(ribbonCells(timeline, layout, size)),
  describe: (timeline, layout, song) => Promise.resolve(describeShow(timeline, layout, song)),
};

Comlink.expose(worker);
