import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows with the words of lessons 1 to 3: line by line, variables, the first loops. */
export const FIRST_SHOWS: readonly DemoScript[] = [
  written({
    id: "my-first-street",
    title: "My First Street",
    songId: "frost-fair",
    authors: ["6C-QUILL/alba"],
    lesson: 1,
    about: "Line by line, and it works.",
    source: `
// my first street
square.front("bakery").on();
wait(4);
square.front("bookshop").on();
wait(4);
square.front("ironmonger").on();
wait(4);
square.front("library").on();
wait(8);
square.front("bakery").off();
square.front("bookshop").off();
square.front("ironmonger").off();
square.front("library").off();
`,
  }),
  written({
    id: "cinema-then-school",
    title: "Cinema Then School",
    songId: "frost-fair",
    authors: ["6C-QUILL/bjorn"],
    lesson: 1,
    about: "Forgets to turn one front off.",
    source: `
square.front("cinema").on();
wait(8);
square.front("cinema").off();
square.front("school").on();
wait(8);
square.front("museum").on();
wait(8);
square.front("museum").off();
// the school stays on because homework
`,
  }),
  written({
    id: "hello-tree",
    title: "Hello Tree",
    songId: "jingle-bells",
    authors: ["6C-QUILL/carys"],
    lesson: 1,
    about: "Very short.",
    source: `
square.front("tree").on();
wait(16);
square.front("tree").off();
wait(4);
square.front("tree").on();
`,
  }),
  written({
    id: "blink-and-gone",
    title: "Blink and Gone",
    songId: "frost-fair",
    authors: ["6C-QUILL/dev"],
    lesson: 1,
    about: "On and off at one moment: nobody sees the first one.",
    source: `
square.front("gallery").on();
square.front("gallery").off();
wait(2);
square.front("chapel").on();
wait(2);
square.front("chapel").off();
wait(2);
square.front("gallery").on();
wait(6);
square.front("gallery").off();
`,
  }),
  written({
    id: "two-colours-of-tea",
    title: "Two Colours of Tea",
    songId: "good-king-wenceslas",
    authors: ["8L-QUILL/aino"],
    lesson: 2,
    about: "Constants for colours, a growing wait.",
    source: `
const green = "yellowgreen";
const black = "sienna";
let sip = 2;

square.front("tea room").colour(green).on();
wait(sip);
square.front("tea room").colour(black);
wait(sip);
sip = sip + 2;
square.front("corner cafe").colour(green).on();
wait(sip);
square.front("corner cafe").colour(black);
wait(sip);
console.log("last sip", sip);
square.front("tea room").off();
square.front("corner cafe").off();
`,
  }),
  written({
    id: "sunset-shops",
    title: "Sunset Shops",
    songId: "frost-fair",
    authors: ["8L-QUILL/bodhi"],
    lesson: 2,
    about: "Colour with fade time, one after the other.",
    source: `
const early = "gold";
const later = "tomato";
const late = "indigo";

square.front("bookshop").on().colour(early);
square.front("florist").on().colour(early);
square.front("hat shop").on().colour(early);
wait(8);
square.front("bookshop").colour(later, 8);
square.front("florist").colour(later, 8);
square.front("hat shop").colour(later, 8);
wait(16);
square.front("bookshop").colour(late, 8);
wait(4);
square.front("florist").colour(late, 8);
wait(4);
square.front("hat shop").colour(late, 8);
wait(16);
square.front("bookshop").off();
square.front("florist").off();
square.front("hat shop").off();
`,
  }),
  written({
    id: "counting-up",
    title: "Counting Up",
    songId: "jingle-bells",
    authors: ["8L-QUILL/corin"],
    lesson: 2,
    about: "Prints notes to find out what happens.",
    source: `
let n = 1;
square.front("weaver").pulse(2, "gold");
wait(n);
n = n + 1;
console.log(n);
square.front("weaver").pulse(2, "gold");
wait(n);
n = n + 1;
console.log(n);
square.front("weaver").pulse(2, "orange");
wait(n);
n = n + 1;
console.log(n);
square.front("weaver").pulse(4, "red");
wait(n);
square.front("boathouse").pulse(4, "red");
`,
  }),
  written({
    id: "painted-dark",
    title: "Painted Dark",
    songId: "frost-fair",
    authors: ["8L-QUILL/dalia"],
    lesson: 2,
    about: "A colour on lights that are off.",
    source: `
square.front("sweet shop").colour("hotpink");
wait(8);
square.front("boathouse").colour("aqua");
wait(8);
square.front("sweet shop").off();
square.front("boathouse").on();
wait(8);
square.front("boathouse").off();
`,
  }),
  written({
    id: "once-round",
    title: "Once Round",
    songId: "quillhaven-bells",
    authors: ["7A-TARN/amara"],
    lesson: 3,
    about: "The plain round, twice.",
    source: `
// once round in gold, once in blue
for (const front of square.fronts) {
  front.pulse(2, "gold");
  wait(1);
}
for (const front of square.fronts) {
  front.pulse(2, "skyblue");
  wait(1);
}
`,
  }),
  written({
    id: "slow-then-quick",
    title: "Slow Then Quick",
    songId: "good-king-wenceslas",
    authors: ["7A-TARN/ben"],
    lesson: 3,
    about: "Two speeds in two variables.",
    source: `
const slow = 2;
const quick = 0.5;
for (const house of square.fronts) {
  house.on();
  wait(slow);
}
for (const house of square.fronts) {
  house.off();
  wait(quick);
}
for (const house of square.fronts) {
  house.pulse(2, "white");
  wait(quick);
}
`,
  }),
  written({
    id: "wall-of-light",
    title: "Wall of Light",
    songId: "frost-fair",
    authors: ["7A-TARN/chidi"],
    lesson: 3,
    about: "The wait stands after the loop, so all come on at once.",
    source: `
for (const front of square.fronts) {
  front.on();
}
wait(16);
for (const front of square.fronts) {
  front.off();
}
wait(8);
for (const front of square.fronts) {
  front.colour("tomato");
  front.on();
}
wait(16);
for (const front of square.fronts) {
  front.off();
}
`,
  }),
  written({
    id: "ten-small-suns",
    title: "Ten Small Suns",
    songId: "skaters-jig",
    authors: ["7B-TARN/wren"],
    lesson: 4,
    about: "A side, one by one, still being worked on.",
    source: `
// ten small suns come up on the east side
const east = square.side("east");
for (const front of east) {
  front.colour("orange");
  front.fadeTo(80, 4);
  wait(4);
}
// next: they should go down again in the west
for (const front of square.side("west")) {
  front.pulse(2, "tomato");
  wait(2);
}
east.fadeTo(0, 8);
`,
  }),
];
