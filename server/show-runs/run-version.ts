import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { JudgedRun } from "../../sandbox/checks/judge-run.ts";
import { newId } from "../db/schema/columns.ts";
import type { FeatureDeps } from "../deps.ts";
import { getBeatMap, songSeconds } from "../event/song.queries.ts";
import { getLayout } from "../event/square.queries.ts";
import { CHECK_RULES_VERSION, engineHash } from "./engine-hash.ts";
import { presentFinding, presentProblem } from "./present-problem.ts";
import { encodeRibbon } from "./ribbon-blob.ts";
import { findLatestRun, insertRun, listVersionsWithoutRun, type RunRow, type VersionRow } from "./runs.queries.ts";

/** What a run of a version came to, as its row keeps it. */
type RunResult = Pick<RunRow, "summary" | "hash" | "timeline" | "ribbon">;

/** Versions being run now: a hand-in and the pass for unfinished ones never run the same twice. */
const underWay = new Map<string, Promise<RunRow | null>>();

/**
 * Runs a version on its own layout and beat map, checks it and keeps the run. Gives null when the pool
 * could not take it (it is full or closing); the version is then run by the next start-up pass.
 */
export async function runVersion(
  deps: FeatureDeps,
  version: VersionRow,
  classId: string | null,
): Promise<RunRow | null> {
  const known = findLatestRun(deps.db, version.id);
  if (known) return known;
  const running = underWay.get(version.id) ?? runNow(deps, version, classId).finally(() => underWay.delete(version.id));
  underWay.set(version.id, running);
  return running;
}

async function runNow(
  { db, clock, runs, log }: FeatureDeps,
  version: VersionRow,
  classId: string | null,
): Promise<RunRow | null> {
  const { layout } = getLayout(db, version.layoutId);
  const song = getBeatMap(db, version.beatMapId);
  try {
    const input = { source: version.source, songId: version.songId, song, layout, seed: version.seed };
    const judged = await runs.judge(input, classId === null ? {} : { classId });
    const row: RunRow = {
      id: newId(),
      versionId: version.id,
      layoutId: version.layoutId,
      beatMapId: version.beatMapId,
      engine: engineHash(),
      rulesVersion: CHECK_RULES_VERSION,
      ...toResult(judged, song),
      createdAt: clock.now(),
    };
    insertRun(db, row);
    return row;
  } catch (error) {
    log.error(
      { err: error, versionId: version.id },
      "a version that was handed in was not run; it waits for the next pass",
    );
    return null;
  }
}

/** A judged run as its row keeps it. */
function toResult(judged: JudgedRun, song: BeatMap): RunResult {
  const { problem, hash, cueCount, findings, timeline, ribbon, description } = judged;
  return {
    summary: {
      isOk: problem === null,
      problem: problem && presentProblem(problem),
      hash,
      cueCount,
      findings: findings.map(presentFinding),
      seconds: songSeconds(song),
      description,
    },
    hash,
    timeline: timeline && Buffer.from(timeline),
    ribbon: ribbon && encodeRibbon(ribbon),
  };
}

/**
 * Runs every version that was handed in and never ran, oldest first, one after another: the process
 * ended between the two, or the pool was full. Called at start-up and again every minute; resolves with
 * how many were run.
 */
export async function runUnfinishedVersions(deps: FeatureDeps): Promise<number> {
  let count = 0;
  for (const version of listVersionsWithoutRun(deps.db)) {
    if ((await runVersion(deps, version, null)) !== null) count++;
  }
  if (count > 0) deps.log.info({ count }, "ran versions that were handed in and had not run");
  return count;
}
