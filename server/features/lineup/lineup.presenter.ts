import type { Lineup } from "../../../shared/contracts/lineup.ts";
import { ForwardIdSchema, NightIdSchema, SlotIdSchema } from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { findSquare } from "../../event/square.queries.ts";
import { tonightIn } from "../../event/night-time.ts";
import { countFindings, type ForwardFacts, gatherForwardFacts, presentForward } from "./forward.presenter.ts";
import {
  findLastPublication,
  findSeason,
  listApprovedForwards,
  listNights,
  listSlots,
  type NightRow,
  type SeasonRow,
  type SlotRow,
} from "./lineup.queries.ts";
import { checkPlan } from "./plan-check.ts";
import { countChanges, toPublishedNights, toPublishedSlots } from "./publication.ts";
import { ProblemError } from "../../../shared/problem.ts";

/** Everything that the board, its check and a publication are made from. */
export interface LoadedLineup {
  readonly season: SeasonRow;
  readonly timeZone: string;
  readonly tonight: string;
  readonly nights: readonly NightRow[];
  readonly slots: readonly SlotRow[];
  /** Approved shows, placed or not. */
  readonly shows: readonly ForwardFacts[];
  readonly last: ReturnType<typeof findLastPublication>;
  readonly findings: Lineup["findings"];
  /** Slots and nights that differ from the last publication. */
  readonly changeCount: number;
}

/** Loads the season's plan and checks it. Throws `not-found` before a square and a season are set up. */
export function loadLineup(db: Db, now: number): LoadedLineup {
  const square = findSquare(db);
  const season = findSeason(db);
  if (!square || !season) throw new ProblemError("not-found", { detail: "No season is set up yet." });
  const tonight = tonightIn(square.timeZone, now);
  const nights = listNights(db, season.id);
  const slots = listSlots(db, season.id);
  const shows = gatherForwardFacts(db, listApprovedForwards(db));
  const last = findLastPublication(db, season.id);
  const findings = checkPlan({
    times: season.times,
    nights,
    slots,
    tonight,
    shows: shows.map((show) => ({
      forwardId: show.forward.id,
      title: show.show.title,
      className: show.className,
      schoolName: show.schoolName,
      seconds: show.seconds,
      runs: show.run?.summary.isOk ?? false,
      stopCount: countFindings(show.run, "stop"),
      isOnCurrentLayout: (show.run?.layoutId ?? show.layoutId) === square.currentLayoutId,
    })),
  });
  const changeCount = countChanges(last?.publication ?? null, {
    nights: toPublishedNights(nights),
    slots: toPublishedSlots(nights, slots, shows),
  });
  return { season, timeZone: square.timeZone, tonight, nights, slots, shows, last, findings, changeCount };
}

/** The plan for the wire. */
export function presentLineup(loaded: LoadedLineup): Lineup {
  const { season, last } = loaded;
  return {
    season: { name: season.name, firstDate: season.firstDate, lastDate: season.lastDate, timeZone: loaded.timeZone },
    times: season.times,
    nights: loaded.nights.map((night) => ({
      id: NightIdSchema.parse(night.id),
      date: night.date,
      opensAt: night.opensAt,
      closesAt: night.closesAt,
      closedReason: night.closedReason,
    })),
    slots: loaded.slots.map((slot) => ({
      id: SlotIdSchema.parse(slot.id),
      nightId: NightIdSchema.parse(slot.nightId),
      startsAt: slot.startsAt,
      forwardId: ForwardIdSchema.parse(slot.forwardId),
      isPinned: slot.isPinned,
    })),
    shows: loaded.shows.map((show) => presentForward(show, false)),
    findings: loaded.findings,
    publication: last && { number: last.publication.number, publishedAt: last.publication.publishedAt, by: last.by },
    changeCount: loaded.changeCount,
    tonight: loaded.tonight,
  };
}
