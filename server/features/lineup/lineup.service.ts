import type { Lineup } from "../../../shared/contracts/lineup.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import { secondsOfNight, tonightIn } from "../../event/night-time.ts";
import { findSquare } from "../../event/square.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { loadLineup, presentLineup } from "./lineup.presenter.ts";
import {
  deleteSlot,
  findSeason,
  findSlotAt,
  getForward,
  getNight,
  getSlot,
  insertPublication,
  insertSlot,
  type NightRow,
  type SlotRow,
  updateNight,
  updateSlot,
} from "./lineup.queries.ts";
import { toPublishedNights, toPublishedSlots } from "./publication.ts";

interface LineupDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/** The season's plan with its findings. Throws `not-found` before a season is set up. */
export function getLineup({ db, clock }: LineupDeps): Lineup {
  return presentLineup(loadLineup(db, clock.now()));
}

/**
 * Places an approved show. Throws `wrong-state` for a show that is not approved and for a night that
 * is over or closed, `slot-taken`, `invalid-request` for a time that the board does not offer.
 */
export function placeShow(deps: LineupDeps, input: { forwardId: string; nightId: string; startsAt: string }): Lineup {
  return change(deps, (db) => {
    const { forward } = getForward(db, input.forwardId);
    if (forward.state !== "approved")
      throw new ProblemError("wrong-state", { detail: "Approve the show first, then place it." });
    assertPlace(deps, db, getNight(db, input.nightId), input.startsAt);
    const taken = findSlotAt(db, input.nightId, input.startsAt, null);
    if (taken) throw slotTaken(taken);
    insertSlot(db, { id: newId(), ...input });
  });
}

/**
 * Moves or pins a slot. Onto a taken time the two change places when `swap` says so, else it throws
 * `slot-taken`. A pinned slot moves only when unpinned in the same call (`wrong-state`).
 */
export function moveSlot(
  deps: LineupDeps,
  slotId: string,
  input: { nightId?: string | undefined; startsAt?: string | undefined; isPinned?: boolean | undefined; swap: boolean },
): Lineup {
  return change(deps, (db) => {
    const slot = getSlot(db, slotId);
    const nightId = input.nightId ?? slot.nightId;
    const startsAt = input.startsAt ?? slot.startsAt;
    const isPinned = input.isPinned ?? slot.isPinned;
    const moves = nightId !== slot.nightId || startsAt !== slot.startsAt;
    if (moves) {
      if (slot.isPinned && input.isPinned !== false)
        throw new ProblemError("wrong-state", { detail: "This slot is pinned. Take the pin out first." });
      assertNotOver(deps, db, getNight(db, slot.nightId));
      assertPlace(deps, db, getNight(db, nightId), startsAt);
      makeRoom(db, slot, { nightId, startsAt, swap: input.swap });
    }
    updateSlot(db, slotId, { nightId, startsAt, isPinned });
  });
}

/** Takes a slot off the plan; its show goes back to the tray. Throws `not-found`. */
export function removeSlot(deps: LineupDeps, slotId: string): Lineup {
  return change(deps, (db) => deleteSlot(db, getSlot(db, slotId).id));
}

/** Changes a night's hours, closes it with a reason or opens it (null). Throws `invalid-request`, `not-found`. */
export function setNight(
  deps: LineupDeps,
  nightId: string,
  input: { opensAt?: string | undefined; closesAt?: string | undefined; closedReason?: string | null | undefined },
): Lineup {
  return change(deps, (db) => {
    const night = getNight(db, nightId);
    const next = { opensAt: input.opensAt ?? night.opensAt, closesAt: input.closesAt ?? night.closesAt };
    if (secondsOfNight(next.closesAt) <= secondsOfNight(next.opensAt))
      throw fieldProblem("/closesAt", "The night has to close after it opens.");
    if (input.closedReason === "")
      throw fieldProblem("/closedReason", "Say why the night is closed, so that families know.");
    updateNight(db, nightId, {
      ...next,
      closedReason: input.closedReason === undefined ? night.closedReason : input.closedReason,
    });
  });
}

/**
 * Publishes the plan as it stands. Throws `lineup-has-stops` with `{ findings }`, `already-done` when
 * nothing changed since the last publication.
 */
export function publishLineup({ db, clock }: LineupDeps, actor: Actor): { number: number; publishedAt: number } {
  return inTransaction(db, (tx) => {
    const loaded = loadLineup(tx, clock.now());
    const stops = loaded.findings.filter((finding) => finding.severity === "stop");
    if (stops.length > 0) {
      const detail = stops.length === 1 ? "One stop is open." : `${stops.length} stops are open.`;
      throw new ProblemError("lineup-has-stops", { detail, extensions: { findings: stops } });
    }
    if (loaded.last && loaded.changeCount === 0)
      throw new ProblemError("already-done", { detail: "Nothing changed since the last publication." });
    const number = (loaded.last?.publication.number ?? 0) + 1;
    const publishedAt = clock.now();
    insertPublication(tx, {
      id: newId(),
      seasonId: loaded.season.id,
      number,
      nights: toPublishedNights(loaded.nights),
      slots: toPublishedSlots(loaded.nights, loaded.slots, loaded.shows),
      publishedBy: actor.userId,
      publishedAt,
    });
    appendAudit(tx, {
      at: publishedAt,
      actorId: actor.userId,
      event: "lineup-published",
      subject: loaded.season.id,
      detail: { number, changes: loaded.changeCount },
    });
    return { number, publishedAt };
  });
}

/** One change of the plan in a transaction, and the plan as it then is. */
function change(deps: LineupDeps, work: (db: Db) => void): Lineup {
  return inTransaction(deps.db, (tx) => {
    work(tx);
    return presentLineup(loadLineup(tx, deps.clock.now()));
  });
}

function assertPlace(deps: LineupDeps, db: Db, night: NightRow, startsAt: string): void {
  assertNotOver(deps, db, night);
  if (night.closedReason !== null)
    throw new ProblemError("wrong-state", { detail: `This night is closed: ${night.closedReason}.` });
  const times = findSeason(db)?.times ?? [];
  if (!times.includes(startsAt)) throw fieldProblem("/startsAt", `The board offers these times: ${times.join(", ")}.`);
}

function assertNotOver({ clock }: LineupDeps, db: Db, night: NightRow): void {
  const tonight = tonightIn(findSquare(db)?.timeZone ?? "UTC", clock.now());
  if (night.date < tonight) throw new ProblemError("wrong-state", { detail: "That night is over." });
}

/** The unique index would refuse two slots at one time even for a moment, so one of them waits at no time at all. */
const BETWEEN_TWO_TIMES = "swapping";

function makeRoom(db: Db, slot: SlotRow, to: { nightId: string; startsAt: string; swap: boolean }): void {
  const taken = findSlotAt(db, to.nightId, to.startsAt, slot.id);
  if (!taken) return;
  if (!to.swap) throw slotTaken(taken);
  if (taken.isPinned)
    throw new ProblemError("wrong-state", { detail: "The slot there is pinned. Take its pin out first." });
  updateSlot(db, slot.id, { startsAt: BETWEEN_TWO_TIMES });
  updateSlot(db, taken.id, { nightId: slot.nightId, startsAt: slot.startsAt });
}

function slotTaken(taken: SlotRow): ProblemError {
  return new ProblemError("slot-taken", {
    detail: `Another show starts at ${taken.startsAt} that night.`,
    extensions: { slotId: taken.id },
  });
}
