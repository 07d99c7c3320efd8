// Sixty right scripts, five a lesson, as lively beginners write them; nothing in them should be complained about, and that was written down before any check ran. (One text was put right since: its writer took `and` to give fronts.)

export interface RightScript {
  lesson: number;
  name: string;
  source: string;
}

export const RIGHT_SCRIPTS: readonly RightScript[] = [
  {
    lesson: 1,
    name: "good morning bakery",
    source: `// the bakery wakes up first because of the bread
square.front("bakery").on();
wait(4);
square.front("library").on();
wait(4);
square.front("cinema").on();

// and now everybody goes to bed
wait(8);
square.front("bakery").off();
square.front("library").off();
square.front("cinema").off();
`,
  },
  {
    lesson: 1,
    name: "ping pong",
    source: `square.front("bookshop").on();
wait(3)
square.front("bookshop").off();
square.front("florist").on();
wait(3)
square.front("florist").off();
square.front("bookshop").on();
wait(3)
square.front("bookshop").off();
square.front("florist").on();
wait(6)
square.front("florist").off();
`,
  },
  {
    lesson: 1,
    name: "only the tree",
    source: `
wait(8);      // nothing... spooky


square.front('tree').on();

wait(16);

square.front('tree').off();

`,
  },
  {
    lesson: 1,
    name: "chapel stays on",
    source: `// my show by me!!!
square.front("chapel").on();
wait(2);
square.front("tea room").on();
wait(2);
square.front("hat shop").on();
wait(2);
  square.front("tea room").off();
wait(4);
  square.front("tea room").on();
// no off at the end, I want it bright
`,
  },
  {
    lesson: 1,
    name: "half bright museum",
    source: `square.front("museum").on(60);
wait(4);
square.front("museum").on(80);   // more
wait(4);
square.front("museum").on(100);  // MORE
wait(8.5);
square.front("museum").off();
`,
  },
  {
    lesson: 2,
    name: "my mood",
    source: `const mood = "hotpink";

square.front("hat shop").colour(mood).on();
wait(8);
square.front("hat shop").off();
wait(2);
square.front("bookshop").on();
square.front("bookshop").colour(mood);
console.log("the mood was", mood);
`,
  },
  {
    lesson: 2,
    name: "longer and longer",
    source: `let long = 2;
square.front("cinema").pulse(long, "gold");
wait(long);
long = long + 1;
square.front("cinema").pulse(long, "gold");
wait(long);
long = long + 1;
square.front("cinema").pulse(long, "tomato");
wait(long);
console.log("now it is " + long + " beats long");
`,
  },
  {
    lesson: 2,
    name: "two colours take turns",
    source: `// red team against blue team
const red = "#ff2200";
const blue = "#0044ff";
let gap = 4

square.front("florist").pulse(4, red)
wait(gap)
square.front("tea room").pulse(4, blue)
wait(gap)
gap = gap - 1   // faster!
square.front("florist").pulse(3, red)
wait(gap)
square.front("tea room").pulse(3, blue)
`,
  },
  {
    lesson: 2,
    name: "adding up the beats",
    source: `let total = 0;
const step = 5;
square.front("bakery").on();
wait(step);
total = total + step;
square.front("library").on();
wait(step);
total += step;
square.front("bakery").off();
square.front("library").off();
console.log("lights out after", total, "beats");
console.log("phew");
`,
  },
  {
    lesson: 2,
    name: "sunset at the hat shop",
    source: `let shop = square.front("hat shop");
shop.colour("gold");
shop.on();
wait(6);
shop.colour("orange", 4);  // takes 4 beats
wait(6);
shop.colour("orchid", 4);
wait(6);
shop.colour("midnightblue", 4);
wait(8);
shop.off();
// night
`,
  },
  {
    lesson: 3,
    name: "golden walk",
    source: `// once around the square
for (const front of square.fronts) {
  front.pulse(4, "gold");
  wait(1);
}
`,
  },
  {
    lesson: 3,
    name: "on one by one then all off",
    source: `for (const shop of square.fronts) {
    shop.on();
    wait(1);
}
wait(4);
for (const shop of square.fronts) { shop.off(); }   // no wait so all at the same time
console.log("good night");
`,
  },
  {
    lesson: 3,
    name: "counting shops",
    source: `let howMany = 0;
for (const x of square.fronts)
{
  x.pulse(3, "plum");
  howMany = howMany + 1;
  wait(0.5);
}
console.log("I counted " + howMany + " fronts");
`,
  },
  {
    lesson: 3,
    name: "three favourites",
    source: `const bakery = square.front("bakery");
const cinema = square.front("cinema");
const tree = square.front("tree");

// my favourites go first
for (const favourite of [bakery, cinema, tree]) {
  favourite.pulse(6, "tomato");
  wait(6);
}

// then everybody
for (const front of square.fronts) {
  front.pulse(8);
}
`,
  },
  {
    lesson: 3,
    name: "rainbow on the hat shop",
    source: `const hats = square.front("hat shop");
hats.on();
for (const c of ["red", "orange", "yellow", "green", "blue", "violet"]) {
  hats.colour(c);
  console.log(c);
  wait(4);
}
hats.off();
`,
  },
  {
    lesson: 4,
    name: "slow sunrise",
    source: `// up...
square.all.fadeTo(100, 16);
wait(16);
// ...stay...
wait(8);
// ...down
square.all.fadeTo(0, 16);
`,
  },
  {
    lesson: 4,
    name: "stairs of shops",
    source: `const north = square.side("north");
for (let n = 1; n <= 6; n++) {
  north.first(n).pulse(4, "gold");
  console.log("now", n, "shops");
  wait(4);
}
`,
  },
  {
    lesson: 4,
    name: "countdown",
    source: `// like a rocket
for (let i = 10; i > 0; i--) {
  console.log(i);
  square.front("tree").pulse(1, "red");
  wait(1);
}
console.log("LIFT OFF");
square.all.pulse(16, "white");
`,
  },
  {
    lesson: 4,
    name: "four sides",
    source: `square.side("north").fadeTo(100, 4);
wait(4);
square.side("east").fadeTo(100, 4);
wait(4);
square.side("south").fadeTo(100,4);
wait(4);
square.side("west").fadeTo(100,4);
wait(12);

for (const s of ["west", "south", "east", "north"]) {
  square.side(s).fadeTo(0, 2);
  wait(2);
}
`,
  },
  {
    lesson: 4,
    name: "ten steps brighter",
    source: `const south = square.side("south")
const tree = square.front("tree")
for (let step = 1; step < 11; step += 1) {
  south.fadeTo(step * 10, 2)
  wait(2)
  tree.pulse(2, "aqua")
}
wait(4)
south.off()
`,
  },
  {
    lesson: 5,
    name: "odd and even",
    source: `// first the even ones, then the odd ones
for (let round = 0; round < 6; round++) {
  square.side("east").everyNth(2, round % 2).pulse(4, "orchid");
  wait(4);
}
`,
  },
  {
    lesson: 5,
    name: "three laps",
    source: `for (let lap = 1; lap <= 3; lap++) {
  console.log("lap " + lap);
  for (const front of square.side("north")) {
    front.pulse(2, "skyblue");
    wait(1);
  }
  wait(2); // breathe
}
console.log("finished!");
`,
  },
  {
    lesson: 5,
    name: "windows then roofs",
    source: `const windows = square.parts("windows");
const roofs = square.parts("roof");

for (let i = 0; i < 4; i++) {
  windows.pulse(4, "gold");
  wait(4);
  roofs.pulse(4, "crimson");
  wait(4);
}
`,
  },
  {
    lesson: 5,
    name: "all four sides twice",
    source: `const names = ["north", "east", "south", "west"];
for (let twice = 0; twice < 2; twice++) {
    for (const name of names) {
        for (const front of square.side(name).first(4)) {
            front.pulse(3);
            wait(1);
        }
    }
}
`,
  },
  {
    lesson: 5,
    name: "every third window",
    source: `for (let k = 0; k < 9; k++) {
  square.parts("windows").everyNth(3, k % 3).pulse(4, "lime");
  square.parts("door").everyNth(3, (k + 1) % 3).pulse(4, "magenta");
  wait(4);
}
`,
  },
  {
    lesson: 6,
    name: "be kind to relays",
    source: `// relays go klack klack so they get a long one
for (const front of square.fronts) {
  if (front.box === "relay") {
    front.pulse(8);
  } else {
    front.pulse(2, "gold");
  }
  wait(1);
}
`,
  },
  {
    lesson: 6,
    name: "lucky dice",
    source: `for (let turn = 0; turn < 12; turn++) {
  const dice = roll(6);
  if (dice === 6) {
    console.log("SIX!!");
    square.all.pulse(4, "gold");
  } else if (dice > 3) {
    square.side("north").pulse(4, "tomato");
  } else {
    square.side("south").pulse(4, "teal");
  }
  wait(4);
}
`,
  },
  {
    lesson: 6,
    name: "until beat 32",
    source: `while (now() < 32) {
  if (chance(30)) {
    square.front("tree").pulse(2, "white");
  }
  else {
    square.front("tree").pulse(1, "green");
  }
  wait(2);
}
console.log("stopped at", now());
`,
  },
  {
    lesson: 6,
    name: "only colour fronts and only early",
    source: `let skipped = 0;
for (const front of square.fronts) {
  if (front.box === "colour" && now() < 20) {
    front.pulse(4, "skyblue");
    wait(1);
  } else {
    skipped = skipped + 1;
  }
}
console.log("skipped " + skipped);
`,
  },
  {
    lesson: 6,
    name: "heads or tails",
    source: `let heads = 0;
let tails = 0;
const colour = "gold"
for (let i = 0; i < 8; i++) {
  if (chance(50)) {
    heads++;
    square.side("east").pulse(4, colour);
  } else {
    tails++;
    square.side("west").pulse(4, colour);
  }
  wait(4);
}
// who won?
if (heads === tails) console.log("a draw");
else if (heads > tails) console.log("east won", heads, "to", tails);
else console.log("west won", tails, "to", heads);
`,
  },
  {
    lesson: 7,
    name: "blink the library",
    source: `function blink() {
  square.front("library").on();
  wait(2);
  square.front("library").off();
  wait(2);
}

repeat(6, blink);
`,
  },
  {
    lesson: 7,
    name: "walk there and back",
    source: `const walk = (side, c) => {
  for (const front of side) {
    front.pulse(3, c);
    wait(1);
  }
};

walk(square.side("north"), "gold");
walk(square.side("north").reversed(), "tomato");
walk(square.side("south"), "teal");
walk(square.side("south").reversed(), "plum");
`,
  },
  {
    lesson: 7,
    name: "wave with inTurn",
    source: `const east = square.side("east");
const west = square.side("west");

// like in the stadium!
repeat(3, (n) => {
  console.log("wave number", n + 1);
  east.inTurn(0.5, front => front.pulse(4, "deepskyblue"));
  west.reversed().inTurn(0.5, front => front.pulse(4, "deepskyblue"));
  wait(12);
});
`,
  },
  {
    lesson: 7,
    name: "return early",
    source: `function flash(front) {
  if (front.box === "relay") {
    return;   // relays may sleep
  }
  front.pulse(2, "violet");
  wait(0.5);
}

for (const f of square.fronts) {
  flash(f);
}
wait(4);
for (const f of square.fronts.reversed()) flash(f);
`,
  },
  {
    lesson: 7,
    name: "machine for colours",
    source: `function pick(turn) {
  if (turn % 3 === 0) return "red";
  if (turn % 3 === 1) return "green";
  return "blue";
}
function show(turn) {
  square.front("tree").pulse(4, pick(turn));
  square.front("hat shop").pulse(4, pick(turn + 1));
  wait(4);
}
repeat(9, show);
`,
  },
  {
    lesson: 8,
    name: "chorus gold",
    source: `const chorus = song.section("chorus");
at(chorus.bars, () => {
  square.side("north").pulse(4, "gold");
  square.side("south").pulse(4, "gold");
});
at(chorus.start, () => console.log("chorus starts at", now()));
`,
  },
  {
    lesson: 8,
    name: "verse and chorus moods",
    source: `// quiet verse, LOUD chorus
const verse = song.section("verse");
const chorus = song.section("chorus");

at(verse.start, () => square.all.fadeTo(60, 4));
at(chorus.start, () => square.all.fadeTo(100, 4));
at(chorus.end, () => {
  square.all.fadeTo(0, 4);
});
`,
  },
  {
    lesson: 8,
    name: "turn by turn on the beat",
    source: `const north = square.side("north");
const verse = song.section("verse");
at(verse.beats, (turn) => {
  if (turn % 4 === 0) {
    square.front("tree").pulse(2, "white");
  } else {
    square.front("tree").pulse(1, "green");
  }
});
at(verse.bars, turn => north.everyNth(2, turn % 2).pulse(4, "gold"));
`,
  },
  {
    lesson: 8,
    name: "both choruses",
    source: `function party(chorus) {
  at(chorus.start, () => square.all.on(80));
  at(chorus.bars, turn => {
    if (turn % 2 === 0) square.all.colour("tomato");
    else square.all.colour("gold");
  });
  at(chorus.end, () => square.all.off());
}
party(song.section("chorus", 1));
party(song.section("chorus", 2));
console.log("the song is " + song.bars.length + " bars long");
`,
  },
  {
    lesson: 8,
    name: "wave in every second bar",
    source: `const where = song.section("verse", 2);
const east = square.side("east");

at(where.bars, function (turn) {
  if (turn % 2 === 1) { return; }
  east.inTurn(0.5, f => f.pulse(4, "aquamarine"));
});

// the last thing: everything on, just before the end
at(song.end - 16, () => square.all.fadeTo(100, 8));
`,
  },
  {
    lesson: 9,
    name: "my colour list",
    source: `const colours = ["tomato", "gold", "teal", "orchid"];
const chorus = song.section("chorus");

at(chorus.bars, (turn) => {
  square.fronts.pulse(4, colours[turn % colours.length]);
});
console.log(colours.length, "colours, first one", colours[0]);
`,
  },
  {
    lesson: 9,
    name: "everybody but the bakery",
    source: `const bakery = square.front("bakery");
const others = square.fronts.except(bakery);
others.on();
wait(8);
others.off();
bakery.on();     // now it is alone
wait(8);
bakery.off();
wait(2)
others.and(bakery).pulse(8, "gold");
`,
  },
  {
    lesson: 9,
    name: "left right",
    source: `const [left, right] = square.side("north").split(2);
for (let i = 0; i < 4; i++) {
  left.pulse(4, "red");
  wait(4);
  right.pulse(4, "blue");
  wait(4);
}
// from the middle to the outside
left.reversed().inTurn(1, f => f.pulse(4));
right.inTurn(1, f => f.pulse(4));
`,
  },
  {
    lesson: 9,
    name: "raffle",
    source: `let winners = "";
const shops = square.fronts;

repeat(8, () => {
  const winner = oneOf(shops);
  winner.pulse(6, oneOf(["gold", "hotpink", "lime"]));
  winners = winners + winner.name + "! ";
  wait(4);
});

console.log("the winners are", winners);
`,
  },
  {
    lesson: 9,
    name: "mixed up switching on",
    source: `// shuffled = like cards
const mixed = square.side("west").shuffled();
mixed.inTurn(1, front => front.fadeTo(100, 4));
wait(40);
const order = mixed.reversed();
for (let i = 0; i < order.length; i++) {
  order[i].off();
  wait(1);
}
`,
  },
  {
    lesson: 10,
    name: "two layers at once",
    source: `function bottom() {
  repeat(8, () => {
    square.side("south").pulse(4, "royalblue");
    wait(4);
  });
}
function top() {
  for (const front of square.side("north")) {
    front.pulse(4, "gold");
    wait(2);
  }
}

together(bottom, top);
console.log(\`both are done at beat \${now()}\`);
`,
  },
  {
    lesson: 10,
    name: "drums on the colour shops",
    source: `const chorus = song.section("chorus");
const drums = song.hits("drums", chorus);
const colourShops = square.fronts.filter(front => front.box === "colour");
console.log(\`the drummer hits \${drums.length} times\`);

at(drums, (turn) => {
  colourShops[turn % colourShops.length].pulse(1, "white");
});
`,
  },
  {
    lesson: 10,
    name: "loud or quiet",
    source: `let loudBars = 0;
for (const bar of song.bars) {
  waitUntil(bar);
  if (song.howLoud(bar) > 50) {
    loudBars++;
    square.all.pulse(4, "orangered");
  } else {
    square.front("tree").pulse(4, "lightblue");
  }
}
console.log(\`\${loudBars} loud bars of \${song.bars.length}\`);
`,
  },
  {
    lesson: 10,
    name: "plan as objects",
    source: `const plan = [
  { shop: "bakery", colour: "gold", beats: 4 },
  { shop: "tea room", colour: "tomato", beats: 6 },
  { shop: "hat shop", colour: "skyblue", beats: 8 },
];

waitUntil(song.section("verse").start);
for (const step of plan) {
  console.log(\`\${step.shop} gets \${step.colour}\`);
  square.front(step.shop).pulse(step.beats, step.colour);
  wait(step.beats);
}
`,
  },
  {
    lesson: 10,
    name: "meet at the chorus",
    source: `const chorus = song.section("chorus");
const north = square.side("north");

square.side("south").fadeTo(80, 8);
wait(8);
// waiting for the best part...
waitUntil(chorus.start);
together(
  () => {
    repeat(4, () => { north.pulse(4, "gold"); wait(4); });
  },
  () => {
    wait(2);
    repeat(3, () => { square.front("tree").pulse(2, "red"); wait(4); });
  },
);
square.side("south").fadeTo(0, 4);
`,
  },
  {
    lesson: 11,
    name: "bells climb the fronts",
    source: `const bells = song.notes("bells", song.section("verse"));
const pretty = square.fronts.filter((f) => f.box === "colour");

for (const note of bells) {
  at(note.start, () => {
    const f = pretty[note.pitch % pretty.length];
    f.pulse(2, hue(note.pitch * 30));
  });
}
console.log(\`\${bells.length} notes\`);
`,
  },
  {
    lesson: 11,
    name: "rainbow strips",
    source: `const strips = square.parts("strip");
strips.on();
at(song.section("chorus").bars, (turn) => {
  for (const strip of strips) {
    strip.lights.forEach((pixel, i) => pixel.colour(hue(i * 10 + turn * 45)));
  }
});
`,
  },
  {
    lesson: 11,
    name: "a colour for each section",
    source: `// every section has its own colour (I made a table)
const table = [
  { name: "intro", colour: "skyblue" },
  { name: "verse", colour: "seagreen" },
  { name: "chorus", colour: "gold" },
];

for (const section of song.sections) {
  const row = table.find(r => r.name === section.name);
  const colour = row ? row.colour : "white";   // when it is not in my table
  console.log(section.name, "->", colour);
  at(section.bars, () => square.fronts.pulse(4, colour));
}
`,
  },
  {
    lesson: 11,
    name: "running pixel",
    source: `const strips = square.parts("strip");
const pixels = strips.lights;
let place = 0;

while (place < pixels.length && now() < 64) {
  pixels[place].pulse(2, hue(place * 7));
  place = place + 1;
  wait(0.25);
}
console.log("got to pixel " + place + " of " + pixels.length);
`,
  },
  {
    lesson: 11,
    name: "high and low bells",
    source: `const verse = song.section("verse");
const notes = song.notes("bells", verse);
let highest = 0;
notes.forEach(n => { if (n.pitch > highest) { highest = n.pitch; } });
console.log("highest pitch:", highest);

const high = notes.filter(n => n.pitch > highest - 5);
const low  = notes.filter(n => n.pitch <= highest - 5);

for (const n of high) at(n.start, () => square.front("tree").pulse(1, "white"));
for (const n of low)  at(n.start, () => square.front("hat shop").pulse(2, "navy"));
`,
  },
  {
    lesson: 12,
    name: "breathing with types",
    source: `const bar = song.beatsPerBar;

function breathe(lights: Lights, low: number, high: number) {
  lights.fadeTo(high, bar);
  wait(bar);
  lights.fadeTo(low, bar);
  wait(bar);
}

waitUntil(song.bar(5));
repeat(4, () => breathe(square.side("north"), 0, 100));
repeat(4, () => breathe(square.side("south"), 0, 90));
`,
  },
  {
    lesson: 12,
    name: "ten seconds of gold",
    source: `// the mayor talks for ten seconds so it must be calm
const calm: number = beatsIn(10);
square.all.colour("gold").fadeTo(60, calm);
wait(calm);
console.log(\`ten seconds are \${calm} beats\`);
square.all.fadeTo(100, 4);
at(song.end - 8, () => square.all.fadeTo(0, 8));
`,
  },
  {
    lesson: 12,
    name: "cue sheet by bar numbers",
    source: `interface Step { bar: number; side: string; colour: string }

const sheet: Step[] = [
  { bar: 1, side: "north", colour: "gold" },
  { bar: 5, side: "east", colour: "tomato" },
  { bar: 9, side: "south", colour: "teal" },
  { bar: 13, side: "west", colour: "orchid" },
];

function play(step: Step): void {
  at(song.bar(step.bar), () => {
    square.side(step.side).inTurn(0.5, (front) => front.pulse(6, step.colour));
  });
}
sheet.forEach(step => play(step));
at(song.bar(17, 3), () => square.all.pulse(6));
`,
  },
  {
    lesson: 12,
    name: "whole show with a switch",
    source: `const north = square.side("north");
const south = square.side("south");

function verse(where: Section) {
  at(where.bars, (turn: number) => north.everyNth(2, turn % 2).pulse(4, "skyblue"));
}
function chorus(where: Section) {
  at(where.bars, (turn: number) => {
    const side = turn % 2 === 0 ? north : south;
    side.inTurn(0.25, (f) => f.pulse(4, "gold"));
  });
  at(song.hits("drums", where), () => square.front("tree").pulse(0.5, "red"));
}

for (const s of song.sections) {
  switch (s.name) {
    case "verse":
      verse(s);
      break;
    case "chorus":
      chorus(s);
      break;
    default:
      at(s.start, () => square.all.pulse(8, "white"));
  }
}
`,
  },
  {
    lesson: 12,
    name: "grand finale",
    source: `const colours: string[] = ["crimson", "gold", "limegreen", "dodgerblue"];
const length: Beats = song.beatsPerBar * 2;

function flashSide(name: string, n: number) {
  square.side(name).pulse(length, colours[n]);
  wait(song.beatsPerBar);
}

// 8 bars before the end it begins
const last = song.bars.length;
waitUntil(song.bar(last - 7));
["north", "east", "south", "west"].forEach((name, n) => flashSide(name, n));

// and now ALL
square.all.fadeTo(100, song.beatsPerBar);
wait(length);
if (now() < song.end) {
  console.log(\`\${song.end - now()} beats left, lights out!\`);
  square.all.fadeTo(0, song.beatsPerBar);
}
`,
  },
];
