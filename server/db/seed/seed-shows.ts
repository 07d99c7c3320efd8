import { eq } from "drizzle-orm";
import { LANGUAGE_VERSION } from "../../../sandbox/timeline/model.ts";
import type { FeatureDeps } from "../../deps.ts";
import { encodeRibbon } from "../../show-runs/ribbon-blob.ts";
import { runVersion } from "../../show-runs/run-version.ts";
import type { RunRow, VersionRow } from "../../show-runs/runs.queries.ts";
import { inTransaction } from "../connection.ts";
import { newId } from "../schema/columns.ts";
import { drafts, showAuthors, shows, showVersions } from "../schema/index.ts";
import type { SeedDay } from "./seed-day.ts";
import type { SeededEvent } from "./seed-event.ts";
import type { SeededPeople } from "./seed-people.ts";
import type { DemoScript } from "./world/scripts/demo-script.ts";
import { DEMO_SCRIPTS } from "./world/scripts/index.ts";
import { DEMO_SQUARE } from "./world/square.ts";
import { demoSong } from "./world/songs/demo-songs.ts";
import { type DemoWork, WORK } from "./world/work.ts";

/** A seeded show; `versions` oldest first, empty while it is only a draft. */
export interface SeededShow {
  readonly showId: string;
  readonly script: DemoScript;
  readonly work: DemoWork | null;
  readonly versions: readonly VersionRow[];
}

const BEGUN_DAYS_BEFORE = 3;
const LESSON_ENDS = "11:35";

/**
 * Adds a show for every script, its draft and the versions that were handed in, and runs all of them
 * through the pool: nothing of the demo world is pretended.
 */
export async function seedShows(
  deps: FeatureDeps,
  day: SeedDay,
  people: SeededPeople,
  event: SeededEvent,
  assignmentIds: ReadonlyMap<string, string>,
): Promise<SeededShow[]> {
  const seeded = DEMO_SCRIPTS.map((script) => buildShow(script, day, people, event));
  inTransaction(deps.db, (tx) => {
    for (const { showId, script, work, versions } of seeded) {
      const lastDay = work?.handedInDay ?? -1;
      const createdAt = day.before(lastDay - BEGUN_DAYS_BEFORE, "10:55");
      const assignmentId = work === null ? null : (assignmentIds.get(work.assignment) ?? null);
      tx.insert(shows)
        .values({ id: showId, title: script.title, songId: script.songId, assignmentId, seed: script.seed, createdAt })
        .run();
      for (const author of script.authors)
        tx.insert(showAuthors)
          .values({ showId, userId: getId(people.userIds, author) })
          .run();
      const savedBy = getId(people.userIds, script.authors[0] ?? "");
      const revision = versions.length + 1;
      tx.insert(drafts)
        .values({ showId, revision, source: script.source, savedAt: day.before(lastDay, LESSON_ENDS), savedBy })
        .run();
      for (const version of versions) tx.insert(showVersions).values(version).run();
    }
  });
  await Promise.all(seeded.map((show) => runShow(deps, show)));
  return seeded;
}

/** The id behind a key of the demo world. Throws when there is none. */
export function getId(ids: ReadonlyMap<string, string>, key: string): string {
  const id = ids.get(key);
  if (id === undefined) throw new Error(`The demo world names "${key}", which it does not have.`);
  return id;
}

function buildShow(script: DemoScript, day: SeedDay, people: SeededPeople, event: SeededEvent): SeededShow {
  const showId = newId();
  const work = WORK.find((one) => one.scriptId === script.id) ?? null;
  const handedInDay = work?.handedInDay ?? null;
  const sources = handedInDay === null ? [] : [...(work?.earlier ?? []), script.source];
  const versions = sources.map((source, n): VersionRow => ({
    id: newId(),
    showId,
    number: n + 1,
    source,
    seed: script.seed,
    language: LANGUAGE_VERSION,
    songId: script.songId,
    layoutId: event.layoutId,
    beatMapId: getId(event.beatMapIds, script.songId),
    createdBy: getId(people.userIds, script.authors[0] ?? ""),
    createdAt: day.before((handedInDay ?? 0) - (sources.length - 1 - n), LESSON_ENDS),
  }));
  return { showId, script, work, versions };
}

/** Runs the versions, and the draft for its ribbon unless it is the last version. */
async function runShow(deps: FeatureDeps, show: SeededShow): Promise<void> {
  const { showId, script, versions } = show;
  const [classCode = ""] = (script.authors[0] ?? "").split("/");
  let last: RunRow | null = null;
  for (const version of versions) last = await runVersion(deps, version, classCode);
  const { problem, ribbon } =
    last === null ? await runDraft(deps, script, classCode) : { problem: last.summary.problem, ribbon: last.ribbon };
  if ((problem === null) !== script.expected.runs) {
    throw new Error(
      `${script.id} of the demo world came out otherwise than expected: ${problem === null ? "it runs" : problem.sentence}`,
    );
  }
  if (problem === null) setDraftRibbon(deps, showId, ribbon);
}

async function runDraft({ runs }: FeatureDeps, { songId, source, seed }: DemoScript, classId: string) {
  const song = demoSong(songId).beatMap;
  const { problem, ribbon } = await runs.judge({ source, songId, song, layout: DEMO_SQUARE, seed }, { classId });
  return { problem, ribbon: ribbon && encodeRibbon(ribbon) };
}

function setDraftRibbon({ db }: FeatureDeps, showId: string, ribbon: Buffer | null): void {
  db.update(drafts).set({ ribbon }).where(eq(drafts.showId, showId)).run();
}
