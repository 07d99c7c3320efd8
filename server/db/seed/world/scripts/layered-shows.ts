import { written } from "./demo-script.ts";
import type { DemoScript } from "./demo-script.ts";

/** Shows of the oldest class, with the words of lessons 9 to 12: lists, layers, melody, typed parameters. */
export const LAYERED_SHOWS: readonly DemoScript[] = [
  written({
    id: "melody-map",
    title: "Melody Map",
    songId: "quillhaven-bells",
    authors: ["8A-TARN/abel"],
    lesson: 11,
    about: "High notes on the left, low notes on the right.",
    source: `
const north = square.side("north");
const bells = song.notes("bells");
let lowest = 127;
let highest = 0;
for (const note of bells) {
  lowest = Math.min(lowest, note.pitch);
  highest = Math.max(highest, note.pitch);
}
for (const note of bells) {
  const share = (note.pitch - lowest) / (highest - lowest);
  const house = Math.round(share * (north.length - 1));
  at(note.start, () => north[house].pulse(Math.max(1, note.beats), hue(30 + share * 180)));
}
at(song.section("bridge").start, () => square.side("south").colour("navy").fadeTo(40, 8));
at(song.section("bridge").end, () => square.side("south").fadeTo(0, 8));
`,
  }),
  written({
    id: "rainbow-hall",
    title: "Rainbow Hall",
    songId: "frost-fair",
    authors: ["8A-TARN/bianca", "8A-TARN/caspian"],
    lesson: 11,
    about: "Colour circles on both strips; many cues.",
    source: `
const strips = square.parts("strip");
strips.fadeTo(70, 8);
at(song.beats, (beat) => {
  for (const strip of strips) {
    strip.forEach((pixel, i) => {
      pixel.colour(hue(i * 6 + beat * 30), 1);
    });
  }
});
at(song.section("chorus").bars, () => square.parts("roof").everyNth(2).pulse(3, "white"));
at(song.section("chorus", 2).bars, () => square.parts("roof").everyNth(2, 1).pulse(3, "white"));
at(song.section("ending").start, () => strips.fadeTo(0, 14));
`,
  }),
  written({
    id: "four-bands",
    title: "Four Bands",
    songId: "jingle-bells",
    authors: ["8A-TARN/dina"],
    lesson: 10,
    about: "A side for every instrument, with an object as a table.",
    source: `
const band = {
  bells: square.side("north"),
  flute: square.side("east"),
  bass: square.side("south"),
};
for (const section of song.sections) {
  for (const hit of song.hits("bells", section)) {
    at(hit, () => oneOf(band.bells).pulse(1, "gold"));
  }
  for (const hit of song.hits("flute", section)) {
    at(hit, () => oneOf(band.flute).pulse(1, "palegreen"));
  }
}
at(song.bars, (turn) => {
  band.bass[turn % band.bass.length].pulse(4, "slateblue");
  if (song.howLoud(song.bars[turn]) > 60) {
    square.side("west").fadeTo(50, 2);
  } else {
    square.side("west").fadeTo(15, 2);
  }
});
`,
  }),
  written({
    id: "mirror-square",
    title: "Mirror Square",
    songId: "good-king-wenceslas",
    authors: ["8A-TARN/ezra"],
    lesson: 9,
    about: "Builds its own list of pairs.",
    source: `
const north = square.side("north");
const south = square.side("south").reversed();
const pairs = [];
for (let i = 0; i < north.length; i++) {
  pairs.push(north[i].and(south[i]));
}
at(song.bars, (turn) => {
  const pair = pairs[turn % pairs.length];
  pair.colour(turn % 4 < 2 ? "gold" : "coral");
  pair.fadeTo(80, 1);
  wait(3);
  pair.fadeTo(10, 4);
});
at(song.section("ending").start, () => square.all.fadeTo(0, 14));
`,
  }),
  written({
    id: "heartbeat",
    title: "Heartbeat",
    songId: "lantern-waltz",
    authors: ["8A-TARN/freya"],
    lesson: 10,
    about: "Two layers that do not disturb each other.",
    source: `
// layer 1: a slow glow. layer 2: the heart in the town hall
const heart = square.front("town hall").part("strip");

function glow() {
  repeat(18, () => {
    square.parts("windows").fadeTo(45, 6);
    wait(6);
    square.parts("windows").fadeTo(15, 6);
    wait(6);
  });
}

function beat() {
  while (now() < song.end - 6) {
    heart.pulse(1, "crimson");
    wait(1);
    heart.pulse(2, "crimson");
    wait(5);
  }
}

together(glow, beat);
`,
  }),
  written({
    id: "caterpillar",
    title: "Caterpillar",
    songId: "skaters-jig",
    authors: ["8A-TARN/gideon"],
    lesson: 12,
    about: "A class of his own with a method.",
    source: `
class Caterpillar {
  place = 0;
  length: number;
  shade: string;

  constructor(length: number, shade: string) {
    this.length = length;
    this.shade = shade;
  }

  step() {
    const fronts = square.fronts;
    const head = fronts[this.place % fronts.length];
    const tail = fronts[(this.place - this.length + fronts.length) % fronts.length];
    head.colour(this.shade).fadeTo(75, 1);
    tail.fadeTo(0, 1);
    this.place = this.place + 1;
  }
}

const green = new Caterpillar(5, "limegreen");
const red = new Caterpillar(3, "orangered");
repeat(136, (turn) => {
  green.step();
  if (turn % 3 === 0) {
    red.step();
  }
  wait(1);
});
square.all.fadeTo(0, 6);
`,
  }),
  written({
    id: "echo",
    title: "Echo",
    songId: "quillhaven-bells",
    authors: ["8A-TARN/hedda"],
    lesson: 12,
    about: "A function that calls itself, and stops.",
    source: `
// an echo comes back softer each time
function echo(side: number, level: number) {
  if (level < 10) {
    return;
  }
  const names = ["north", "east", "south", "west"];
  square.side(names[side % 4]).colour("lavender").on(level);
  wait(1);
  square.side(names[side % 4]).fadeTo(0, 2);
  wait(1);
  echo(side + 1, level * 0.7);
}

for (const bar of [song.bar(1), song.bar(5), song.bar(9), song.bar(13)]) {
  at(bar, () => echo(0, 90));
}
for (const section of song.sections) {
  if (section.name === "chorus") {
    at(section.bars, (turn) => {
      if (turn % 4 === 0) {
        echo(turn / 4, 80);
      }
    });
  }
}
`,
  }),
  written({
    id: "seconds-count",
    title: "Seconds Count",
    songId: "frost-fair",
    authors: ["8A-TARN/ivo"],
    lesson: 12,
    about: "Counts real seconds with beatsIn.",
    source: `
// a clock on the clockmaker: one pulse every second for a minute
const clock = square.front("clockmaker");
for (let second = 0; second < 60; second++) {
  if (second % 15 === 0) {
    square.side("north").pulse(3, "gold");
  }
  clock.pulse(1);
  wait(beatsIn(1));
}
console.log("a minute is", now(), "beats");
`,
  }),
  written({
    id: "patchwork",
    title: "Patchwork",
    songId: "jingle-bells",
    authors: ["8A-TARN/juno", "8A-TARN/keir"],
    lesson: 9,
    about: "Groups from split, changed by chance.",
    source: `
const patches = square.fronts.shuffled().split(6);
const colours = ["tomato", "gold", "olivedrab", "teal", "royalblue", "plum"];
patches.forEach((patch, i) => {
  patch.colour(colours[i]);
});
for (const nth of [1, 2]) {
  at(song.section("chorus", nth).bars, (turn) => {
    patches[turn % 6].fadeTo(80, 1);
    patches[(turn + 3) % 6].fadeTo(15, 3);
  });
}
at(song.section("verse").bars, (turn) => {
  patches[turn % 6].pulse(4);
});
at(song.section("ending").start, () => {
  patches.forEach((patch, i) => at(now() + i * 2, () => patch.fadeTo(0, 4)));
});
`,
  }),
];
