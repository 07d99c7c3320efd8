import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows with the words of lessons 4 and 5: counting loops, sides, parts, loops in loops. */
export const COUNTING_SHOWS: readonly DemoScript[] = [
  written({
    id: "ladders",
    title: "Ladders",
    songId: "quillhaven-bells",
    authors: ["7K-QUILL/mei"],
    lesson: 5,
    about: "Loops in loops; doors, windows and roofs as rungs.",
    source: `
// a ladder is door, windows, roof. four ladders at a time
for (let round = 0; round < 10; round++) {
  square.parts("door").everyNth(10, round).fadeTo(80, 1);
  wait(2);
  square.parts("windows").everyNth(10, round).fadeTo(80, 1);
  wait(2);
  square.parts("roof").everyNth(10, round).fadeTo(80, 1);
  wait(4);
  square.parts("door").everyNth(10, round).fadeTo(0, 4);
  square.parts("windows").everyNth(10, round).fadeTo(0, 4);
  square.parts("roof").everyNth(10, round).fadeTo(0, 4);
  wait(4);
}
// the last one goes up the tree
for (let step = 0; step < 20; step++) {
  square.front("tree").fadeTo(step * 5, 1);
  wait(2);
}
square.front("tree").fadeTo(0, 8);
`,
  }),
  written({
    id: "window-by-window",
    title: "Window by Window",
    songId: "quillhaven-bells",
    authors: ["7K-QUILL/ines"],
    lesson: 5,
    about: "Calm, covers the whole song.",
    source: `
// somebody walks through the town and turns on the windows
const windows = square.parts("windows");
for (let i = 0; i < windows.length; i++) {
  windows[i].fadeTo(70, 2);
  wait(2);
}
wait(8);
// then they all breathe
for (let breath = 0; breath < 8; breath++) {
  windows.fadeTo(30, 4);
  wait(4);
  windows.fadeTo(90, 4);
  wait(4);
}
// and go to bed
for (let i = windows.length - 1; i >= 0; i--) {
  windows[i].fadeTo(0, 2);
  wait(1);
}
`,
  }),
  written({
    id: "the-bakers-kettle",
    title: "The Baker's Kettle",
    songId: "good-king-wenceslas",
    authors: ["7K-QUILL/otto"],
    lesson: 5,
    about: "Tells a story with one front and the rest of the side.",
    source: `
// the kettle in the bakery gets hot
const bakery = square.front("bakery");
const north = square.side("north");
let heat = 10;
while (heat < 100) {
  bakery.fadeTo(heat, 3);
  wait(4);
  heat = heat + 10;
}
// it whistles and everybody wakes up
for (let whistle = 0; whistle < 4; whistle++) {
  bakery.pulse(4);
  for (const front of north) {
    front.pulse(2, "gold");
    wait(0.5);
  }
  wait(3);
}
// breakfast on all four sides
for (const name of ["north", "east", "south", "west"]) {
  square.side(name).colour("gold").fadeTo(60, 8);
  wait(8);
}
for (let bar = 0; bar < 20; bar++) {
  square.parts("windows").fadeTo(35 + (bar % 2) * 40, 4);
  wait(4);
}
square.all.fadeTo(0, 12);
`,
  }),
  written({
    id: "stripes",
    title: "Stripes",
    songId: "frost-fair",
    authors: ["7K-QUILL/anwen"],
    lesson: 4,
    about: "Even and odd fronts with a remainder.",
    source: `
for (let bar = 0; bar < 36; bar++) {
  for (let i = 0; i < square.fronts.length; i++) {
    if (i % 2 === bar % 2) {
      square.fronts[i].fadeTo(70, 2);
    } else {
      square.fronts[i].fadeTo(10, 2);
    }
  }
  wait(4);
}
`,
  }),
  written({
    id: "first-five",
    title: "First Five",
    songId: "jingle-bells",
    authors: ["7K-QUILL/bashir"],
    lesson: 4,
    about: "Uses first with a growing number.",
    source: `
const south = square.side("south");
for (let n = 1; n <= 10; n++) {
  south.first(n).colour("red").on(70);
  wait(4);
}
for (let n = 10; n >= 1; n--) {
  south.fadeTo(0, 1);
  wait(1);
  south.first(n).colour("green").fadeTo(70, 1);
  wait(3);
}
south.off();
`,
  }),
  written({
    id: "stairs",
    title: "Stairs",
    songId: "skaters-jig",
    authors: ["7K-QUILL/clem"],
    lesson: 4,
    about: "Levels go up by counting; one goes past 100.",
    source: `
const west = square.side("west");
let level = 10;
for (let i = 0; i < west.length; i++) {
  west[i].fadeTo(level, 2);
  level = level + 12;
  wait(4);
}
console.log("top step is", level);
wait(8);
west.fadeTo(0, 16);
`,
  }),
  written({
    id: "chess",
    title: "Chess",
    songId: "good-king-wenceslas",
    authors: ["7A-TARN/delphine"],
    lesson: 5,
    about: "Roofs against windows.",
    source: `
const roofs = square.parts("roof");
const windows = square.parts("windows");
for (let move = 0; move < 28; move++) {
  if (move % 2 === 0) {
    roofs.fadeTo(80, 1);
    windows.fadeTo(10, 1);
  } else {
    roofs.fadeTo(10, 1);
    windows.fadeTo(80, 1);
  }
  wait(8);
}
square.all.fadeTo(0, 8);
`,
  }),
  written({
    id: "cut-off-fades",
    title: "Hurry",
    songId: "frost-fair",
    authors: ["7A-TARN/emre"],
    lesson: 4,
    about: "Every fade is cut off by the next one.",
    source: `
// why does it never get bright??
const east = square.side("east");
for (let i = 0; i < 30; i++) {
  east.fadeTo(100, 8);
  wait(2);
  east.fadeTo(0, 8);
  wait(2);
}
`,
  }),
  written({
    id: "four-corners",
    title: "Four Corners",
    songId: "quillhaven-bells",
    authors: ["7A-TARN/farah"],
    lesson: 5,
    about: "A list of side names in a loop in a loop.",
    source: `
const sides = ["north", "east", "south", "west"];
const mood = ["gold", "tomato", "skyblue", "palegreen"];
for (let round = 0; round < 3; round++) {
  for (let s = 0; s < sides.length; s++) {
    const side = square.side(sides[s]);
    side.colour(mood[(s + round) % 4]);
    for (const front of side) {
      front.pulse(4);
      wait(1);
    }
    wait(6);
  }
}
square.front("tree").colour("gold").fadeTo(100, 8);
wait(16);
square.front("tree").fadeTo(0, 8);
`,
  }),
  written({
    id: "rain-on-the-baths",
    title: "Rain on the Baths",
    songId: "frost-fair",
    authors: ["7B-TARN/wren"],
    lesson: 5,
    about: "Wren's own idea outside class: drops that fall from roof to door.",
    source: `
// drops fall from the roof to the door
for (let drop = 0; drop < 34; drop++) {
  const house = drop * 7 % square.fronts.length;
  const front = square.fronts[house];
  front.part("roof").pulse(2, "lightskyblue");
  wait(1);
  front.part("windows").pulse(2, "lightskyblue");
  wait(1);
  front.part("door").pulse(3, "steelblue");
  wait(2);
}
`,
  }),
];
