import type { Severity } from "../../engine/model.ts";
import type { Entry } from "./entry.ts";

interface FindingEntry extends Entry {
  readonly severity: Severity;
}

function define<Code extends string>(entries: { readonly [C in Code]: FindingEntry }): {
  readonly [C in Code]: FindingEntry;
} {
  return entries;
}

/** What the run itself notices, and what the text gives away. What is seen in the cues is in `sandbox/checks/`. */
export const RUN_FINDINGS = define({
  "level-clamped": {
    severity: "warn",
    sentence: "A level goes from 0 to 100. I used {used}.",
    hint: "Keep the level from 0 to 100.",
  },
  "after-the-end": {
    severity: "warn",
    sentence: "The song is over by then.",
    hint: "Check the sum, or use fewer turns.",
  },
  "nothing-to-light": {
    severity: "note",
    sentence: "There is no light in this group.",
    hint: "Not every front has every part.",
  },
  "count-rounded": {
    severity: "note",
    sentence: "`repeat` counts in whole numbers. {asked} became {used}.",
    hint: "Use a whole number.",
  },
  "long-wait": {
    severity: "warn",
    sentence: "That is {bars} bars. `wait` counts beats.",
    hint: "Use a shorter wait, or `waitUntil`.",
  },
  "same-each-turn": {
    severity: "warn",
    sentence: "`at({beat})` is beat {beat} of the song each time.",
    hint: "Add to where you are: `now() + {beat}`.",
  },
  "never-so": {
    severity: "warn",
    sentence: "What `{sum}` leaves is below {by}, so it is never {number}.",
    hint: "Use 0 for each turn that comes out even.",
  },
  "never-run": {
    severity: "note",
    sentence: "You made `{name}`, but nothing runs it.",
    hint: "Write `{name}()` where it should run.",
  },
  "all-each-turn": {
    severity: "warn",
    sentence: "Each turn uses all of `{list}`, and not `{item}`.",
    hint: "Write `{item}` in place of `{list}` here.",
  },
  "last-wait": {
    severity: "note",
    sentence: "This `wait` does nothing. The clock goes back here.",
    hint: "Take it out.",
  },
});

export type RunFindingCode = keyof typeof RUN_FINDINGS;
