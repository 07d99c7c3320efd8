import type { ForwardSummary, Lineup, LineupFinding, Night, Slot } from "../../../../shared/contracts/lineup.ts";
import { addDays, countDays } from "../../../lib/zoned-time.ts";

const DAYS = 7;

/** One place of the board: a night's start time, and what is there. */
export type Cell =
  | {
      readonly kind: "slot";
      readonly slot: Slot;
      readonly show: ForwardSummary;
      readonly finding: LineupFinding | null;
    }
  | { readonly kind: "free"; readonly nightId: Night["id"]; readonly startsAt: string }
  | { readonly kind: "rest"; readonly reason: string };

export interface Column {
  readonly date: string;
  /** Null: the season has no such night. */
  readonly night: Night | null;
  readonly isTonight: boolean;
  readonly showCount: number;
  readonly freeCount: number;
  readonly stopCount: number;
  readonly lookCount: number;
}

/** A week of the plan: `cells[row][column]`, rows in the order of `times`. */
export interface Board {
  readonly times: readonly string[];
  readonly columns: readonly Column[];
  readonly cells: readonly (readonly Cell[])[];
}

/** The Monday on or before a date. */
export function toMonday(date: string): string {
  return addDays(date, -((new Date(date).getUTCDay() + 6) % 7));
}

/** The Mondays of the season's weeks, first to last. */
export function listWeeks(season: Lineup["season"]): readonly string[] {
  const first = toMonday(season.firstDate);
  const count = Math.floor(countDays(first, season.lastDate) / DAYS) + 1;
  return Array.from({ length: Math.max(count, 1) }, (_, week) => addDays(first, week * DAYS));
}

/** The week to open with: tonight's, or the nearest of the season. */
export function findOpeningWeek(lineup: Lineup): string {
  const weeks = listWeeks(lineup.season);
  const tonight = toMonday(lineup.tonight);
  return weeks.find((week) => week >= tonight) ?? weeks.at(-1) ?? tonight;
}

/** The week that begins on `monday`. Times outside the offered ones get a row of their own while a slot is there. */
export function buildBoard(lineup: Lineup, monday: string): Board {
  const dates = Array.from({ length: DAYS }, (_, day) => addDays(monday, day));
  const nights = dates.map((date) => lineup.nights.find((night) => night.date === date) ?? null);
  const ids = new Set(nights.flatMap((night) => (night ? [night.id] : [])));
  const slots = lineup.slots.filter((slot) => ids.has(slot.nightId));
  const times = [...new Set([...lineup.times, ...slots.map((slot) => slot.startsAt)])].sort();
  const cells = times.map((time) => nights.map((night) => toCell(lineup, night, time)));
  const columns = dates.map((date, column) =>
    toColumn(
      date,
      nights[column] ?? null,
      date === lineup.tonight,
      cells.map((row) => row[column]),
    ),
  );
  return { times, columns, cells };
}

function toCell(lineup: Lineup, night: Night | null, startsAt: string): Cell {
  if (!night) return { kind: "rest", reason: "no night" };
  const slot = lineup.slots.find((candidate) => candidate.nightId === night.id && candidate.startsAt === startsAt);
  const show = slot && lineup.shows.find((candidate) => candidate.id === slot.forwardId);
  if (slot && show) return { kind: "slot", slot, show, finding: findWorst(lineup.findings, slot.id) };
  if (night.date < lineup.tonight) return { kind: "rest", reason: "over" };
  if (night.closedReason !== null) return { kind: "rest", reason: night.closedReason };
  if (startsAt < night.opensAt || startsAt >= night.closesAt || !lineup.times.includes(startsAt))
    return { kind: "rest", reason: "dark" };
  return { kind: "free", nightId: night.id, startsAt };
}

const RANK = { stop: 0, warn: 1, note: 2 } as const;

function findWorst(findings: readonly LineupFinding[], slotId: Slot["id"]): LineupFinding | null {
  return (
    findings.filter((finding) => finding.slotId === slotId).sort((a, b) => RANK[a.severity] - RANK[b.severity])[0] ??
    null
  );
}

function toColumn(date: string, night: Night | null, isTonight: boolean, cells: readonly (Cell | undefined)[]): Column {
  const slots = cells.filter((cell) => cell?.kind === "slot");
  const count = (severity: LineupFinding["severity"]) =>
    slots.filter((cell) => cell.finding?.severity === severity).length;
  return {
    date,
    night,
    isTonight,
    showCount: slots.length,
    freeCount: cells.filter((cell) => cell?.kind === "free").length,
    stopCount: count("stop"),
    lookCount: count("warn"),
  };
}

/** Findings, worst first; the order of the plan is kept among equals. */
export function listFindings(lineup: Lineup): readonly LineupFinding[] {
  return [...lineup.findings].sort((a, b) => RANK[a.severity] - RANK[b.severity]);
}

export interface SchoolShare {
  readonly schoolName: string;
  readonly showCount: number;
  readonly slotCount: number;
  /** Part of all slots, 0 to 1. */
  readonly share: number;
}

/** How the stage is shared: every school with an approved show, most slots first. */
export function listShares(lineup: Lineup): readonly SchoolShare[] {
  const schools = [...new Set(lineup.shows.map((show) => show.schoolName))];
  return schools
    .map((schoolName) => {
      const ids = new Set(lineup.shows.filter((show) => show.schoolName === schoolName).map((show) => show.id));
      const slotCount = lineup.slots.filter((slot) => ids.has(slot.forwardId)).length;
      return {
        schoolName,
        showCount: ids.size,
        slotCount,
        share: lineup.slots.length === 0 ? 0 : slotCount / lineup.slots.length,
      };
    })
    .sort((a, b) => b.slotCount - a.slotCount || a.schoolName.localeCompare(b.schoolName));
}
