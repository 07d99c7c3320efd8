import type { Score } from "../../../../shared/contracts/songs.ts";
import { Ensemble } from "./ensemble.ts";
import { NoteQueue } from "./note-queue.ts";
import { createOfflineContext } from "./tone.ts";

export interface RenderRange {
  /** Seconds of the song. */
  readonly from: number;
  readonly to: number;
}

/** One channel of samples (-1 to 1) of a stretch of a score, as the player would sound it. */
export async function renderSong(score: Score, range: RenderRange, sampleRate = 44_100): Promise<Float32Array> {
  const context = createOfflineContext(range.to - range.from, sampleRate);
  const ensemble = await Ensemble.create(score, context, context.rawContext.destination);
  for (const note of new NoteQueue(score).listStarting(range.from, range.to))
    ensemble.play(note, note.start - range.from, note.lasts);
  const buffer = await context.render();
  const samples = buffer.getChannelData(0);
  ensemble.dispose();
  return samples;
}
