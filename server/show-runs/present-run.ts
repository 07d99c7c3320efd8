import type { RunSummary } from "../../shared/contracts/common.ts";
import type { VersionSummary } from "../../shared/contracts/shows.ts";
import { VersionIdSchema } from "../../shared/ids.ts";
import { presentRibbonFace } from "./ribbon-blob.ts";
import type { RunFace, VersionRow } from "./runs.queries.ts";

/** What is said of a version that was handed in and that the server has not run yet. */
export function presentRunSummary(run: Pick<RunFace, "summary"> | null | undefined, seconds: number): RunSummary {
  if (run) return run.summary;
  return {
    isOk: false,
    problem: null,
    hash: null,
    cueCount: 0,
    findings: [],
    seconds,
    description: "The server has not run this script yet. It is kept, and it runs as soon as there is room.",
  };
}

/** A version for a list, with its latest run. */
export function presentVersion(version: VersionRow, run: RunFace | undefined, seconds: number): VersionSummary {
  return {
    id: VersionIdSchema.parse(version.id),
    number: version.number,
    createdAt: version.createdAt,
    run: presentRunSummary(run, seconds),
    ribbon: presentRibbonFace(run?.ribbon ?? null),
  };
}
