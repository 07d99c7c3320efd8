import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows with the words of lesson 8 and later: they follow the song's bars, sections and instruments. */
export const SONG_SHOWS: readonly DemoScript[] = [
  written({
    id: "nine-foxes",
    title: "Nine Foxes",
    songId: "quillhaven-bells",
    authors: ["7B-TARN/wren", "7B-TARN/idris"],
    lesson: 10,
    about: "The demo's best-known show: forwarded, approved, on Friday night.",
    source: `
// Nine foxes run round the square, each one faster.
const trail = square.fronts.first(20);
const drums = song.hits("drums", song.section("bridge"));

function fox(turn) {
  const speed = 1 - turn * 0.08;
  trail.inTurn(speed, (front) => {
    front.colour("orange").pulse(1.5);
  });
}

repeat(9, (turn) => {
  at(song.bar(5) + turn * 4, () => fox(turn));
});

// where the foxes live, the street breathes
for (const nth of [1, 2]) {
  at(song.section("chorus", nth).bars, () => {
    square.side("south").colour("darkorange").fadeTo(70, 2);
    wait(2);
    square.side("south").fadeTo(20, 2);
  });
  at(song.section("chorus", nth).end, () => square.side("south").fadeTo(0, 4));
}

// they come back for the last chorus
repeat(7, (turn) => {
  at(song.section("chorus", 3).start + turn * 4, () => fox(turn));
});
for (const hit of drums) {
  at(hit, () => square.parts("windows").everyNth(2).pulse(1));
}
at(song.section("ending").start, () => trail.fadeTo(50, 4));
at(song.section("ending").end - 6, () => square.all.fadeTo(0, 6));
`,
  }),
  written({
    id: "bells-up-the-north-side",
    title: "Bells up the North Side",
    songId: "quillhaven-bells",
    authors: ["7B-TARN/ada"],
    lesson: 8,
    about: "Bells climb in the intro, the chorus breathes.",
    source: `
const north = square.side("north");
for (const front of north) {
  front.pulse(1, "gold");
  wait(1);
}

function breathe(turn) {
  north.colour(turn % 2 === 0 ? "gold" : "tomato");
  square.all.fadeTo(80, 2);
  wait(2);
  square.all.fadeTo(25, 2);
}

for (const nth of [1, 2, 3]) {
  at(song.section("chorus", nth).bars, breathe);
}
for (const nth of [1, 2]) {
  at(song.section("verse", nth).bars, () => {
    north.inTurn(0.25, (front) => front.pulse(2, "khaki"));
  });
  at(song.section("verse", nth).start, () => square.all.fadeTo(20, 4));
}
at(song.section("bridge").start, () => square.all.colour("steelblue", 4));
at(song.section("ending").start, () => square.all.fadeTo(0, 14));
`,
  }),
  written({
    id: "frost-letters",
    title: "Frost Letters",
    songId: "frost-fair",
    authors: ["7B-TARN/zoe"],
    lesson: 9,
    about: "Writes letters with lists of fronts.",
    source: `
// each list is a letter, written on the square from above
const f = [0, 1, 2, 3, 10, 11, 14];
const r = [0, 1, 2, 4, 12, 13, 15];
const o = [20, 21, 22, 23, 24, 25];
const s = [30, 31, 33, 35, 37];
const t = [40];
const letters = [f, r, o, s, t];

function write(letter: number[], start: number) {
  at(start, () => {
    for (const place of letter) {
      square.fronts[place].colour("aliceblue").fadeTo(90, 2);
      wait(1);
    }
    wait(6);
    for (const place of letter) {
      square.fronts[place].fadeTo(0, 4);
    }
  });
}

let start = song.bar(1);
for (const letter of letters) {
  write(letter, start);
  start = start + 16;
}
const chorus = song.section("chorus", 2);
at(chorus.bars, (turn) => {
  for (const place of letters[turn % letters.length]) {
    square.fronts[place].pulse(4, "paleturquoise");
  }
});
at(song.section("ending").start, () => {
  square.front("tree").fadeTo(100, 4);
  wait(8);
  square.front("tree").fadeTo(0, 8);
});
`,
  }),
  written({
    id: "two-trains",
    title: "Two Trains",
    songId: "jingle-bells",
    authors: ["7B-TARN/june"],
    lesson: 10,
    about: "Two things at once with together.",
    source: `
// one train leaves the north, one leaves the south. where do they meet?
const [up, down] = square.fronts.split(2);

function train(track, colour, pace) {
  for (const front of track) {
    front.colour(colour);
    front.pulse(2);
    wait(pace);
  }
}

repeat(9, (turn) => {
  const pace = turn % 2 === 0 ? 1 : 0.75; // every second one is an express
  together(
    () => train(up, "tomato", pace),
    () => train(down.reversed(), "gold", 1),
  );
  square.front("tree").pulse(4, "white");
  wait(4);
});
console.log("they are home at beat", now(), "of", song.end);
square.all.fadeTo(0, 4);
`,
  }),
  written({
    id: "hush-then-drums",
    title: "Hush, Then Drums",
    songId: "good-king-wenceslas",
    authors: ["7B-TARN/rafi"],
    lesson: 10,
    about: "Follows how loud the song is.",
    source: `
const windows = square.parts("windows");
const quick = windows.filter((window) => window.box !== "relay");

for (const bar of song.bars) {
  at(bar, () => {
    const loud = song.howLoud(bar);
    if (loud > 55) {
      square.parts("roof").colour("firebrick").fadeTo(70, 2);
    } else {
      square.parts("roof").fadeTo(loud / 2, 2);
    }
  });
}
const last = song.section("chorus", 3);
at(last.beats, (turn) => {
  quick.everyNth(3, turn % 3).pulse(1, "gold");
});
at(song.section("verse").bars, () => quick.everyNth(4).pulse(4, "khaki"));
at(song.section("ending").start, () => square.all.fadeTo(0, 12));
`,
  }),
  written({
    id: "tea-room-waltz",
    title: "Tea Room Waltz",
    songId: "lantern-waltz",
    authors: ["7B-TARN/dara"],
    lesson: 8,
    about: "Three beats a bar; a pick-up before bar 1.",
    source: `
// ONE two three ONE two three
const roofs = square.parts("roof");
const doors = square.parts("door");
const tea = square.front("tea room");

at(song.bar(0), () => tea.pulse(1, "gold"));
at(song.section("chorus").bars, (turn) => {
  tea.pulse(3, "gold");
  roofs.everyNth(2, turn % 2).fadeTo(75, 1);
  wait(1);
  doors.pulse(2);
  wait(1);
  roofs.everyNth(2, turn % 2).fadeTo(15, 1);
});
at(song.section("verse").bars, () => tea.pulse(3, "wheat"));
at(song.section("chorus", 2).bars, (turn) => {
  const side = square.side(["north", "east", "south", "west"][turn % 4]);
  side.colour("peachpuff").fadeTo(70, 1.5);
  wait(1.5);
  side.fadeTo(10, 1.5);
});
at(song.section("ending").start, () => square.all.fadeTo(0, 20));
`,
  }),
  written({
    id: "lantern-walk",
    title: "Lantern Walk",
    songId: "lantern-waltz",
    authors: ["7B-TARN/hana"],
    lesson: 11,
    about: "Follows the flute note by note.",
    source: `
// the flute carries the lantern
const notes = song.notes("flute");
const path = square.fronts;
let place = 0;
let before = 60;

for (const note of notes) {
  if (note.pitch > before) {
    place = place + 1;
  } else if (note.pitch < before) {
    place = place - 1;
  }
  before = note.pitch;
  const here = (place + path.length) % path.length;
  at(note.start, () => {
    path[here].colour("gold");
    path[here].pulse(note.beats + 1);
  });
}
at(song.section("chorus").start, () => square.parts("windows").fadeTo(40, 6));
at(song.section("chorus").end, () => square.parts("windows").fadeTo(0, 6));
console.log("the lantern took", notes.length, "steps");
`,
  }),
  written({
    id: "ice-on-the-millpond",
    title: "Ice on the Millpond",
    songId: "skaters-jig",
    authors: ["7B-TARN/fern"],
    lesson: 11,
    about: "Uses the strips as ice that cracks.",
    source: `
// the strips are the ice
const ice = square.parts("strip");
ice.colour("lightcyan").fadeTo(60, 4);

for (const section of song.sections) {
  at(section.bars, (turn) => {
    const crack = ice.lights.everyNth(7, turn % 7);
    crack.colour(section.name === "chorus" ? "deepskyblue" : "white", 1);
    wait(1);
    crack.colour("lightcyan", 1);
  });
}
at(song.section("verse").bars, (turn) => square.fronts[turn % 41].pulse(4, "powderblue"));
at(song.section("chorus", 2).bars, (turn) => {
  square.fronts[(turn * 3) % 41].pulse(4, "powderblue");
  square.fronts[(turn * 3 + 20) % 41].pulse(4, "powderblue");
});
at(song.section("ending").start, () => ice.fadeTo(0, 14));
`,
  }),
  written({
    id: "ferry-at-six",
    title: "Ferry at Six",
    songId: "frost-fair",
    authors: ["7B-TARN/sara"],
    lesson: 12,
    about: "Uses beatsPerBar and typed parameters.",
    source: `
// the ferry leaves the boathouse and crosses to the cinema
const bar = song.beatsPerBar;
const route = [...square.side("west").reversed(), ...square.side("north")];

function sail(path: Front[], beats: number) {
  const step = beats / path.length;
  for (const front of path) {
    front.colour("deepskyblue", 1);
    front.fadeTo(65, 1);
    wait(step);
  }
}

function horn() {
  square.front("boathouse").pulse(bar, "white");
  wait(bar);
}

horn();
horn();
sail(route, 12 * bar);
horn();
wait(2 * bar);
for (let i = route.length - 1; i >= 0; i--) {
  route[i].fadeTo(0, 4);
  wait(1);
}
for (const mark of [song.bar(24), song.bar(28), song.bar(32)]) {
  at(mark, () => {
    square.front("town hall").part("strip").colour("gold").fadeTo(80, bar);
    wait(2 * bar);
    square.front("town hall").part("strip").fadeTo(0, bar);
  });
}
`,
  }),
  written({
    id: "the-long-hallway",
    title: "The Long Hallway",
    songId: "good-king-wenceslas",
    authors: ["7K-QUILL/jasper"],
    lesson: 9,
    about: "Splits the square in two halves that meet.",
    source: `
const [left, right] = square.fronts.split(2);
const doors = square.parts("door");

at(song.section("intro").start, () => doors.fadeTo(40, 8));
for (const nth of [1, 2, 3]) {
  const verse = song.section("verse", nth);
  at(verse.start, () => {
    left.inTurn(1, (front) => front.pulse(4, "tan"));
    right.reversed().inTurn(1, (front) => front.pulse(4, "tan"));
  });
  at(song.section("chorus", nth).bars, (turn) => {
    const half = turn % 2 === 0 ? left : right;
    half.colour("goldenrod").fadeTo(60, 2);
    wait(2);
    half.fadeTo(20, 2);
  });
}
at(song.section("ending").start, () => square.all.fadeTo(0, 12));
`,
  }),
  written({
    id: "twelve-bars-of-calm",
    title: "Twelve Bars of Calm",
    songId: "frost-fair",
    authors: ["7B-TARN/wren"],
    lesson: 8,
    about: "Sent back once: the last bars are empty.",
    source: `
// calm means slow
at(song.bars, (turn) => {
  if (turn < 12) {
    square.side("north").colour("lightseagreen").fadeTo(20 + turn * 4, 4);
  }
});
at(song.bar(13), () => square.side("north").fadeTo(10, 16));
`,
  }),
  written({
    id: "one-song-two-moods",
    title: "One Song, Two Moods",
    songId: "jingle-bells",
    authors: ["7B-TARN/wren"],
    lesson: 8,
    about: "Verse and chorus differ clearly.",
    source: `
const verse = song.section("verse");
at(verse.bars, (turn) => {
  square.parts("windows").everyNth(3, turn % 3).fadeTo(50, 2);
  wait(2);
  square.parts("windows").everyNth(3, turn % 3).fadeTo(0, 2);
});
for (const nth of [1, 2]) {
  at(song.section("chorus", nth).bars, (turn) => {
    square.side("north").colour(turn % 2 === 0 ? "red" : "green").fadeTo(80, 1);
    square.side("south").colour(turn % 2 === 0 ? "green" : "red").fadeTo(80, 1);
    square.front("tree").pulse(4, "gold");
  });
}
at(song.section("ending").start, () => square.all.fadeTo(0, 10));
`,
  }),
];
