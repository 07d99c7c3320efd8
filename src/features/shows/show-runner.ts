import type { Finding, RunInput, RunOutcome } from "../../../sandbox/engine/model.ts";
import type { ShowDescription } from "../../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../../sandbox/timeline/model.ts";
import type { RibbonCells, RibbonSize } from "../../../sandbox/timeline/ribbon.ts";
import { RunClient } from "../../lib/run-client.ts";
import { CheckClient } from "./check-client.ts";

/** What does not change from one run of a show to the next. */
export type ShowSetting = Omit<RunInput, "source">;

/** Runs and checks the scripts of one show, in workers beside the page. `dispose` ends them. */
export class ShowRunner {
  readonly #setting: ShowSetting;
  readonly #runs = new RunClient();
  readonly #checks = new CheckClient();

  constructor(setting: ShowSetting) {
    this.#setting = setting;
  }

  /** The outcome of a script, with other luck than the setting's if given; the latest wins. Bound, so that it can be passed on. */
  readonly runScript = (source: string, seed = this.#setting.seed): Promise<RunOutcome> =>
    this.#runs.run({ ...this.#setting, source, seed });

  /** Findings of the show check on a timeline of this setting. Bound. */
  readonly checkShow = (timeline: Timeline): Promise<readonly Finding[]> => {
    const { layout, song } = this.#setting;
    return this.#checks.check({ timeline, layout, song });
  };

  /** The ribbon of a timeline of this setting. Bound. */
  readonly drawRibbon = (timeline: Timeline, size: RibbonSize): Promise<RibbonCells> =>
    this.#runs.drawRibbon(timeline, this.#setting.layout, size);

  /** A timeline of this setting in words. Bound. */
  readonly describeShow = (timeline: Timeline): Promise<ShowDescription> =>
    this.#runs.describe(timeline, this.#setting);

  dispose(): void {
    this.#runs.dispose();
    this.#checks.dispose();
  }
}
