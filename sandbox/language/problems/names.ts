import { defineEntries } from "./entry.ts";

/** Words and names that are not known, or not free. */
export const NAME_PROBLEMS = defineEntries({
  "unknown-front": {
    sentence: 'No front has the name "{name}".[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?Here are some: {names}.?]',
  },
  "unknown-part": {
    sentence: 'No part has the name "{name}".[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?Here are some: {names}.?]',
  },
  "unknown-side": {
    sentence: 'No side has the name "{name}".[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?The sides are {names}.?]',
  },
  "unknown-section": {
    sentence: 'This song has no section "{name}".[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?Here are some: {names}.?]',
  },
  "unknown-instrument": {
    sentence: 'This song has no "{name}" in it.[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?Here are some: {names}.?]',
  },
  "unknown-colour": {
    sentence: 'I know no colour "{name}".[? Did you mean "{meant}"??]',
    hint: '[?Write "{meant}".?][?Pick one from the list: {names}.?]',
  },
  "no-such-section": { sentence: 'This song has {count} {plural} named "{name}", not {nth}.', hint: "Count from 1." },
  "no-such-bar": { sentence: "There is no bar {bar}. The last bar is {last}.", hint: "Bars count from 1." },
  "no-such-beat": { sentence: "Bar {bar} has {beats} beats, so it has no beat {beat}.", hint: "`song.bar({next})`" },
  "unknown-word": {
    sentence: "I do not know the word `{name}`.[? Did you mean `{meant}`??]",
    hint: "[?Write `{meant}`. ?]Big and small letters count.",
  },
  "out-of-reach": {
    sentence: "`{name}` was made in other braces, so it is not known here.",
    hint: "Make it before the braces open.",
  },
  "not-made-yet": {
    sentence: "`{name}` is made further down. Here it is not ready.",
    hint: "Move its `let` or `const` up.",
  },
  "unknown-skill": { sentence: "{owner} can not do `{name}`.[? Did you mean `{meant}`??]", hint: "{skills}" },
  "taken-word": { sentence: "The word `{name}` has a job here already.", hint: "Pick another name." },
  "made-twice": {
    sentence: "`{name}` is made two times. It can be made only once.",
    hint: "Leave out `let` or `const` the second time.",
  },
  "needs-quotes": { sentence: "The name of a {kind} goes in quotes.", hint: '`"{name}"`' },
  constant: { sentence: "`{name}` is a `const`, so it can not change.", hint: "Use `let` where you make it." },
});
