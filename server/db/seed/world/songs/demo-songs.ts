import type { BeatMap } from "../../../../../shared/contracts/songs.ts";
import { buildBeatMap } from "../../../../../sandbox/music/beat-map.ts";
import { writeMidi } from "../../../../../sandbox/music/write-midi.ts";
import { arrange } from "./arrange.ts";
import type { SongPlan } from "./arrange.ts";
import { FROST_FAIR } from "./frost-fair.ts";
import { GOOD_KING_WENCESLAS } from "./good-king-wenceslas.ts";
import { JINGLE_BELLS } from "./jingle-bells.ts";
import { LANTERN_WALTZ } from "./lantern-waltz.ts";
import { QUILLHAVEN_BELLS } from "./quillhaven-bells.ts";
import { SKATERS_JIG } from "./skaters-jig.ts";

/** A song of the demo world, ready to be stored. */
export interface DemoSong {
  readonly id: string;
  readonly title: string;
  readonly credit: string;
  /** What the file is called when it is uploaded or downloaded. */
  readonly fileName: string;
  /** The Standard MIDI File. */
  readonly file: Uint8Array;
  readonly beatMap: BeatMap;
}

function play(plan: SongPlan): DemoSong {
  const midi = arrange(plan);
  return {
    id: plan.id,
    title: plan.title,
    credit: plan.credit,
    fileName: `${plan.id}.mid`,
    file: writeMidi(midi),
    beatMap: buildBeatMap(midi),
  };
}

/** The six songs of the season: four in bars of four, a waltz with a pick-up, a jig counted in two. */
export const DEMO_SONGS: readonly DemoSong[] = [
  FROST_FAIR,
  QUILLHAVEN_BELLS,
  JINGLE_BELLS,
  GOOD_KING_WENCESLAS,
  LANTERN_WALTZ,
  SKATERS_JIG,
].map(play);

/** One of the songs of the demo world by its id. */
export function demoSong(id: string): DemoSong {
  const song = DEMO_SONGS.find((one) => one.id === id);
  if (!song) throw new RangeError(`The demo world has no song "${id}".`);
  return song;
}
