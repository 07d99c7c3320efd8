// Forty scripts with one mistake each, as beginners write them; line and code were written down before any check ran.

export interface WrongScript {
  lesson: number;
  name: string;
  source: string;
  /** Where a good teacher would point; the first line is 1. */
  line: number;
  codes: readonly string[];
  slip: "token" | "thought";
  /** What the message should say, where no code fits. */
  meant?: string;
}

export const WRONG_SCRIPTS: readonly WrongScript[] = [
  {
    lesson: 1,
    name: "wait with a capital letter",
    source: `// my street
square.front("bakery").on();
wait(4);
square.front("cinema").on();
Wait(4);
square.front("bakery").off();
square.front("cinema").off();
`,
    line: 5,
    codes: ["unknown-word"],
    slip: "token",
  },
  {
    lesson: 1,
    name: "museum without quotes",
    source: `square.front("library").on();
wait(2);

// now the museum!!!
square.front(museum).on();
wait(6);
square.front("library").off();
`,
    line: 5,
    codes: ["needs-quotes"],
    slip: "token",
  },
  {
    lesson: 1,
    name: "quote left open",
    source: `// good morning
square.front("tea room").on();
wait(3);
square.front("bakery).on();
wait(3);
square.front("tea room").off();
`,
    line: 4,
    codes: ["other"],
    slip: "token",
    meant: "The name begins with a quote, but the quote at its end is missing.",
  },
  {
    lesson: 1,
    name: "blink without a wait",
    source: `// the cinema should blink
square.front("bakery").on();
wait(4);
square.front("cinema").on();
square.front("cinema").off();
wait(4);
square.front("bakery").off();
`,
    line: 4,
    codes: ["never-seen"],
    slip: "thought",
  },
  {
    lesson: 2,
    name: "const that should grow",
    source: `// slower and slower
const warm = "gold";
const gap = 2;
square.front("bookshop").pulse(2, warm);
wait(gap);
gap = gap + 1;
square.front("florist").pulse(2, warm);
wait(gap);
square.front("tea room").pulse(2, warm);
`,
    line: 6,
    codes: ["constant"],
    slip: "thought",
  },
  {
    lesson: 2,
    name: "sum that nobody keeps",
    source: `let pause = 2;
square.front("florist").pulse(2, "tomato");
wait(pause);
pause + 1;
square.front("florist").pulse(2, "gold");
wait(pause);
square.front("florist").pulse(2, "tomato");
console.log("pause is", pause);
`,
    line: 4,
    codes: ["unused-answer"],
    slip: "thought",
  },
  {
    lesson: 2,
    name: "coloured but never lit",
    source: `// blue night
const cold = "skyblue";
square.front("bookshop").on();
square.front("bookshop").colour(cold);
wait(4);
   square.front("tea room").colour(cold);
wait(8);
square.front("bookshop").off();
`,
    line: 6,
    codes: ["colour-never-lit"],
    slip: "thought",
  },
  {
    lesson: 2,
    name: "colour that is not one",
    source: `const one = "gold";
const two = "tomatoe";

square.front("florist").pulse(2, one);
wait(2);
square.front("florist").pulse(4, two);
wait(4);
square.front("florist").pulse(2, one);
`,
    line: 2,
    codes: ["unknown-colour"],
    slip: "token",
  },
  {
    lesson: 3,
    name: "first loop not closed",
    source: `// round one
for (const front of square.fronts) {
  front.pulse(2, "plum");
  wait(1);

// round two
for (const house of square.fronts) {
  house.pulse(4, "gold");
  wait(0.5);
}
`,
    line: 2,
    codes: ["missing-bracket"],
    slip: "token",
  },
  {
    lesson: 3,
    name: "wait below the brace",
    source: `// one after the other please
const mood = "gold";
for (const front of square.fronts) {
  front.pulse(2, mood);
}
wait(1);
console.log("round the square in", mood);
`,
    line: 6,
    codes: ["other"],
    slip: "thought",
    meant: "All fronts pulse at the same moment, because the wait stands after the brace and not inside the loop.",
  },
  {
    lesson: 3,
    name: "in where of belongs",
    source: `const shine = "skyblue";

for (const shop in square.fronts) {
    shop.pulse(2, shine);
    wait(1);
}
`,
    line: 3,
    codes: ["other"],
    slip: "token",
    meant: "Write of and not in, to get each front of the list.",
  },
  {
    lesson: 3,
    name: "all fronts in every turn",
    source: `// the light walks round
const warm = "gold";
for (const front of square.fronts) {
  square.fronts.pulse(2, warm);
  wait(2);
}
`,
    line: 4,
    codes: ["same-each-turn"],
    slip: "thought",
  },
  {
    lesson: 4,
    name: "night comes too soon",
    source: `// sunrise, then night
const town = square.all;
town.fadeTo(100, 8);
wait(4);
town.fadeTo(0, 8);
wait(8);
for (let n = 1; n < 5; n++) {
  square.side("west").first(n).on();
  wait(2);
}
`,
    line: 5,
    codes: ["fade-cut"],
    slip: "token",
  },
  {
    lesson: 4,
    name: "brighter than full",
    source: `// ten steps of light
for (let n = 1; n < 11; n++) {
  square.side("south").fadeTo(n * 20, 2);
  wait(2);
}
square.side("south").fadeTo(0, 4);
`,
    line: 3,
    codes: ["level-clamped"],
    slip: "thought",
  },
  {
    lesson: 4,
    name: "level and beats swapped",
    source: `const south = square.side("south");
// up to 90 in 8 beats
south.fadeTo(8, 90);
wait(8);
south.fadeTo(0, 4);
wait(4);
for (let n = 1; n < 4; n++) {
  south.first(n).on();
    wait(2);
}
`,
    line: 3,
    codes: ["fade-cut", "never-switches"],
    slip: "thought",
  },
  {
    lesson: 5,
    name: "one window",
    source: `// only the windows
for (let round = 0; round < 3; round++) {
  for (const front of square.side("north")) {
    front.part("window").pulse(3, "gold");
    wait(1);
  }
}
`,
    line: 4,
    codes: ["unknown-part"],
    slip: "token",
  },
  {
    lesson: 5,
    name: "bracket lost after the part",
    source: `for (let round = 0; round < 4; round++) {
  for (const front of square.side("east").everyNth(2, round % 2)) {
    front.part("windows".pulse(3, "orchid");
    wait(1);
  }
  wait(2);
}
`,
    line: 3,
    codes: ["missing-bracket"],
    slip: "token",
  },
  {
    lesson: 5,
    name: "both loops count with round",
    source: `// 4 rounds, 2 halves each
for (let round = 0; round < 4; round++) {
  for (round = 0; round < 2; round++) {
    square.side("west").everyNth(2, round).pulse(2, "teal");
    wait(2);
  }
}
`,
    line: 3,
    codes: ["endless"],
    slip: "thought",
  },
  {
    lesson: 6,
    name: "lucky six with one equals",
    source: `// a six is red
for (const front of square.side("north")) {
  let luck = roll(6);
  if (luck = 6) {
    front.pulse(4, "tomato");
  } else {
    front.pulse(2, "gold");
  }
  wait(1);
}
`,
    line: 4,
    codes: ["one-equals"],
    slip: "token",
  },
  {
    lesson: 6,
    name: "now without brackets",
    source: `for (const front of square.fronts) {
  if (front.box === "colour" && now < 20) {
    front.pulse(2, "skyblue");
  } else {
    front.pulse(2);
  }
  wait(1);
}
`,
    line: 2,
    codes: ["not-run"],
    slip: "token",
  },
  {
    lesson: 6,
    name: "rest that never comes",
    source: `// every 4th turn is tomato
for (let turn = 0; turn < 16; turn++) {
  if (turn % 4 === 4) {
    square.front("bookshop").pulse(2, "tomato");
  } else {
    square.front("bookshop").pulse(2, "gold");
  }
  wait(2);
}
`,
    line: 3,
    codes: ["other"],
    slip: "thought",
    meant: "What is left after sharing by 4 is 0, 1, 2 or 3 and never 4, so the first lines never run.",
  },
  {
    lesson: 7,
    name: "blink handed over with brackets",
    source: `function blink() {
  square.front("library").on();
  wait(2);
  square.front("library").off();
  wait(2);
}

// four blinks
repeat(4, blink());
`,
    line: 9,
    codes: ["ran-too-early"],
    slip: "thought",
  },
  {
    lesson: 7,
    name: "wave in a wave",
    source: `// again and again
function wave(colour) {
  square.side("north").inTurn(1, (front) => front.pulse(3, colour));
  wait(10);
  wave(colour);
}

wave("gold");
`,
    line: 5,
    codes: ["calls-itself"],
    slip: "thought",
  },
  {
    lesson: 7,
    name: "good night nobody said",
    source: `function wave(colour) {
  square.side("south").inTurn(1, (front) => front.pulse(3, colour));
  wait(10);
}

function goodNight() {
  square.all.fadeTo(0, 4);
  wait(4);
}

square.front("tree").on();
wave("gold");
wave("tomato");
// the end, all dark
`,
    line: 6,
    codes: ["not-run"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "waits for the chorus",
    source: `// quiet, then CHORUS
square.front("tree").fadeTo(60, 8);
wait(8);
const chorus = song.section("chorus");
wait(chorus.start);
square.side("south").on();
`,
    line: 5,
    codes: ["wait-for-place"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "waits for the next bar in at",
    source: `const verse = song.section("verse");
at(verse.bars, () => {
  square.side("north").pulse(2, "skyblue");
  // then on to the next bar
  wait(4);
});
`,
    line: 5,
    codes: ["last-wait"],
    slip: "thought",
  },
  {
    lesson: 8,
    name: "at a whole chorus",
    source: `const verse = song.section("verse");
const chorus = song.section("chorus");

at(verse.start, () => square.all.fadeTo(60, 4));
at(chorus, () => square.all.fadeTo(90, 4));
at(chorus.end, () => square.all.fadeTo(0, 4));
`,
    line: 5,
    codes: ["wants-a-number"],
    slip: "thought",
  },
  {
    lesson: 9,
    name: "one front too many",
    source: `const north = square.side("north");
const colours = ["gold", "tomato"];

for (let i = 0; i <= north.length; i++) {
  north[i].pulse(2, colours[i % 2]);
  wait(1);
}
`,
    line: 5,
    codes: ["not-in-list"],
    slip: "thought",
  },
  {
    lesson: 9,
    name: "except that is not kept",
    source: `// everything but the tree
const town = square.all;
const tree = square.front("tree");
town.except(tree);
town.on(80);
wait(16);
tree.fadeTo(100, 8);
`,
    line: 4,
    codes: ["unused-list"],
    slip: "thought",
  },
  {
    lesson: 9,
    name: "list of names, not of fronts",
    source: `// my 3 best shops
const best = ["bookshop", "florist", "tea room"];
for (const shop of best) {
  shop.pulse(4, oneOf(["gold", "plum"]));
  wait(2);
}
`,
    line: 4,
    codes: ["unknown-skill"],
    slip: "thought",
  },
  {
    lesson: 10,
    name: "waves that ran before together",
    source: `function wave(side, colour) {
  for (const front of square.side(side)) {
    front.pulse(2, colour);
    wait(1);
  }
}
// both at once
together(wave("north", "gold"), wave("south", "teal"));
`,
    line: 8,
    codes: ["ran-too-early", "not-an-action"],
    slip: "thought",
  },
  {
    lesson: 10,
    name: "side with a letter gone",
    source: `const waves = [
  { side: "north", colour: "gold" },
  { side: "soth", colour: "tomato" },
];

for (const w of waves) {
  square.side(w.side).inTurn(1, (front) => front.pulse(2, w.colour));
  wait(10);
}
`,
    line: 3,
    codes: ["unknown-side"],
    slip: "token",
  },
  {
    lesson: 10,
    name: "four more beats with waitUntil",
    source: `const tree = square.front("tree");
// 8 beats on, 4 beats off, on again
tree.on();
waitUntil(8);
tree.off();
waitUntil(4);
tree.on(70);
at(song.hits("drums"), () => square.parts("roof").pulse(2));
`,
    line: 6,
    codes: ["already-passed"],
    slip: "thought",
  },
  {
    lesson: 11,
    name: "refrain",
    source: `const part = song.section("refrain");
for (const note of song.notes("bells", part)) {
  const front = square.fronts[note.pitch % square.fronts.length];
  at(note.start, () => front.pulse(2, hue(note.pitch * 5)));
}
`,
    line: 1,
    codes: ["no-such-section"],
    slip: "token",
  },
  {
    lesson: 11,
    name: "pitch with letters swapped",
    source: `// every bell gets its own shop
const bells = song.notes("bells", song.section("verse"));
const shops = square.fronts;
for (const note of bells) {
  const shop = shops[note.ptich % shops.length];
  at(note.start, () => shop.pulse(2));
}
`,
    line: 5,
    codes: ["unknown-skill", "unknown-word"],
    slip: "token",
  },
  {
    lesson: 11,
    name: "hue as a text",
    source: `// blue and loud
const north = square.side("north");
for (const section of song.sections) {
  at(section.start, () => {
    north.colour("hue(200)", 2);
    north.on(80);
  });
}
`,
    line: 5,
    codes: ["unknown-colour"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "beats counted as bars",
    source: `function flash(lights: Lights, colour: string) {
  lights.pulse(4, colour);
}

at(song.bar(8), () => flash(square.fronts, "gold"));
// beat 100 is where it gets loud
at(song.bar(100), () => flash(square.fronts, "tomato"));
`,
    line: 7,
    codes: ["no-such-bar"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "fifth beat of four",
    source: `const tree = square.front("tree");

function ring(bar: number, beat: number) {
  at(song.bar(bar, beat), () => tree.pulse(2));
}
ring(4, 1);
ring(4, 3);
ring(5, 5);
`,
    line: 8,
    codes: ["no-such-beat"],
    slip: "token",
  },
  {
    lesson: 12,
    name: "while without a wait",
    source: `// one front a beat, to the very end
let turn = 0;
while (now() < song.end) {
  const front = square.fronts[turn % square.fronts.length];
  front.pulse(2, hue(turn * 10));
  turn = turn + 1;
}
`,
    line: 3,
    codes: ["clock-stood-still", "endless"],
    slip: "thought",
  },
  {
    lesson: 12,
    name: "took the wrong bar away",
    source: `function glow(lights: Lights, level: number) {
  lights.fadeTo(level, song.beatsPerBar);
}

waitUntil(song.bar(3));
glow(square.all, 80);
// from bar 3 to bar 9
wait(song.bar(3) - song.bar(9));
glow(square.all, 0);
`,
    line: 8,
    codes: ["negative-time"],
    slip: "thought",
  },
];
