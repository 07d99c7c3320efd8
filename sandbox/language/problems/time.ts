import { defineEntries } from "./entry.ts";

/** The clock, and what runs too long or too deep. */
export const TIME_PROBLEMS = defineEntries({
  "negative-time": {
    sentence: "Time can not run back. You asked for {beats} beats.",
    hint: "Use `at` to go to a place.",
  },
  "already-passed": { sentence: "Beat {beat} is over. The clock is at beat {now}.", hint: "Use `at({beat}, ...)`." },
  "before-start": { sentence: "The song starts at beat 0. Beat {beat} is too soon.", hint: "Check the sum." },
  "wait-for-place": { sentence: "`wait` counts from now. It does not go to a place.", hint: "Use `waitUntil`." },
  "clock-stood-still": {
    sentence: "This loop never ends. The clock does not move in it.",
    hint: "Put a `wait` in the loop.",
  },
  endless: { sentence: "This loop ran too long, so I stopped it.", hint: "Check when it should end." },
  "too-much-work": { sentence: "This script ran too long, so I stopped it.", hint: "Do less in it." },
  "calls-itself": { sentence: "`{name}` calls itself too many times.", hint: "Say when it should stop." },
  "too-many-cues": {
    sentence: "This writes more than {limit} changes. That is too many.",
    hint: "Make a loop shorter.",
  },
  "too-many-changes": {
    sentence: "All lights together change more than {limit} times. That is too many.",
    hint: "Use fewer lights, or fewer turns.",
  },
  "too-many-notes": {
    sentence: "`console.log` wrote {limit} lines. That is too many.",
    hint: "Take it out of the loop.",
  },
  "too-big": { sentence: "This needs more room than there is here.", hint: "Make the lists or texts smaller." },
  "too-long": { sentence: "This script is too long to run.", hint: "Put steps that come again in a function." },
  "too-deep": {
    sentence: "Here are too many brackets inside each other.",
    hint: "Put the inner part in a variable or a function.",
  },
  "could-not-run": { sentence: "I had to stop this script.", hint: "Undo your last change, then run it again." },
});
