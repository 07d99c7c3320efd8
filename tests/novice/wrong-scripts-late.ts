// Twenty scripts with one mistake each, as beginners write them in lessons 7 to 12; line and code were written down before any check ran.
import type { WrongScript } from "./wrong-scripts.ts";

export const WRONG_SCRIPTS_LATE: readonly WrongScript[] = [
  {
    lesson: 7,
    name: "sparkle without its brackets",
    source: `// my sparkle show
const tree = square.front("tree");

function sparkle() {
  tree.on(80);
  wait(1);
    tree.off();
  wait(1);
}

sparkle;
sparkle();
`,
    line: 11,
    codes: ["not-run"],
    slip: "token",
  },
  {
    lesson: 7,
    name: "blink handed over already run",
    source: `const cake = square.front("bakery");

function blink() {
  cake.on(100);
  wait(1);
  cake.off();
  wait(1);
}

// four times!!
repeat(4, blink());
`,
    line: 11,
    codes: ["ran-too-early", "not-an-action"],
    slip: "thought",
  },
  {
    lesson: 7,
    name: "a wave that should never stop",
    source: `// the wave goes on and on
function wave() {
  for (const house of square.fronts) {
    house.pulse(1, "aqua");
    wait(0.5);
  }
  // and again
  wave();
}

wave();
`,
    line: 8,
    codes: ["calls-itself"],
    slip: "thought",
  },
  {
    lesson: 7,
    name: "inTurn the wrong way round",
    source: `const north = square.side("north");
const back = north.reversed();

// there
north.inTurn(0.5, (house) => house.pulse(1, "gold"));
wait(4);

// and back again
back.inTurn((house) => house.pulse(1, "red"), 0.5);
`,
    line: 9,
    codes: ["wants-a-number", "not-an-action"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "one surprise for all bars",
    source: `// every bar of the chorus is a different surprise
const chorus = song.section("chorus");
const surprise = roll(100);

at(chorus.bars, () => {
  square.side("north").on(surprise);
});
at(chorus.end, () => square.side("north").off());
`,
    line: 6,
    codes: ["same-each-turn"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "waits as long as the chorus is far away",
    source: `const chorus = song.section("chorus");
const books = square.front("bookshop");

books.on(40);
wait(8);
books.off();

// now wait for the chorus
wait(chorus.start);
books.on(100);
wait(4);
books.off();
`,
    line: 9,
    codes: ["wait-for-place"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "chorus with a capital",
    source: `// Verse = blue, chorus = orange
const verse = song.section("verse");
const chorus = song.section("Chorus");

at(verse.start, () => {
  square.all.colour("blue");
  square.all.on(50);
});
at(chorus.start, () => {
  square.all.colour("orange");
  square.all.on(90);
});
at(chorus.end, () => square.all.off());
`,
    line: 3,
    codes: ["no-such-section"],
    slip: "token",
  },
  {
    lesson: 8,
    name: "the off stands outside",
    source: `const verse = song.section("verse");
const library = square.front("library");

at(verse.start, () => {
  library.on(70);
  wait(8);
});
// 8 beats later it goes dark
library.off();
`,
    line: 6,
    codes: ["last-wait"],
    slip: "thought",
  },
  {
    lesson: 9,
    name: "one house too many",
    source: `const houses = ["bakery", "cinema", "florist"];

for (let i = 0; i <= houses.length; i++) {
  const house = square.front(houses[i]);
  house.on(80);
  wait(2);
  house.off();
}
`,
    line: 4,
    codes: ["not-in-list"],
    slip: "token",
  },
  {
    lesson: 9,
    name: "mixed up but not kept",
    source: `// mix up the houses so that nobody knows who is next
const houses = square.fronts;
houses.shuffled();

for (const h of houses) {
  h.pulse(2, oneOf(["red", "lime", "gold"]));
  wait(1);
}
`,
    line: 3,
    codes: ["unused-list"],
    slip: "thought",
  },
  {
    lesson: 9,
    name: "two houses added with plus",
    source: `// my team is the bakery and the tree
const team = square.front("bakery") + square.front("tree");

team.on(80);
wait(4);
team.off();
`,
    line: 2,
    codes: ["other"],
    slip: "thought",
    meant: "Lights cannot be added with +; use and() to put two selections together.",
  },
  {
    lesson: 10,
    name: "back to the verse",
    source: `const verse = song.section("verse");
const chorus = song.section("chorus");

waitUntil(chorus.start);
square.all.on(100);
wait(4);
square.all.off();

// the verse should be calm
waitUntil(verse.start);
square.front("tree").fadeTo(40, 4);
`,
    line: 10,
    codes: ["already-passed"],
    slip: "thought",
  },
  {
    lesson: 10,
    name: "template text in the wrong quotes",
    source: `const chorus = song.section("chorus");
const loud = howLoud(chorus.start);

// how loud is it??
console.log("The chorus is \${loud} loud");

waitUntil(chorus.start);
square.all.on(loud);
wait(8);
square.all.off();
`,
    line: 5,
    codes: ["other"],
    slip: "token",
    meant: "A text with \${...} inside needs backticks around it, or it is shown just as it stands.",
  },
  {
    lesson: 10,
    name: "two layers on the same lights",
    source: `// layer 1 is calm, layer 2 is strong
const everyone = square.all;

const calm = () => {
  everyone.on(30);
  wait(4);
  everyone.off();
};
const strong = () => {
  everyone.on(90);
  wait(2);
  everyone.on(50);
};

together(calm, strong);
`,
    line: 5,
    codes: ["never-seen"],
    slip: "thought",
  },
  {
    lesson: 11,
    name: "pitch spelt wrong",
    source: `const tune = song.notes("bells");
const tree = square.front("tree");

for (const note of tune) {
  at(note.start, () => {
    tree.pulse(note.beats, hue(note.pich * 5));
  });
}
console.log("notes: " + tune.length);
`,
    line: 6,
    codes: ["unknown-word"],
    slip: "token",
  },
  {
    lesson: 11,
    name: "notes used like moments",
    source: `// the cinema plays the bells
const cinema = square.front("cinema");
const melody = song.notes("bells", song.section("verse"));

at(melody, () => {
  cinema.pulse(1, "violet");
});
`,
    line: 5,
    codes: ["wants-a-number"],
    slip: "thought",
  },
  {
    lesson: 11,
    name: "a rainbow in the dark",
    source: `// RAINBOW TREE
const strip = square.front("tree").lights;
let angle = 0;

for (const light of strip) {
  light.colour(hue(angle));
  angle = angle + 10;
}
`,
    line: 6,
    codes: ["colour-never-lit"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "more bars than the song has",
    source: `// a flash every 10 bars until the end
function flash(who: Lights) {
  who.pulse(2, "white");
}

for (let b = 5; b <= 120; b += 10) {
  at(song.bar(b), () => flash(square.parts("roof")));
}
`,
    line: 7,
    codes: ["no-such-bar"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "beats counted from nought",
    source: `const doors = square.parts("door");

// one pulse on each beat of bar 9
for (let k = 0; k < song.beatsPerBar; k++) {
  at(song.bar(9, k), () => {
    doors.pulse(0.5, "gold");
  });
}
`,
    line: 5,
    codes: ["no-such-beat"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "type with a small letter",
    source: `// finale
function glow(who: lights, level: number) {
  who.fadeTo(level, 4);
  wait(4);
}

waitUntil(song.bar(20));
glow(square.side("east"), 80);
glow(square.side("west"), 80);
wait(beatsIn(3));
square.all.off();
`,
    line: 2,
    codes: ["unknown-word"],
    slip: "token",
  },
];
