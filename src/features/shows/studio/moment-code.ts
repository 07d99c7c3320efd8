import type { BeatMap } from "../../../../shared/contracts/songs.ts";

/** A way to write a moment. */
export interface MomentCode {
  readonly code: string;
  readonly meaning: string;
}

/** The beat of the song on which a beat of a bar lies, from 0. */
export function findBeatOfBar(song: Pick<BeatMap, "bars">, bar: number, beat: number): number {
  const found = song.bars.find((candidate) => candidate.number === bar);
  return Math.round((found?.start ?? 0) + beat - 1);
}

/** Every way to write the moment of a beat of a bar: what happens there, then the moment itself. */
export function listMomentCodes(song: BeatMap, bar: number, beat: number): readonly MomentCode[] {
  const moment = findBeatOfBar(song, bar, beat);
  const place = beat === 1 ? `song.bar(${bar})` : `song.bar(${bar}, ${beat})`;
  const section = song.sections.findIndex(({ start }) => Math.abs(start - moment) < 1e-6);
  const named = section < 0 ? null : `${nameSection(song, section)}.start`;
  return [
    { code: `waitUntil(${named ?? place});`, meaning: "The script goes on here." },
    { code: `at(${named ?? place}, () => {\n  \n});`, meaning: "Does it here, wherever the script is." },
    { code: place, meaning: beat === 1 ? "The bar by its number." : "The beat in its bar." },
    { code: String(moment), meaning: "The same, counted in beats of the song." },
    ...(named ? [{ code: named, meaning: "The same, by its section." }] : []),
  ];
}

/** `song.section("chorus", 2)`: the second of that name. */
function nameSection(song: Pick<BeatMap, "sections">, index: number): string {
  const name = song.sections[index]?.name ?? "";
  const nth = song.sections.slice(0, index + 1).filter((section) => section.name === name).length;
  return nth === 1 ? `song.section("${name}")` : `song.section("${name}", ${nth})`;
}
