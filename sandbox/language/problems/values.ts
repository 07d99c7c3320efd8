import { defineEntries } from "./entry.ts";

/** A word that got the wrong thing, or nothing. */
export const VALUE_PROBLEMS = defineEntries({
  "wants-a-number": {
    sentence: "`{word}` needs a number here, but it got {got}.",
    hint: "[?Write {number}. ?]Take the quotes off, or check the sum.",
  },
  "wants-whole": {
    sentence: "`{word}` needs a whole number from {least} up, but it got {got}.",
    hint: "Count in whole numbers.",
  },
  "wants-text": {
    sentence: "`{word}` needs a name in quotes, but it got {got}.",
    hint: 'Put the name in quotes, as in `"gold"`.',
  },
  "wants-a-colour": {
    sentence: "`{word}` needs a colour here, but it got {got}.",
    hint: 'Write a colour in quotes, as in `"gold"`.',
  },
  "wants-lights": { sentence: "`{word}` needs lights here.", hint: '`square.all.{word}(square.side("north"))`' },
  "wants-a-section": {
    sentence: "`{word}` needs a section of the song here.",
    hint: '`song.{word}("drums", song.section("chorus"))`',
  },
  "wants-a-list": { sentence: "`{word}` needs a list, but it got {got}.", hint: "Put the things in `[` and `]`." },
  "empty-list": {
    sentence: "This list is empty, so `{word}` can not pick from it.",
    hint: "Put something in the list first.",
  },
  "not-finite": {
    sentence: "The sum for `{word}` has no answer. Is a number missing?",
    hint: "Print its parts with `console.log`.",
  },
  "missing-value": { sentence: "`{word}` needs {count} {things}: {what}.", hint: "`{example}`" },
  "not-an-action": { sentence: "`{word}` needs steps to run, but it got {got}.", hint: "`{example}`" },
  "ran-too-early": { sentence: "This runs right now, not {when}.", hint: "Put `() =>` in front of it." },
  "not-run": { sentence: "You named `{name}`, but you did not run it.", hint: "Add `()` after it." },
  "no-reading": {
    sentence: "You can tell lights what to do, but you can not ask them.",
    hint: "Keep the {name} in a variable.",
  },
  "wait-alone": {
    sentence: "Lights can not wait. The script waits.",
    hint: "Put `{name}({arguments});` on its own line.",
  },
  "not-in-list": {
    sentence: "This list has no number {place}. It goes from 0 to {last}.",
    hint: "Lists count from 0.",
  },
  "list-is-empty": {
    sentence: "This list is empty, so it has no number {place}.",
    hint: "Check how you made the list.",
  },
  "nothing-there": {
    sentence: "There is nothing in [?`{owner}` ?]here, so `{name}` does not work.",
    hint: "Check what you put in it.",
  },
  "not-a-function": { sentence: "`{name}` is not something you can run.", hint: "Only run a word or a function." },
  "not-a-list": {
    sentence: "This is not a list, so I can not go through it.",
    hint: "Use a list, as in `square.fronts`.",
  },
  "can-not-change": {
    sentence: "You can not change this. It is fixed.",
    hint: "Make a new one, and keep it with `const`.",
  },
  thrown: {
    sentence: 'Your script stopped itself here.[? It says "{message}".?]',
    hint: "Take the `throw` out, or change when it runs.",
  },
});
