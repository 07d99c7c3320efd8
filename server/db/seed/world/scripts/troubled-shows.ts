import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows with something wrong: they do not run, flash too fast, or do what nobody meant. */
export const TROUBLED_SHOWS: readonly DemoScript[] = [
  written({
    id: "lightning",
    title: "Lightning!!!",
    songId: "jingle-bells",
    authors: ["7B-TARN/kofi"],
    lesson: 7,
    about: "Runs, but flashes the whole square far too fast: the show check stops it.",
    source: `
// THE BEST SHOW
repeat(120, () => {
  square.all.on(100);
  wait(0.125);
  square.all.off();
  wait(0.125);
});
square.all.colour("red");
repeat(60, () => {
  square.all.pulse(0.25, "red");
  wait(0.25);
});
`,
  }),
  written({
    id: "clicker",
    title: "Clicker",
    songId: "frost-fair",
    authors: ["7A-TARN/leif"],
    lesson: 4,
    about: "Switches relay boxes faster than they can.",
    source: `
for (let i = 0; i < 200; i++) {
  square.front("ironmonger").on();
  wait(0.25);
  square.front("ironmonger").off();
  wait(0.25);
}
`,
  }),
  written({
    id: "the-bakry",
    title: "The Bakry",
    songId: "frost-fair",
    authors: ["6C-QUILL/etta"],
    lesson: 1,
    about: "A name with a letter missing.",
    problem: "unknown-front",
    source: `
square.front("bakry").on();
wait(4);
square.front("bakry").off();
`,
  }),
  written({
    id: "no-quotes",
    title: "Night Library",
    songId: "frost-fair",
    authors: ["6C-QUILL/finn"],
    lesson: 1,
    about: "A name without quotes.",
    problem: "needs-quotes",
    source: `
square.front(library).on();
wait(8);
square.front(library).off();
`,
  }),
  written({
    id: "lost-brace",
    title: "Round and Round",
    songId: "quillhaven-bells",
    authors: ["7B-TARN/tomas"],
    lesson: 3,
    about: "The brace at the end of the loop is missing.",
    problem: "missing-bracket",
    source: `
for (const front of square.fronts) {
  front.pulse(2, "gold");
  wait(1);

for (const front of square.fronts) {
  front.pulse(2, "tomato");
  wait(1);
}
`,
  }),
  written({
    id: "forever",
    title: "Forever",
    songId: "frost-fair",
    authors: ["7A-TARN/marisol"],
    lesson: 5,
    about: "A loop without a wait that never ends.",
    problem: "clock-stood-still",
    source: `
let turn = 0;
while (turn < 10) {
  square.front("bakery").pulse(1, "gold");
}
`,
  }),
  written({
    id: "too-far",
    title: "Past the End of the Street",
    songId: "frost-fair",
    authors: ["7A-TARN/nikhil"],
    lesson: 4,
    about: "Counts one house too many.",
    problem: "not-in-list",
    source: `
const north = square.side("north");
for (let i = 0; i <= north.length; i++) {
  north[i].on();
  wait(2);
}
`,
  }),
  written({
    id: "not-called",
    title: "Flash Mob",
    songId: "jingle-bells",
    authors: ["7B-TARN/lena"],
    lesson: 7,
    about: "Names a function and does not run it.",
    problem: "not-run",
    source: `
function flash() {
  square.side("east").pulse(2, "gold");
  wait(4);
}
flash;
flash;
square.all.on();
`,
  }),
  written({
    id: "right-now",
    title: "All Off at the End",
    songId: "frost-fair",
    authors: ["7B-TARN/gus"],
    lesson: 8,
    about: "An action that runs at once.",
    problem: "ran-too-early",
    source: `
square.all.fadeTo(60, 4);
at(100, square.all.off());
`,
  }),
  written({
    id: "hundred-bars",
    title: "Bar Ninety",
    songId: "frost-fair",
    authors: ["7B-TARN/milo"],
    lesson: 12,
    about: "Asks for a bar the song does not have.",
    problem: "no-such-bar",
    source: `
at(song.bar(1), () => square.all.fadeTo(50, 4));
at(song.bar(90), () => square.all.fadeTo(0, 4));
`,
  }),
  written({
    id: "much-too-long",
    title: "The Long Goodbye",
    songId: "frost-fair",
    authors: ["7B-TARN/beth"],
    lesson: 4,
    about: "Goes on after the song is over.",
    source: `
for (const side of ["north", "east", "south", "west"]) {
  square.side(side).fadeTo(60, 8);
  wait(40);
}
square.all.fadeTo(0, 8);
`,
  }),
  written({
    id: "too-bright",
    title: "Brighter",
    songId: "frost-fair",
    authors: ["7B-TARN/eli"],
    lesson: 4,
    about: "Levels above 100, and a count that is not whole.",
    source: `
let level = 60;
repeat(4.5, () => {
  square.side("south").on(level);
  level = level + 20;
  wait(4);
});
square.side("south").off();
`,
  }),
  written({
    id: "empty-page",
    title: "Untitled",
    songId: "frost-fair",
    authors: ["7B-TARN/xenia"],
    lesson: 1,
    about: "Nothing but a comment: runs and stays dark.",
    source: `
// i was away on monday
`,
  }),
];
