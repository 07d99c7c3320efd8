import { defineEntries } from "./entry.ts";

/** TypeScript that scripts do without: why, and what to use. */
export const DIALECT_PROBLEMS = defineEntries({
  "no-import": { sentence: "A script is one piece. It can not use `{word}`.", hint: "Write all of it in this script." },
  "no-eval": { sentence: "A script can not make code from text.", hint: "Write a function." },
  "no-async": { sentence: "Here `wait` moves the clock, so nothing has to be awaited.", hint: "Use `wait` or `at`." },
  "no-timer": { sentence: "`{word}` counts real time. Here we count beats.", hint: "Use `wait` or `at`." },
  "no-generator": { sentence: "A function with `*` does not work here.", hint: "Fill a list in a loop." },
  "no-enum": { sentence: "`enum` does not work here.", hint: 'Use texts, as in `"red"`.' },
  "no-namespace": { sentence: "`{word}` does not work here.", hint: "Give your functions plain names." },
  "no-decorator": { sentence: "A word with `@` does not work here.", hint: "Call a function." },
  "no-with": { sentence: "`with` hides which thing is meant.", hint: "Write the name and a dot." },
  "no-var": { sentence: "`var` does not keep to its braces.", hint: "Use `let`." },
  "no-for-in": { sentence: "`for..in` gives places as text, not the things.", hint: "Use `for..of`." },
  "no-try": { sentence: "`{word}` would hide problems from you.", hint: "Check with `if` first." },
  "no-label": { sentence: "A label does not work here.", hint: "Put the loop in a function and use `return`." },
  "no-accessor": { sentence: "`{word}` in a class or object does not work here.", hint: "Write a function." },
  "no-bigint": { sentence: "A number with `n` at its end does not work here.", hint: "Take the `n` off." },
  "no-any": { sentence: "`any` turns off the checks that help you.", hint: "Name the type, or leave it out." },
  "no-delete": { sentence: "`delete` does not work here.", hint: "Make a new object without it." },
  "no-comma": { sentence: "The comma here does not do what it seems to.", hint: "Write two lines." },
  "no-this": { sentence: "`this` only works inside a class.", hint: "Use the name of the thing." },
  "no-tag": { sentence: "A text in backticks can not follow a name.", hint: "Put it in `(` and `)`." },
  "no-cast": { sentence: "A type in `<` and `>` can not stand here.", hint: "Write `as` and the type after it." },
  "not-here": { sentence: "`{word}` is not part of our scripts.", hint: "{try}" },
  "no-using": { sentence: "`{word}` does not work here.", hint: "Use `const`." },
});
