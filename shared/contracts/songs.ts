import { z } from "zod";
import { defineContract } from "../contract.ts";
import { SongIdSchema } from "../ids.ts";

/**
 * A song as scripts see it: the beat map. Everything a script can read of a song comes from this
 * document; nothing of it is worked out while a script runs.
 *
 * Moments and lengths are in beats, rounded to 1/960 beat. Moment 0 is the last beat at or before
 * the first sound. `beats[i]` is the time of beat i in whole microseconds from the start of the
 * audio; the last entry is the song's end (the end of the last whole bar at or after the last sound).
 */

const MomentSchema = z.number().min(0).max(20_000);

export const NoteSchema = z.object({
  start: MomentSchema,
  beats: z.number().positive().max(1000),
  /** MIDI key number: 60 is middle C, 69 is A at 440 Hz. */
  pitch: z.int().min(0).max(127),
});
export type Note = z.infer<typeof NoteSchema>;

export const InstrumentSchema = z.object({
  name: z.string().min(1).max(40),
  /** Sorted, no two at one moment. */
  hits: z.array(MomentSchema),
  /** Sorted by start then pitch; empty for recordings. */
  notes: z.array(NoteSchema),
});
export type Instrument = z.infer<typeof InstrumentSchema>;

export const BarSchema = z.object({
  /** 1 is the first whole bar; 0 is a pick-up before it. */
  number: z.int().min(0),
  start: MomentSchema,
  /** Beats in this bar, as the meter counts them (6/8 counts two). A pick-up has its own count. */
  beats: z.int().min(1).max(32),
});
export type Bar = z.infer<typeof BarSchema>;

export const SectionSchema = z.object({
  name: z.string().min(1).max(40),
  start: MomentSchema,
  end: MomentSchema,
});
export type Section = z.infer<typeof SectionSchema>;

export const BeatMapSchema = z.object({
  version: z.literal(1),
  /** Microseconds, strictly rising; length = beats of the song + 1. */
  beats: z.array(z.int().min(0)).min(2).max(20_000),
  /** Beats a bar of the song's first meter. */
  beatsPerBar: z.int().min(1).max(32),
  bars: z.array(BarSchema).min(1),
  /** In order, not overlapping. */
  sections: z.array(SectionSchema),
  instruments: z.array(InstrumentSchema),
  /** 0 to 100, one value for each quarter of a beat from moment 0. */
  loudness: z.array(z.int().min(0).max(100)),
});
export type BeatMap = z.infer<typeof BeatMapSchema>;

/** A note as it is played: times in seconds from the start of the audio. */
export const ScoreNoteSchema = z.object({
  start: z.number().min(0),
  lasts: z.number().min(0),
  /** MIDI key number: 60 is middle C, 69 is A at 440 Hz. */
  pitch: z.int().min(0).max(127),
  velocity: z.number().min(0).max(1),
});
export type ScoreNote = z.infer<typeof ScoreNoteSchema>;

export const ScoreTrackSchema = z.object({
  /** The instrument's name, as scripts know it. */
  name: z.string(),
  /** General MIDI program (0 to 127), when the file names one. */
  program: z.int().min(0).max(127).nullable(),
  /** Drum notes name a drum by their pitch, not a tone. */
  isDrums: z.boolean(),
  /** Sorted by start, then pitch. */
  notes: z.array(ScoreNoteSchema),
});
export type ScoreTrack = z.infer<typeof ScoreTrackSchema>;

/** What playback needs of a song: a track an instrument, and when the last note ends. */
export const ScoreSchema = z.object({ seconds: z.number().min(0), tracks: z.array(ScoreTrackSchema) });
export type Score = z.infer<typeof ScoreSchema>;

export const SongSummarySchema = z.object({
  id: SongIdSchema,
  title: z.string(),
  /** Where it comes from: "traditional, our arrangement". */
  credit: z.string(),
  seconds: z.number(),
  beatsPerMinute: z.number(),
  beatsPerBar: z.int(),
  sections: z.array(z.string()),
  instruments: z.array(z.string()),
});
export type SongSummary = z.infer<typeof SongSummarySchema>;

export const songsContract = defineContract({
  list: {
    method: "GET",
    path: "/api/songs",
    summary: "Lists the songs of the event.",
    access: "signed-in",
    response: z.object({ songs: z.array(SongSummarySchema) }),
  },
  get: {
    method: "GET",
    path: "/api/songs/:songId",
    summary: "Gives a song with its beat map and the score to play.",
    access: "signed-in",
    params: z.object({ songId: SongIdSchema }),
    response: z.object({ song: SongSummarySchema, beatMap: BeatMapSchema, score: ScoreSchema }),
    problems: ["not-found"],
  },
});
