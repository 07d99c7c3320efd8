import type { z } from "zod";
import type { lineupContract } from "../../../shared/contracts/lineup.ts";
import { SlotIdSchema } from "../../../shared/ids.ts";
import type { Clock } from "../../clock.ts";
import type { Db } from "../../db/connection.ts";
import { tonightIn } from "../../event/night-time.ts";
import { findSquare } from "../../event/square.queries.ts";
import { presentRibbonThreads } from "../../show-runs/ribbon-blob.ts";
import { listRuns } from "../../show-runs/runs.queries.ts";
import { findLastPublication, findSeason } from "./lineup.queries.ts";

type Programme = z.input<typeof lineupContract.programme.response>;

/**
 * The programme for everybody, from the last publication alone: what the coordinator changes since
 * then stays unseen. Before the first publication it has no nights and no shows.
 */
export function getProgramme({ db, clock }: { readonly db: Db; readonly clock: Clock }): Programme {
  const square = findSquare(db);
  const season = findSeason(db);
  const publication = season ? findLastPublication(db, season.id)?.publication : undefined;
  const timeZone = square?.timeZone ?? "UTC";
  const runs = listRuns(db, [...new Set(publication?.slots.map((slot) => slot.runId))]);
  return {
    eventName: square?.eventName ?? "",
    townName: square?.townName ?? "",
    timeZone,
    tonight: tonightIn(timeZone, clock.now()),
    publishedAt: publication?.publishedAt ?? null,
    nights: publication?.nights ?? [],
    shows: (publication?.slots ?? []).map((slot) => ({
      slotId: SlotIdSchema.parse(slot.slotId),
      date: slot.date,
      startsAt: slot.startsAt,
      title: slot.title,
      publicName: slot.publicName,
      schoolName: slot.schoolName,
      songTitle: slot.songTitle,
      seconds: slot.seconds,
      description: slot.description,
      ribbon: presentRibbonThreads(runs.get(slot.runId)?.ribbon ?? null),
    })),
  };
}
