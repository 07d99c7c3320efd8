import type { ScoreTrack } from "../../../../shared/contracts/songs.ts";

/** How a track sounds. */
export const FAMILIES = ["bells", "piano", "bass", "strings", "flute", "brass", "plucked", "drums"] as const;
export type Family = (typeof FAMILIES)[number];

/** First General MIDI program of each group and how it sounds here (General MIDI level 1, sound set). */
const PROGRAM_GROUPS: readonly (readonly [number, Family])[] = [
  [0, "piano"],
  [8, "bells"],
  [16, "flute"],
  [24, "plucked"],
  [32, "bass"],
  [40, "strings"],
  [56, "brass"],
  [64, "flute"],
  [80, "bells"],
  [88, "strings"],
  [104, "plucked"],
  [112, "bells"],
];

const WORDS: readonly (readonly [RegExp, Family])[] = [
  [/drum|percussion|kit|beat/i, "drums"],
  [/bell|chime|glock|celesta|music box|vibra/i, "bells"],
  [/bass|cello|tuba/i, "bass"],
  [/string|pad|choir|violin|viola|chord|organ/i, "strings"],
  [/flute|whistle|recorder|clarinet|oboe|pipe|voice/i, "flute"],
  [/horn|trumpet|brass|trombone/i, "brass"],
  [/guitar|harp|pluck|lute/i, "plucked"],
  [/piano|keys/i, "piano"],
];

/** The family of a track: drums by their channel, then by program, then by name, else bells. */
export function findFamily(track: Pick<ScoreTrack, "name" | "program" | "isDrums">): Family {
  if (track.isDrums) return "drums";
  const { program } = track;
  if (program !== null) return PROGRAM_GROUPS.findLast(([first]) => program >= first)?.[1] ?? "piano";
  return WORDS.find(([word]) => word.test(track.name))?.[1] ?? "bells";
}
