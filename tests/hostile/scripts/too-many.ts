import { hostile, type HostileScript } from "../hostile-script.ts";

/** Too many cues, changes, notes and findings, and values that no timeline can hold. */
export const TOO_MANY: readonly HostileScript[] = [
  hostile("endless notes", 'for (;;) console.log("x".repeat(1e5));', "too-many-notes", "too-many-notes"),
  hostile("endless cues", "for (;;) { square.all.on(); wait(0.001); }", "too-many-cues", "too-many-cues"),
  hostile("cues at a standstill", "for (;;) square.all[0].on();", "clock-stood-still", "clock-stood-still"),
  hostile(
    "cues behind the end",
    "waitUntil(song.end); for (;;) { square.all[0].on(); wait(1); }",
    "too-many-cues",
    "too-many-cues",
  ),
  hostile(
    "a chain for every cue",
    "function f(n) { square.all[0].on(); if (n > 0) { f(n - 1); f(n - 1); } }\nf(90);",
    "too-much-work",
    "clock-stood-still",
  ),
  hostile("time without end", "for (;;) wait(1e308);", "not-finite", "not-finite"),
  hostile("moments in a list-like", "at({ length: 1e15 }, () => square.all.on());", "wants-a-number", "wants-a-number"),
  hostile("a name of five million letters", 'square.front("x".repeat(5e6)).on();', "unknown-front", "unknown-front"),
  hostile(
    "a colour of five million letters",
    'square.all.colour("#".repeat(5e6));',
    "unknown-colour",
    "unknown-colour",
  ),
  hostile("a text for a number", 'wait("1e9".repeat(1e6));', "wants-a-number", "wants-a-number"),
];
