import type { BeatMap } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";

/** A stretch of a song that has a name of its own, or a few bars. */
export interface SongSpan {
  /** Ticks; `end` is outside. */
  readonly start: number;
  readonly end: number;
  /** "chorus", "second chorus" where there are several, or null between sections. */
  readonly name: string | null;
  /** Numbers of its first and last bar. */
  readonly firstBar: number;
  readonly lastBar: number;
}

const ORDINALS = ["first", "second", "third", "fourth", "fifth", "sixth", "seventh", "eighth"] as const;
/** Bars that are taken together where the song has no sections. */
const GROUP_BARS = 4;

/** Gives the song from start to end as its sections and what lies between them, or in groups of four bars. */
export function listSongSpans(song: BeatMap): readonly SongSpan[] {
  const endTick = (song.beats.length - 1) * TICKS_PER_BEAT;
  const marks = song.sections.map((section, index) => ({
    start: Math.round(section.start * TICKS_PER_BEAT),
    end: Math.round(section.end * TICKS_PER_BEAT),
    name: nameSection(song, index),
  }));
  const spans: { start: number; end: number; name: string | null }[] = [];
  let at = 0;
  for (const mark of marks) {
    spans.push(...splitBars(song, at, mark.start), mark);
    at = mark.end;
  }
  spans.push(...splitBars(song, at, endTick));
  return spans
    .filter((span) => span.end > span.start)
    .map((span) => ({ ...span, firstBar: barNumberAt(song, span.start), lastBar: barNumberAt(song, span.end - 1) }));
}

/** Gives the bars of a song in ticks, the pick-up included. */
export function listBarSpans(
  song: BeatMap,
): readonly { readonly number: number; readonly start: number; readonly end: number }[] {
  const endTick = (song.beats.length - 1) * TICKS_PER_BEAT;
  return song.bars.map(({ number, start }, index) => {
    const next = song.bars[index + 1];
    return {
      number,
      start: Math.round(start * TICKS_PER_BEAT),
      end: next === undefined ? endTick : Math.round(next.start * TICKS_PER_BEAT),
    };
  });
}

/** Gives the number of the bar that a tick lies in; before the first bar the first, after the last the last. */
export function barNumberAt(song: BeatMap, tick: number): number {
  // Half a tick: moments in a beat map are rounded to ticks.
  const moment = (tick + 0.5) / TICKS_PER_BEAT;
  return (song.bars.findLast((bar) => bar.start <= moment) ?? song.bars[0])?.number ?? 1;
}

function nameSection(song: BeatMap, index: number): string {
  const name = song.sections[index]?.name ?? "";
  const same = song.sections.filter((section) => section.name === name);
  if (same.length < 2) return name;
  const nth = song.sections.slice(0, index + 1).filter((section) => section.name === name).length;
  const ordinal = ORDINALS[nth - 1];
  return ordinal === undefined ? `${name} number ${nth}` : `${ordinal} ${name}`;
}

function splitBars(song: BeatMap, start: number, end: number): { start: number; end: number; name: null }[] {
  const bars = listBarSpans(song).filter((bar) => bar.start < end && bar.end > start);
  const groups: { start: number; end: number; name: null }[] = [];
  for (let first = 0; first < bars.length; first += GROUP_BARS) {
    const last = bars[Math.min(first + GROUP_BARS, bars.length) - 1];
    groups.push({
      start: Math.max(start, bars[first]?.start ?? start),
      end: Math.min(end, last?.end ?? end),
      name: null,
    });
  }
  return groups;
}
