import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { SIDES } from "../../shared/sides.ts";
import { COLOUR_NAMES } from "../language/colour-names.ts";
import type { NameTable } from "../language/names.ts";
import { frontBox, listFronts, listLights, type Light } from "../square/lights.ts";
import type { FrontTable, GuestTables, PartTable } from "./guest.ts";

function partsOf(lights: readonly Light[]): PartTable[] {
  const parts = new Map<string, { name: string; lights: number[]; box: string }>();
  for (const light of lights) {
    const part = parts.get(light.part);
    if (part === undefined) parts.set(light.part, { name: light.part, lights: [light.index], box: light.boxKind });
    else part.lights.push(light.index);
  }
  return [...parts.values()];
}

/** Everything a script can ask about a layout and a song, in the shape that crosses into the engine. */
export function buildTables(layout: Layout, song: BeatMap): GuestTables {
  const lights = listLights(layout);
  const fronts: FrontTable[] = listFronts(layout).map(({ front, lights: indexes }) => ({
    name: front.name,
    side: front.side,
    box: frontBox(front),
    parts: partsOf(indexes.flatMap((index) => lights[index] ?? [])),
  }));
  return {
    lightCount: lights.length,
    boxOf: lights.map((light) => light.boxKind),
    partOf: lights.map((light) => light.part),
    fronts,
    sides: SIDES,
    song: {
      beats: song.beats,
      beatsPerBar: song.beatsPerBar,
      bars: song.bars,
      sections: song.sections,
      instruments: song.instruments,
      loudness: song.loudness,
    },
    colours: COLOUR_NAMES,
  };
}

/** The names that a script may use with a layout and a song. */
export function listNames(layout: Layout, song: BeatMap): NameTable {
  const fronts = listFronts(layout).map(({ front }) => front);
  const distinct = (names: readonly string[]): string[] => [...new Set(names)];
  return {
    front: fronts.map((front) => front.name),
    side: SIDES,
    part: distinct(fronts.flatMap((front) => front.boxes.flatMap((box) => box.outlets.map((outlet) => outlet.part)))),
    section: distinct(song.sections.map((section) => section.name)),
    instrument: song.instruments.map((instrument) => instrument.name),
    colour: Object.keys(COLOUR_NAMES),
  };
}
