/**
 * What crosses the border between the host and the library inside QuickJS. Both sides are built
 * from this file: the tables go in as JSON, the report comes out as JSON, the cues as one buffer.
 */

/** One part of one front. `lights` are indexes in walking order. */
export interface PartTable {
  readonly name: string;
  readonly lights: readonly number[];
  readonly box: string;
}

export interface FrontTable {
  readonly name: string;
  readonly side: string | null;
  readonly box: string;
  readonly parts: readonly PartTable[];
}

export interface SectionTable {
  readonly name: string;
  readonly start: number;
  readonly end: number;
}

export interface NoteTable {
  readonly start: number;
  readonly beats: number;
  readonly pitch: number;
}

export interface InstrumentTable {
  readonly name: string;
  readonly hits: readonly number[];
  readonly notes: readonly NoteTable[];
}

/** Everything a script can ask about: the same for every script on one square and song. */
export interface GuestTables {
  readonly lightCount: number;
  /** Kind of box of every single light. */
  readonly boxOf: readonly string[];
  /** Name of the part of every single light. */
  readonly partOf: readonly string[];
  /** In walking order. */
  readonly fronts: readonly FrontTable[];
  readonly sides: readonly string[];
  readonly song: {
    /** Microseconds of every beat; the last entry is the song's end. */
    readonly beats: readonly number[];
    readonly beatsPerBar: number;
    readonly bars: readonly { readonly number: number; readonly start: number; readonly beats: number }[];
    readonly sections: readonly SectionTable[];
    readonly instruments: readonly InstrumentTable[];
    readonly loudness: readonly number[];
  };
  readonly colours: { readonly [name: string]: number };
}

/** The luck of each statement of one script. */
export interface GuestLuck {
  readonly seed: number;
  /** For each call site, the index of the stream of its statement. */
  readonly streamOf: readonly number[];
  /** For each stream, three words of 32 bits. */
  readonly streams: readonly (readonly [number, number, number])[];
}

/** One script for an engine that has its tables: plain data, so that it can be handed to another thread. */
export interface GuestWork {
  /** The marked script. */
  readonly code: string;
  readonly luck: GuestLuck;
}

/** A stop inside the guest: thrown by the library, or an error of the engine that it caught. */
export interface GuestFailure {
  /** A code of the catalogue; "engine" for an error of QuickJS itself; "thrown" for the script's own. */
  readonly code: string;
  /** What the sentence is filled with. */
  readonly values: { readonly [name: string]: string | number };
  /** Which argument of the call is meant, from 0. */
  readonly argument?: number;
  /** The site that is meant, when it is not the last call. */
  readonly site?: number;
  /** Name and message of the engine's error. */
  readonly name?: string;
  readonly message?: string;
  /** Where in the marked script the engine's error arose, when it says so. */
  readonly stack?: string;
}

/** Something the run noticed, gathered by rule, call site and variant. */
export interface GuestFinding {
  readonly rule: string;
  readonly site: number;
  readonly values: { readonly [name: string]: string | number };
  /** Ticks, in the order met; at most 50. */
  readonly ticks: readonly number[];
}

export interface GuestNote {
  readonly site: number;
  readonly text: string;
  readonly tick: number;
}

export interface GuestReport {
  readonly failure: GuestFailure | null;
  /** Call sites at the end of the run, outermost first. */
  readonly sites: readonly number[];
  readonly notes: readonly GuestNote[];
  readonly findings: readonly GuestFinding[];
  /** Where the clock was, in ticks. */
  readonly tick: number;
}

/** Words (32 bits) of one cue in the buffer: tick, action, selection, level, length, colour, chain. */
export const CUE_WORDS = 7;

/** Words of the buffer's head: mark, cues, selections, lights in selections, chains. */
export const HEAD_WORDS = 5;

/** First word of the buffer: the number of this encoding. */
export const BUFFER_MARK = 0x44_42_43_31;

/**
 * The limits of a run, counted and not timed, so that every host agrees (LANGUAGE rule 34).
 */
export const MAX_CUES = 100_000;
/** Single-light changes when every cue is expanded. */
export const MAX_CHANGES = 4_000_000;
/** A loop that wrote this many cues at one moment stands still. */
export const STOOD_STILL_CUES = 10_000;
/** The same in changes: on a large group a loop is at their limit after few cues. */
export const STOOD_STILL_CHANGES = MAX_CHANGES / 2;
export const MAX_NOTES = 1000;
/** Calls of the script's own functions inside each other. */
export const MAX_CALL_DEPTH = 100;
/** The same through callbacks of the library, whose own frames take stack too. */
export const MAX_CALLBACK_DEPTH = 25;
/** Findings kept of one rule. */
export const MAX_FINDINGS = 50;
/** Characters kept of one `console.log`. */
export const MAX_NOTE_LENGTH = 400;
