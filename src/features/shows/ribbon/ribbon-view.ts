import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import type { TickLoop } from "./song-place.ts";

/** The least that a ribbon shows, in bars of the song's first meter. */
const LEAST_BARS = 2;
const ZOOM_STEP = 2;

/** All of a song, in ticks. */
export function wholeSong({ beats }: Pick<BeatMap, "beats">): TickLoop {
  return { start: 0, end: (beats.length - 1) * TICKS_PER_BEAT };
}

/** Moves a stretch into the song; its length stays, unless it is longer than the song. */
export function keepInside({ start, end }: TickLoop, song: Pick<BeatMap, "beats">): TickLoop {
  const whole = wholeSong(song);
  const length = Math.min(end - start, whole.end);
  const from = Math.min(Math.max(0, start), whole.end - length);
  return { start: Math.round(from), end: Math.round(from + length) };
}

/** Half as much (`in`) or twice as much (`out`) around a tick, which stays where it is on the ribbon. */
export function zoomView(
  view: TickLoop,
  song: Pick<BeatMap, "beats" | "beatsPerBar">,
  { way, around }: { readonly way: "in" | "out"; readonly around: number },
): TickLoop {
  const least = Math.min(LEAST_BARS * song.beatsPerBar * TICKS_PER_BEAT, wholeSong(song).end);
  const wanted = (view.end - view.start) * (way === "in" ? 1 / ZOOM_STEP : ZOOM_STEP);
  const length = Math.max(least, wanted);
  const centre = Math.min(Math.max(around, view.start), view.end);
  const share = (centre - view.start) / (view.end - view.start);
  return keepInside({ start: centre - share * length, end: centre + (1 - share) * length }, song);
}

/** The view that shows a tick: the same where it does already, else the page that begins a little before it. */
export function followTickInView(view: TickLoop, song: Pick<BeatMap, "beats">, tick: number): TickLoop {
  if (tick >= view.start && tick < view.end) return view;
  const length = view.end - view.start;
  const next = keepInside({ start: tick - length * 0.05, end: tick + length * 0.95 }, song);
  return next.start === view.start ? view : next;
}
