import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { listUnmet, listUses, type UseKind } from "./use.ts";

const lines = (source: string, kind: UseKind) =>
  listUses(source)
    .filter((use) => use.kind === kind)
    .map(({ name, line }) => `${line} ${name}`);

const SCRIPT = `// for every front, if you like
const north = square.side("north");
function flash(lights: Lights, beats = 1) {
  lights.pulse(beats, "for");
}
const rest = () => wait(1);
for (const front of north) {
  for (let i = 0; i < 4; i++) {
    if (i % 2 === 0) flash(front);
    rest();
  }
}
const chorus = song.section("chorus");
at(chorus.bars, turn => square.fronts[turn % 3].on(turn > 2 ? 50 : 90));
repeat(2, () => north.inTurn(0.5, f => f.off()));
`;

describe("listUses", () => {
  it("finds loops and loops in loops, those of the language too", () => {
    expect(lines(SCRIPT, "loop")).toEqual(["7 for", "8 for", "15 repeat", "15 inTurn"]);
    expect(lines(SCRIPT, "nested-loop")).toEqual(["8 for", "15 inTurn"]);
  });
  it("does not take a loop's head for its body, nor two loops in a row for nested ones", () => {
    expect(
      lines("for (const f of square.fronts.map(x => x)) f.on();\nwhile (now() < 4) wait(1);", "nested-loop"),
    ).toEqual([]);
  });
  it("finds functions of the script's own, with and without parameters", () => {
    expect(lines(SCRIPT, "function")).toEqual(["3 flash", "6 rest"]);
    expect(lines(SCRIPT, "function-with-parameters")).toEqual(["3 flash"]);
  });
  it("finds conditions, lists and the song", () => {
    expect(lines(SCRIPT, "condition")).toEqual(["9 if", "14 ? :"]);
    expect(lines(SCRIPT, "list")).toEqual(["14 [ ]"]);
    expect(lines("const [a, b] = square.all.split(2);\nconst c = [a, b];", "list")).toEqual(["1 [ ]", "2 [ ]"]);
    expect(lines(SCRIPT, "song-data")).toEqual(["13 song.section"]);
  });
  it("finds every kind of loop and condition of the language", () => {
    const script = `for (let i = 0; i < 2; i++) wait(1);
for (const front of square.fronts) front.on();
while (now() < 8) wait(1);
do {
  wait(1);
} while (now() < 16);
square.fronts.forEach((front) => front.off());
switch (roll(2)) {
  case 1:
    square.all.on(chance(50) ? 40 : 90);
}
`;
    expect(lines(script, "loop")).toEqual(["1 for", "2 for", "3 while", "4 while", "7 forEach"]);
    expect(lines(script, "condition")).toEqual(["8 switch", "10 ? :"]);
    expect(lines(script, "nested-loop")).toEqual([]);
  });
  it("finds a loop in a loop through callbacks and blocks, three deep too", () => {
    const script = `repeat(2, () => {
  if (now() < 4) {
    square.fronts.forEach((front) => {
      for (const light of front.lights) light.on();
    });
  }
});
`;
    expect(lines(script, "nested-loop")).toEqual(["3 forEach", "4 for"]);
  });
  it("finds functions however they are written, and counts parameters with a default", () => {
    const script = `function a() {}
const b = function (level: number) {};
const c = (lights: Lights, beats = 1) => lights.pulse(beats);
at(4, () => a());
`;
    expect(lines(script, "function")).toEqual(["1 a", "2 b", "3 c"]);
    expect(lines(script, "function-with-parameters")).toEqual(["2 b", "3 c"]);
  });
  it("finds what is read of the song by point, bracket and pattern, and of nothing else called song", () => {
    const script = `const { bars, sections: parts } = song;
at(song["beats"], () => square.all.on());
at((song).end, () => square.all.off());
console.log("song.bars", parts.length, bars.length);
const mine = { song: 1 };
console.log(mine.song);
`;
    expect(lines(script, "song-data")).toEqual(["1 song.bars", "1 song.sections", '2 song["beats"]', "3 song.end"]);
  });
  it("finds words of the language, but not in comments, texts or names that the script gives", () => {
    expect(lines("// wait(1)\nlet bar = 'repeat';\nsquare.all.on();\nbar.length;", "word")).toEqual([
      "3 on",
      "3 all",
      "3 square",
      "4 length",
    ]);
  });
  it("reads what it can of a script with a mistake, and never throws", () => {
    expect(lines("for (const f of square.fronts) {\n  f.on();", "loop")).toEqual(["1 for"]);
    expect(listUses("(".repeat(20_000))).toEqual([]);
    fc.assert(fc.property(fc.string({ maxLength: 60 }), (source) => Array.isArray(listUses(source))));
  });
});

describe("listUnmet", () => {
  it("keeps what is asked for and not there, or not often enough", () => {
    expect(
      listUnmet(SCRIPT, [
        { kind: "loop", atLeast: 4 },
        { kind: "function", atLeast: 3 },
        { kind: "song-data", atLeast: 1 },
      ]),
    ).toEqual([{ kind: "function", atLeast: 3 }]);
    expect(listUnmet("", [{ kind: "loop", atLeast: 1 }])).toHaveLength(1);
  });
});
