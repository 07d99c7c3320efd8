import type { BeatMap } from "../../../shared/contracts/songs.ts";
import type { Layout } from "../../../shared/contracts/square.ts";
import { listFronts } from "../../square/lights.ts";
import type { WordEntry } from "./entry.ts";

/** The names that examples use on a square with a song, by the place they stand in. */
export type ExampleNames = Readonly<
  Record<"front" | "partOfFront" | "part" | "side" | "section" | "instrument", string>
>;

/** Names that exist on this square and in this song: the first front on a side with its part and side, a section, a melody. */
export function findExampleNames(layout: Layout, song: BeatMap): ExampleNames {
  const fronts = listFronts(layout).map(({ front }) => front);
  const front = fronts.find((one) => one.side !== null) ?? fronts[0];
  const part = front?.boxes[0]?.outlets[0]?.part ?? "";
  const melody = song.instruments.find((instrument) => instrument.notes.length > 0) ?? song.instruments[0];
  return {
    front: front?.name ?? "",
    partOfFront: part,
    part,
    side: front?.side ?? "north",
    section: song.sections[0]?.name ?? "",
    instrument: melody?.name ?? "",
  };
}

/** The example of a word as a script that runs on the square and with the song whose names are given. */
export function writeExample(entry: WordEntry, names: ExampleNames): string {
  return entry.example.replace(/\{(\w+)\}/g, (place, kind: string) =>
    Object.hasOwn(names, kind) ? names[kind as keyof ExampleNames] : place,
  );
}
