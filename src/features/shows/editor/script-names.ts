import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout, Silhouette } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import { COLOUR_NAMES } from "../../../../sandbox/language/colour-names.ts";
import type { NameTable } from "../../../../sandbox/language/names.ts";
import type { NameKind } from "../../../../sandbox/language/words.ts";
import { listFronts } from "../../../../sandbox/square/lights.ts";
import { colourToHex } from "../../../../sandbox/timeline/colour.ts";

/** One name that a script may use, with what helps to know it again. */
export interface ScriptName {
  readonly name: string;
  readonly note: string;
  readonly silhouette?: Silhouette;
  /** `#rrggbb` of a colour. */
  readonly swatch?: string;
}

/** All names of a layout and a song, by kind. */
export type ScriptNames = { readonly [K in NameKind]: readonly ScriptName[] };

/** The bare names, as the type checker wants them. */
export function toNameTable(names: ScriptNames): NameTable {
  const bare = (kind: NameKind) => names[kind].map(({ name }) => name);
  return {
    front: bare("front"),
    side: bare("side"),
    part: bare("part"),
    section: bare("section"),
    instrument: bare("instrument"),
    colour: bare("colour"),
  };
}

/** The names that scripts may use on this square with this song. */
export function listScriptNames(layout: Layout, song: BeatMap): ScriptNames {
  const fronts = listFronts(layout).map(({ front }) => front);
  const partsOf = (boxes: (typeof fronts)[number]["boxes"]) =>
    boxes.flatMap((box) => box.outlets.map((outlet) => outlet.part));
  const parts = new Map<string, number>();
  for (const front of fronts)
    for (const part of new Set(partsOf(front.boxes))) parts.set(part, (parts.get(part) ?? 0) + 1);
  const sections = new Map<string, number>();
  for (const section of song.sections) sections.set(section.name, (sections.get(section.name) ?? 0) + 1);
  return {
    front: fronts.map((front) => ({
      name: front.name,
      note: `${front.side === null ? "in the middle" : `${front.side} side`} · ${partsOf(front.boxes).join(", ")}`,
      silhouette: front.silhouette,
    })),
    side: SIDES.map((side) => ({
      name: side,
      note: countOf(fronts.filter((front) => front.side === side).length, "front"),
    })),
    part: [...parts]
      .sort((a, b) => b[1] - a[1])
      .map(([name, count]) => ({ name, note: `of ${countOf(count, "front")}` })),
    section: [...sections].map(([name, count]) => ({
      name,
      note: count === 1 ? "a section of the song" : `${count} times in the song`,
    })),
    instrument: song.instruments.map((instrument) => ({
      name: instrument.name,
      note: countOf(instrument.hits.length, "hit"),
    })),
    colour: Object.entries(COLOUR_NAMES).map(([name, value]) => ({ name, note: "", swatch: colourToHex(value) })),
  };
}

function countOf(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? "" : "s"}`;
}
