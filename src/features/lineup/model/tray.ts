import type { ForwardSummary, Lineup } from "../../../../shared/contracts/lineup.ts";

export const TRAY_ORDERS = ["fewest", "title", "longest"] as const;
export type TrayOrder = (typeof TRAY_ORDERS)[number];

export const TRAY_ORDER_NAMES: Readonly<Record<TrayOrder, string>> = {
  fewest: "Fewest nights first",
  title: "By title",
  longest: "Longest first",
};

export interface TrayItem {
  readonly show: ForwardSummary;
  /** Nights of the season on which it is placed. */
  readonly nightCount: number;
}

const fold = (text: string) => text.normalize("NFKD").replace(/\p{M}/gu, "").toLowerCase();

/** The approved shows that fit the words typed (title, names, school), in the order asked for. */
export function listTray(lineup: Lineup, query: string, order: TrayOrder): readonly TrayItem[] {
  const words = fold(query).split(/\s+/).filter(Boolean);
  const byTitle = (a: TrayItem, b: TrayItem) => a.show.title.localeCompare(b.show.title);
  const compare: Record<TrayOrder, (a: TrayItem, b: TrayItem) => number> = {
    fewest: (a, b) => a.nightCount - b.nightCount || byTitle(a, b),
    title: byTitle,
    longest: (a, b) => b.show.seconds - a.show.seconds || byTitle(a, b),
  };
  return lineup.shows
    .map((show) => ({ show, nightCount: countNights(lineup, show.id) }))
    .filter(({ show }) => {
      const text = fold([show.title, ...show.authors, show.publicName, show.schoolName, show.className].join(" "));
      return words.every((word) => text.includes(word));
    })
    .sort(compare[order]);
}

function countNights(lineup: Lineup, forwardId: ForwardSummary["id"]): number {
  return new Set(lineup.slots.filter((slot) => slot.forwardId === forwardId).map((slot) => slot.nightId)).size;
}

/** "not placed yet", "1 night", "3 nights". */
export function presentNights(count: number): string {
  return count === 0 ? "not placed yet" : count === 1 ? "1 night" : `${count} nights`;
}
