import { defineEntries } from "./entry.ts";

/** What the type checker says while somebody types. A note, never a problem: the run decides. */
export const TYPE_NOTES = defineEntries({
  "wrong-kind": { sentence: "`{word}` needs {wanted} here, but this is {got}.", hint: "Give it {wanted}." },
  "wrong-kind-here": { sentence: "This place is for {wanted}, but this is {got}.", hint: "Give it {wanted}." },
  "too-few-things": {
    sentence: "`{word}` needs {count} {things}, but it got {got}.",
    hint: "Point at `{word}` to see them.",
  },
  "too-many-things": { sentence: "`{word}` takes {count} {things}, but it got {got}.", hint: "Take the rest out." },
  "no-such-skill": {
    sentence: "{owner} can not do `{name}`.[? Did you mean `{meant}`??]",
    hint: "Big and small letters count.",
  },
  "not-to-run": { sentence: "This is {got}. You can not run it.", hint: "Take the `()` off." },
  "needs-call": { sentence: "`{name}` is steps to run, and not what they give.", hint: "Add `()` after it." },
  "not-a-sum": { sentence: "A sum needs numbers, but this is {got}.", hint: "Use a number here." },
  "never-the-same": { sentence: "These two can never be the same.", hint: "Check how both are spelled." },
  "maybe-nothing": { sentence: "There may be nothing in here.", hint: "Check it with `if` first." },
  "no-value-yet": { sentence: "`{name}` has no value yet.", hint: "Give it one first." },
  "only-to-read": { sentence: "You can read this, but not change it.", hint: "Make a list of your own: `[...list]`." },
  "wants-list-here": {
    sentence: "This takes a list, but it got {got}.",
    hint: "Use a list, or count with `let`.",
  },
  "no-answer-to-test": { sentence: "This gives no answer that `if` could test.", hint: "Put it on a line of its own." },
  "always-so": { sentence: "This is true each time.", hint: "Did you forget the `()`?" },
  "answer-missing": { sentence: "This should give an answer, but not all its ways do.", hint: "Add a `return`." },
  "no-such-field": { sentence: "`{name}` is not a part of this.", hint: "Check how it is spelled." },
  "field-missing": { sentence: "A part is missing here.", hint: "The details name it." },
  "not-sure": { sentence: "I am not sure that this fits.", hint: "Look at the details." },
});

export type TypeNoteCode = keyof typeof TYPE_NOTES;
