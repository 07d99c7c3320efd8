import type { LineupFinding } from "../../../shared/contracts/lineup.ts";
import { ForwardIdSchema, NightIdSchema, SlotIdSchema } from "../../../shared/ids.ts";
import { clockOfNight, daysBetween, sayDate, secondsOfNight } from "../../event/night-time.ts";

/** Seconds that the crew has between two shows. Common practice, no source. */
export const CHANGEOVER_SECONDS = 60;

export interface PlannedNight {
  readonly id: string;
  readonly date: string;
  readonly opensAt: string;
  readonly closesAt: string;
  readonly closedReason: string | null;
}

export interface PlannedSlot {
  readonly id: string;
  readonly nightId: string;
  readonly startsAt: string;
  readonly forwardId: string;
}

export interface PlannedShow {
  readonly forwardId: string;
  readonly title: string;
  readonly className: string;
  readonly schoolName: string;
  readonly seconds: number;
  /** The script ran to its end on the server. */
  readonly runs: boolean;
  readonly stopCount: number;
  /** The run was made on the layout that the event uses now. */
  readonly isOnCurrentLayout: boolean;
}

export interface Plan {
  /** Start times that the board offers. */
  readonly times: readonly string[];
  readonly nights: readonly PlannedNight[];
  readonly slots: readonly PlannedSlot[];
  /** Approved shows, placed or not. */
  readonly shows: readonly PlannedShow[];
  /** Nights before this date are over: nothing is said about them and nothing is moved there. */
  readonly tonight: string;
}

type Fix = LineupFinding["fix"];
type Found = Omit<LineupFinding, "slotId" | "forwardId">;

/**
 * What is to be said about a plan, by night and time, then the shows with no place: each finding with
 * the smallest fix that clears it. A stop refuses publication. Pure; n slots cost about n log n, a
 * fix looks at every free place once.
 */
export function checkPlan(plan: Plan): LineupFinding[] {
  const shows = new Map(plan.shows.map((show) => [show.forwardId, show]));
  const findings: LineupFinding[] = [];
  for (const night of plan.nights
    .filter((one) => one.date >= plan.tonight)
    .sort((a, b) => a.date.localeCompare(b.date))) {
    const slots = slotsOf(plan, night);
    slots.forEach((slot, place) => {
      const show = shows.get(slot.forwardId);
      if (!show) return;
      const before = slots[place - 1];
      const spot = { plan, night, slot, show, before, showBefore: before && shows.get(before.forwardId) };
      for (const found of [...checkShow(spot), ...checkPlace(spot), ...checkNeighbour(spot)]) {
        findings.push({
          ...found,
          slotId: SlotIdSchema.parse(slot.id),
          forwardId: ForwardIdSchema.parse(slot.forwardId),
        });
      }
    });
  }
  return [...findings, ...checkTray(plan)];
}

interface Spot {
  readonly plan: Plan;
  readonly night: PlannedNight;
  readonly slot: PlannedSlot;
  readonly show: PlannedShow;
  readonly before: PlannedSlot | undefined;
  readonly showBefore: PlannedShow | undefined;
}

/** What is wrong with the show wherever it is placed. */
function checkShow({ show, slot }: Spot): Found[] {
  const found: Found[] = [];
  if (!show.runs) {
    found.push({
      rule: "does-not-run",
      severity: "stop",
      cause: "does not run",
      sentence: `"${show.title}" does not run on the server.`,
      fix: removeFix(slot),
    });
  } else if (show.stopCount > 0) {
    const stops = show.stopCount === 1 ? "a stop" : `${show.stopCount} stops`;
    found.push({
      rule: "show-has-stop",
      severity: "stop",
      cause: stops,
      sentence: `The show check of "${show.title}" has ${stops}.`,
      fix: removeFix(slot),
    });
  }
  if (!show.isOnCurrentLayout) {
    found.push({
      rule: "layout-changed",
      severity: "warn",
      cause: "older layout",
      sentence: `"${show.title}" was checked on an older layout of the square.`,
      fix: null,
    });
  }
  return found;
}

/** What is wrong with where the show is placed. */
function checkPlace(spot: Spot): Found[] {
  const { plan, night, slot, show } = spot;
  if (night.closedReason !== null) {
    return [
      {
        rule: "closed-night",
        severity: "stop",
        cause: "closed night",
        sentence: `${sayDate(night.date)} is closed (${night.closedReason}), but "${show.title}" is placed at ${slot.startsAt}.`,
        fix: moveFix(plan, slot, show) ?? removeFix(slot),
      },
    ];
  }
  const start = secondsOfNight(slot.startsAt);
  if (start + show.seconds > secondsOfNight(night.closesAt)) {
    return [
      {
        rule: "past-quiet-hour",
        severity: "stop",
        cause: "past quiet hour",
        sentence: `"${show.title}" ends at ${clockOfNight(start + show.seconds)}, but it must be quiet at ${night.closesAt}.`,
        fix: moveFix(plan, slot, show) ?? removeFix(slot),
      },
    ];
  }
  if (start < secondsOfNight(night.opensAt)) {
    return [
      {
        rule: "past-quiet-hour",
        severity: "stop",
        cause: "before the night opens",
        sentence: `"${show.title}" starts at ${slot.startsAt}, but the night opens at ${night.opensAt}.`,
        fix: moveFix(plan, slot, show) ?? removeFix(slot),
      },
    ];
  }
  return [];
}

/** What is wrong between a show and the one before it. */
function checkNeighbour({ plan, slot, show, before, showBefore }: Spot): Found[] {
  if (!before || !showBefore) return [];
  const found: Found[] = [];
  const freeAt = secondsOfNight(before.startsAt) + showBefore.seconds + CHANGEOVER_SECONDS;
  const late = freeAt - secondsOfNight(slot.startsAt);
  if (late > 0) {
    found.push({
      rule: "overlap",
      severity: "stop",
      cause: `${Math.ceil(late)} s too early`,
      sentence: `"${showBefore.title}" and the changeover last until ${clockOfNight(freeAt)}, but "${show.title}" starts at ${slot.startsAt}.`,
      fix: moveFix(plan, slot, show) ?? removeFix(slot),
    });
  }
  if (isSameClass(show, showBefore)) {
    found.push({
      rule: "same-class-twice",
      severity: "warn",
      cause: "same class twice",
      sentence: `"${showBefore.title}" and "${show.title}" are both by class ${show.className}, one after the other.`,
      fix: moveFix(plan, slot, show),
    });
  }
  return found;
}

function checkTray(plan: Plan): LineupFinding[] {
  const placed = new Set(plan.slots.map((slot) => slot.forwardId));
  return plan.shows
    .filter((show) => !placed.has(show.forwardId))
    .map((show) => ({
      rule: "not-placed" as const,
      severity: "note" as const,
      slotId: null,
      forwardId: ForwardIdSchema.parse(show.forwardId),
      cause: "no place yet",
      sentence: `"${show.title}" is approved and has no place in the plan.`,
      fix: null,
    }));
}

function removeFix(slot: PlannedSlot): Fix {
  return { kind: "remove", slotId: SlotIdSchema.parse(slot.id), label: "Take it off the plan" };
}

/** The nearest free place where the show fits: the same night first, then the nearest night, then the nearest time. */
function moveFix(plan: Plan, slot: PlannedSlot, show: PlannedShow): Fix {
  const home = plan.nights.find((night) => night.id === slot.nightId);
  if (!home) return null;
  const distance = (night: PlannedNight, time: string) =>
    Math.abs(daysBetween(home.date, night.date)) * 86_400 +
    Math.abs(secondsOfNight(time) - secondsOfNight(slot.startsAt));
  const others = { ...plan, slots: plan.slots.filter((one) => one.id !== slot.id) };
  const places = plan.nights
    .filter((night) => night.date >= plan.tonight && night.closedReason === null)
    .flatMap((night) => plan.times.map((time) => ({ night, time, distance: distance(night, time) })))
    .sort((a, b) => a.distance - b.distance);
  const place = places.find(
    ({ night, time }) => night.id + time !== slot.nightId + slot.startsAt && fits(others, night, time, show),
  );
  if (!place) return null;
  return {
    kind: "move",
    slotId: SlotIdSchema.parse(slot.id),
    nightId: NightIdSchema.parse(place.night.id),
    startsAt: place.time,
    label:
      place.night.id === slot.nightId ? `Move to ${place.time}` : `Move to ${sayDate(place.night.date)}, ${place.time}`,
  };
}

/** Whether a show fits at a place without touching its neighbours or following one of its own class. */
function fits(plan: Plan, night: PlannedNight, time: string, show: PlannedShow): boolean {
  const start = secondsOfNight(time);
  if (start < secondsOfNight(night.opensAt) || start + show.seconds > secondsOfNight(night.closesAt)) return false;
  const shows = new Map(plan.shows.map((one) => [one.forwardId, one]));
  const slots = slotsOf(plan, night);
  if (slots.some((slot) => slot.startsAt === time)) return false;
  const before = slots.filter((slot) => secondsOfNight(slot.startsAt) < start).at(-1);
  const after = slots.find((slot) => secondsOfNight(slot.startsAt) > start);
  const showBefore = before && shows.get(before.forwardId);
  const showAfter = after && shows.get(after.forwardId);
  if (before && showBefore && secondsOfNight(before.startsAt) + showBefore.seconds + CHANGEOVER_SECONDS > start)
    return false;
  if (after && start + show.seconds + CHANGEOVER_SECONDS > secondsOfNight(after.startsAt)) return false;
  return ![showBefore, showAfter].some((neighbour) => neighbour && isSameClass(neighbour, show));
}

function slotsOf(plan: Plan, night: PlannedNight): PlannedSlot[] {
  return plan.slots
    .filter((slot) => slot.nightId === night.id)
    .sort((a, b) => secondsOfNight(a.startsAt) - secondsOfNight(b.startsAt));
}

function isSameClass(a: PlannedShow, b: PlannedShow): boolean {
  return a.className === b.className && a.schoolName === b.schoolName;
}
