import type { Score, ScoreNote } from "../../../../shared/contracts/songs.ts";

/** A note with the track that plays it. */
export interface QueuedNote extends ScoreNote {
  /** Index into the score's tracks. */
  readonly track: number;
}

/** All notes of a score in the order they begin. */
export class NoteQueue {
  readonly #notes: readonly QueuedNote[];
  readonly #longest: number;

  constructor(score: Score) {
    this.#notes = score.tracks
      .flatMap((track, index) => track.notes.map((note) => ({ ...note, track: index })))
      .sort((a, b) => a.start - b.start || a.track - b.track);
    this.#longest = this.#notes.reduce((longest, note) => Math.max(longest, note.lasts), 0);
  }

  /** Notes that begin in from <= start < to, in seconds of the song. */
  listStarting(from: number, to: number): QueuedNote[] {
    const found: QueuedNote[] = [];
    for (let i = this.#findFirst(from); i < this.#notes.length; i += 1) {
      const note = this.#notes[i];
      if (!note || note.start >= to) break;
      found.push(note);
    }
    return found;
  }

  /** Notes that began before `at` and still sound there. */
  listSounding(at: number): QueuedNote[] {
    const found: QueuedNote[] = [];
    const until = this.#findFirst(at);
    for (let i = this.#findFirst(at - this.#longest); i < until; i += 1) {
      const note = this.#notes[i];
      if (note && note.start + note.lasts > at) found.push(note);
    }
    return found;
  }

  #findFirst(from: number): number {
    let low = 0;
    let high = this.#notes.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.#notes[middle]?.start ?? Infinity) < from) low = middle + 1;
      else high = middle;
    }
    return low;
  }
}
