import { createEngine } from "../../sandbox/engine/engine.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { endOfOutcome } from "../engine-hosts/ends.ts";
import { toLine } from "./golden-lines.ts";
import { listGoldenScripts } from "./golden-scripts.ts";

/**
 * Runs every golden script in this process, which lives in the time zone and the locale of its
 * environment: prints both, then a line for each script.
 */
const { timeZone, locale } = Intl.DateTimeFormat().resolvedOptions();
console.log(`${timeZone} ${locale}`);
const engine = createEngine(await createNodeHost());
for (const { name, input } of listGoldenScripts())
  console.log(toLine(name, await endOfOutcome(await engine.run(input))));
