import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows with the words of lessons 6 and 7: conditions, chance, functions of their own. */
export const CHOOSING_SHOWS: readonly DemoScript[] = [
  written({
    id: "slow-snow",
    title: "Slow Snow",
    songId: "frost-fair",
    authors: ["7B-TARN/oren"],
    lesson: 7,
    about: "Calm and careful: chance, a function, and slow boxes left out.",
    source: `
// snow lands on roofs and stays a while
const roofs = square.parts("roof").filter((roof) => roof.box !== "relay");

function flake() {
  const roof = oneOf(roofs);
  roof.colour("aliceblue");
  roof.fadeTo(70, 2);
  at(now() + 6, () => roof.fadeTo(15, 6));
}

square.parts("windows").colour("lightsteelblue").fadeTo(25, 8);
repeat(60, () => {
  flake();
  wait(2);
});
wait(8);
square.all.fadeTo(0, 12);
`,
  }),
  written({
    id: "half-past-owl",
    title: "Half Past Owl",
    songId: "lantern-waltz",
    authors: ["7K-QUILL/ines"],
    lesson: 7,
    about: "Two functions with parameters; an owl that looks left and right.",
    source: `
// the owl has two eyes: bank and museum doors
const left = square.front("bank");
const right = square.front("museum");

function look(eye: Lights, beats: number) {
  eye.fadeTo(90, beats);
  wait(beats);
  eye.fadeTo(20, beats);
  wait(beats);
}

function hoot(times: number) {
  repeat(times, () => {
    square.parts("roof").pulse(3, "khaki");
    wait(6);
  });
}

repeat(6, () => {
  look(left, 3);
  look(right, 3);
  hoot(2);
  wait(9);
});
left.and(right).fadeTo(0, 3);
`,
  }),
  written({
    id: "paper-moths",
    title: "Paper Moths",
    songId: "quillhaven-bells",
    authors: ["7B-TARN/pia"],
    lesson: 7,
    about: "Chance decides where a moth goes, conditions keep it off the slow boxes.",
    source: `
// moths fly to the brightest house
let house = 0;

function nextHouse() {
  if (chance(70)) {
    house = house + 1;
  } else {
    house = house - 1;
  }
  if (house < 0) {
    house = square.fronts.length - 1;
  }
  if (house >= square.fronts.length) {
    house = 0;
  }
}

square.parts("door").fadeTo(40, 4);
repeat(104, () => {
  const front = square.fronts[house];
  if (front.box === "relay") {
    front.part("windows").pulse(2);
  } else {
    front.colour(oneOf(["wheat", "bisque", "gold"]));
    front.pulse(2);
  }
  nextHouse();
  wait(2);
});
square.parts("door").fadeTo(0, 8);
`,
  }),
  written({
    id: "a-kite-in-december",
    title: "A Kite in December",
    songId: "frost-fair",
    authors: ["7B-TARN/sara"],
    lesson: 7,
    about: "A path there and back again with reversed and inTurn.",
    source: `
// the kite goes up the north side and comes down the south side
const north = square.side("north");
const south = square.side("south");
const colours = ["tomato", "gold", "skyblue", "violet"];

function fly(path, shade) {
  path.inTurn(0.5, (front, i) => {
    front.pulse(3, shade);
    front.part("roof").pulse(2 + i / 5, "white");
  });
}

repeat(8, (turn) => {
  const shade = colours[turn % 4];
  fly(north, shade);
  wait(8);
  fly(south.reversed(), shade);
  wait(8);
});
square.front("tree").colour("gold").fadeTo(100, 4);
wait(8);
square.front("tree").fadeTo(0, 4);
`,
  }),
  written({
    id: "fair-without-rain",
    title: "Fair Without Rain",
    songId: "frost-fair",
    authors: ["7B-TARN/arlo"],
    lesson: 7,
    about: "Stalls open and close; a dice decides how long.",
    source: `
// every stall opens for as long as the dice says
function open(front, beats) {
  front.colour("orange").fadeTo(75, 1);
  at(now() + beats, () => front.fadeTo(0, 2));
}

for (const front of square.fronts) {
  const beats = roll(6) + 4;
  open(front, beats);
  wait(3);
}
square.parts("awning").on();
wait(12);
square.parts("awning").off();
`,
  }),
  written({
    id: "crossing",
    title: "Crossing",
    songId: "jingle-bells",
    authors: ["7A-TARN/grace"],
    lesson: 7,
    about: "One function for two directions.",
    source: `
function walk(list, colour) {
  list.inTurn(1, (front) => front.pulse(3, colour));
}
const north = square.side("north");
const south = square.side("south");
repeat(10, () => {
  walk(north, "red");
  walk(south.reversed(), "limegreen");
  wait(12);
  walk(north.reversed(), "limegreen");
  walk(south, "red");
  wait(10);
});
`,
  }),
  written({
    id: "only-the-quick-ones",
    title: "Only the Quick Ones",
    songId: "skaters-jig",
    authors: ["7A-TARN/haruto"],
    lesson: 6,
    about: "Looks at the kind of box before it flashes.",
    source: `
for (let round = 0; round < 6; round++) {
  for (const front of square.fronts) {
    if (front.box === "dimmer" || front.box === "colour") {
      front.pulse(1, "yellow");
      wait(0.5);
    } else {
      front.pulse(2);
    }
  }
  wait(4);
}
`,
  }),
  written({
    id: "coin-toss",
    title: "Coin Toss",
    songId: "good-king-wenceslas",
    authors: ["7A-TARN/ilse"],
    lesson: 6,
    about: "Heads is north, tails is south.",
    source: `
let heads = 0;
for (let toss = 0; toss < 28; toss++) {
  if (chance(50)) {
    heads = heads + 1;
    square.side("north").pulse(6, "gold");
  } else {
    square.side("south").pulse(6, "skyblue");
  }
  wait(8);
}
console.log("heads came", heads, "times out of 28");
`,
  }),
  written({
    id: "growing-circle",
    title: "Growing Circle",
    songId: "quillhaven-bells",
    authors: ["7A-TARN/jonah"],
    lesson: 7,
    about: "A function with a number that grows.",
    source: `
function ring(size, shade) {
  const part = square.fronts.first(size);
  part.colour(shade).fadeTo(70, 4);
  wait(4);
  part.fadeTo(0, 4);
  wait(4);
}
for (let size = 2; size <= 41; size = size + 3) {
  ring(size, size % 2 === 0 ? "teal" : "orchid");
}
ring(41, "white");
ring(41, "gold");
`,
  }),
  written({
    id: "dice-street",
    title: "Dice Street",
    songId: "frost-fair",
    authors: ["7A-TARN/kiri"],
    lesson: 6,
    about: "Everything by luck, still calm.",
    source: `
const north = square.side("north");
for (let i = 0; i < 46; i++) {
  const house = roll(10) - 1;
  const length = roll(3);
  north[house].pulse(length + 1, oneOf(["gold", "tomato", "skyblue"]));
  wait(length);
}
`,
  }),
];
