import { defineEntries } from "./entry.ts";

/** What can not be read at all, and slips that can be read but are never meant. */
export const SYNTAX_PROBLEMS = defineEntries({
  "missing-bracket": {
    sentence: "The `{open}` in line {line} has no `{close}`.",
    hint: "Put `{close}` where {what} ends.",
  },
  "extra-bracket": { sentence: "This `{close}` closes nothing.", hint: "Take it out, or add `{open}` before it." },
  "missing-quote": { sentence: "This text has no quote at its end.", hint: "Put `{quote}` where the text ends." },
  "missing-comma": { sentence: "I can not read this. Is a comma missing?", hint: "Put `,` between two things." },
  "missing-name": { sentence: "A name is missing here.", hint: "Write a name, as in `let level = 50;`." },
  "name-with-space": { sentence: "A name can not have a space or a hyphen in it.", hint: "Write it as one word." },
  "number-first": { sentence: "A name can not start with a number.", hint: "Start it with a letter." },
  "curly-quotes": { sentence: "These quotes are of the wrong kind.", hint: 'Use straight ones: `"`.' },
  "else-alone": { sentence: "This `else` has no `if` before it.", hint: "Close the braces of the `if` first." },
  "const-without-value": { sentence: "A `const` needs a value when you make it.", hint: "`const {name} = 1;`" },
  unreadable: { sentence: "I can not read this line.", hint: "Look for a missing comma, quote or bracket." },
  "one-equals": { sentence: "One `=` puts a value in. It does not compare.", hint: "Write `===`." },
  "unused-list": { sentence: "`{name}` makes a new list. Nothing uses it here.", hint: "`{example}`" },
  "unused-answer": { sentence: "You work out a sum here, but nothing keeps the answer.", hint: "`{example}`" },
  "unused-name": { sentence: "`{name}` stands here alone and does nothing.", hint: "Use it, or take it out." },
  "two-steps": { sentence: "Two steps stand on one line.", hint: "Put `;` between them, or a new line." },
  "empty-loop": {
    sentence: "The `;` ends this {what}, so it does nothing.",
    hint: "Take out the `;` before the braces.",
  },
});
