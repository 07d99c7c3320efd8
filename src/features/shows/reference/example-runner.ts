import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import {
  findExampleNames,
  takeFirstBars,
  type WordEntry,
  writeExample,
} from "../../../../sandbox/language/reference/index.ts";
import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import { RunClient } from "../../../lib/run-client.ts";

/** Long enough for every example, short enough that a few beats are seen on a ribbon. */
const BARS = 16;
const SIZE = { rows: 14, columns: 96 };
/** Any luck will do, the same each time. */
const SEED = 7;

/** Runs the examples of the words on a square, one after the other. `dispose` ends it. */
export class ExampleRunner {
  readonly #runs = new RunClient();
  readonly #layout: Layout;
  readonly #song: BeatMap;
  #last: Promise<unknown> = Promise.resolve();

  constructor(layout: Layout, song: BeatMap) {
    this.#layout = layout;
    this.#song = takeFirstBars(song, BARS);
  }

  /** The example as it runs here. */
  write(entry: WordEntry): string {
    return writeExample(entry, findExampleNames(this.#layout, this.#song));
  }

  /** Its ribbon; null when it does not run on this square. Rejects after `dispose`. */
  draw(entry: WordEntry): Promise<RibbonCells | null> {
    const drawn = this.#last.then(async () => {
      const setting = { songId: "examples", song: this.#song, layout: this.#layout, seed: SEED };
      const outcome = await this.#runs.run({ ...setting, source: this.write(entry) });
      return outcome.ok ? this.#runs.drawRibbon(outcome.timeline, this.#layout, SIZE) : null;
    });
    this.#last = drawn.catch(() => undefined);
    return drawn;
  }

  dispose(): void {
    this.#runs.dispose();
  }
}
