import { writeFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { benchAnySource } from "./any-source.ts";
import { benchChecks } from "./checks.ts";
import { benchHandIns } from "./hand-ins.ts";
import { benchHostile } from "./hostile.ts";
import { benchLanguage } from "./language.ts";
import { benchMarks } from "./marks.ts";
import { benchPages } from "./pages.ts";
import { benchRequests } from "./requests.ts";
import { benchRuns } from "./runs.ts";
import { benchStudio } from "./studio.ts";
import type { Figure } from "./measure.ts";

// `npm run bench [-- --json FILE]`: prints each figure; speed is judged by ratios measured in one run.
const { values } = parseArgs({ options: { json: { type: "string" } } });

const figures: Figure[] = [];
for (const bench of [
  benchRuns,
  benchMarks,
  benchChecks,
  benchLanguage,
  benchHandIns,
  benchRequests,
  benchPages,
  benchStudio,
  benchAnySource,
  benchHostile,
]) {
  for (const figure of await bench()) {
    figures.push(figure);
    const ratio = figure.ratio === null ? "" : `  ${figure.ratio.toFixed(2)} x ${figure.against ?? ""}`;
    console.log(`${figure.name}: ${figure.value.toFixed(figure.value < 10 ? 2 : 0)} ${figure.unit}${ratio}`);
  }
}
if (values.json !== undefined) writeFileSync(values.json, `${JSON.stringify(figures, null, 2)}\n`);
process.exit(0);
