import { describe, expect, it } from "vitest";
import { buildFront } from "../../tests/factories/small-show.ts";
import { compileScript } from "../language/compile.ts";
import { cuesOf, listCues, printed, runScript, runWell } from "../../tests/support/run-script.ts";

/** The code of the problem that a script has; "none" when it runs. */
async function problemOf(source: string): Promise<string> {
  const outcome = await runScript(source);
  return outcome.ok ? "none" : outcome.problem.code;
}

async function findingsOf(source: string): Promise<string[]> {
  return (await runWell(source)).findings.map((finding) => finding.rule);
}

/**
 * sfc32 in whole numbers of any size, after the description in PractRand (Chris Doty-Humphrey, public
 * domain); the steps and the twelve rounds of warm-up are written from memory.
 */
function referenceSfc32(key: readonly [number, number, number]): () => number {
  const mask = 0xff_ff_ff_ffn;
  let [a, b, c] = key.map((word) => BigInt(word >>> 0)) as [bigint, bigint, bigint];
  let counter = 1n;
  const next = (): number => {
    const result = (a + b + counter) & mask;
    counter = (counter + 1n) & mask;
    a = b ^ (b >> 9n);
    b = (c + (c << 3n)) & mask;
    c = ((((c << 21n) & mask) | (c >> 11n)) + result) & mask;
    return Number(result);
  };
  for (let round = 0; round < 12; round++) next();
  return next;
}

describe("evaluation rules", () => {
  it("1: only wait and waitUntil move the clock", async () => {
    expect(
      await printed(`
      square.all.fadeTo(50, 8); square.all.colour("red", 4); square.side("north").pulse(2);
      console.log(now()); wait(1.5); console.log(now()); waitUntil(4); console.log(now());
    `),
    ).toEqual(["0", "1.5", "4"]);
  });

  it("2: moment 0 is the last beat at or before the first sound; bar 1 is the first whole bar", async () => {
    expect(await printed("console.log(song.start, song.bar(0), song.bar(1), song.end, song.beats.length);")).toEqual([
      "0 0 1 17 17",
    ]);
  });

  it("3: a cue is stamped on the nearest tick and the clock is not rounded", async () => {
    const outcome = await runWell(
      "for (let i = 0; i < 3; i++) { square.all.on(); wait(1 / 7); }\nconsole.log(now() * 960);",
    );
    expect([...outcome.timeline.cues.tick]).toEqual([0, 137, 274]);
    // Three sevenths of a beat are 411.43 ticks; three rounded steps of 137 would be 411 too, seven tell them apart.
    expect(await printed("for (let i = 0; i < 7; i++) wait(1 / 7);\nconsole.log(now());")).toEqual(["1"]);
    expect(outcome.notes[0]?.text).toBe("411");
  });

  it("4: at sets the clock and sets it back; a list gives turns in its own order", async () => {
    expect(await cuesOf("wait(3);\nat([8, 2], turn => square.all.on(turn * 10));\nsquare.all.off();")).toEqual([
      "2 on 10 all @2",
      "3 off all @3",
      "8 on 0 all @2",
    ]);
  });

  it("5: together starts all at once and ends with the longest", async () => {
    expect(
      await printed(
        "wait(1);\ntogether(() => wait(2), () => { console.log(now()); wait(5); }, () => wait(1));\nconsole.log(now());",
      ),
    ).toEqual(["1", "6"]);
  });

  it("6: repeat counts from 0 with the clock running on, rounds down with a note, and refuses less than 0", async () => {
    const outcome = await runWell("repeat(2.5, turn => { console.log(turn, now()); wait(1); });");
    expect(outcome.notes.map((note) => note.text)).toEqual(["0 0", "1 1"]);
    expect(outcome.findings).toMatchObject([{ rule: "count-rounded", severity: "note", lines: [1] }]);
    expect(await problemOf("repeat(-1, () => wait(1));")).toBe("wants-whole");
    expect(
      await printed(
        'wait(2); square.side("north").inTurn(0.5, front => console.log(front.name, now())); console.log(now());',
      ),
    ).toEqual(["bakery 2", "library 2.5", "2"]);
  });

  it("7: an action gets only the arguments it names without a default", async () => {
    expect(await cuesOf("function flash(beats = 1) { square.all.pulse(beats); wait(1); }\nrepeat(2, flash);")).toEqual([
      "0 pulse +1 all @2>1",
      "1 pulse +1 all @2>1",
    ]);
    expect(await printed('square.side("north").inTurn(1, (front, i) => console.log(front.name, i));')).toEqual([
      "bakery 0",
      "library 1",
    ]);
    expect(await printed("repeat(1, (...all) => console.log(all.length));")).toEqual(["0"]);
  });

  it("8: lights are a frozen list in walking order, an item is lights, single lights come once", async () => {
    expect(await cuesOf('const both = square.side("north").and(square.parts("windows"));\nboth.on();')).toEqual([
      "0 on 100 [0 1 2 3] @2",
    ]);
    expect(await problemOf("square.all[0] = square.all[1];")).toBe("can-not-change");
    expect(
      await printed("const one = square.all[3];\nconsole.log(one.length, one[0] === one, [...one].length);"),
    ).toEqual(["1 true 1"]);
  });

  it("9: items of all and lights are lights, of a side fronts, of parts that part of each front, of a front its lights", async () => {
    expect(
      await printed(`console.log(square.all.length, square.fronts.length, square.side("north").length, square.parts("roof").length);
      console.log(square.front("tea room").length, square.front("tea room").part("strip").length, square.fronts.lights.length);
      console.log(square.parts("strip").length, square.parts("strip").lights.length);`),
    ).toEqual(["9 4 2 2", "4 3 9", "1 3"]);
  });

  it("10: walking order goes round the sides and ends with the tree", async () => {
    expect(await printed("for (const front of square.fronts) console.log(front.name);")).toEqual([
      "bakery",
      "library",
      "tea room",
      "tree",
    ]);
    expect(await cuesOf('square.parts("strip").on();')).toEqual(["0 on 100 [5 6 7] @1"]);
  });

  it("11: split makes the first runs longer, everyNth starts at k, except and and go by single lights", async () => {
    expect(
      await printed(`console.log(square.all.split(4).map(run => run.length));
      console.log(square.all.everyNth(4, 1).map(light => light.name));
      console.log(square.all.except(square.side("north")), square.side("north").and(square.front("bakery")), square.side("north").first(1));`),
    ).toEqual(["[3, 2, 2, 2]", '["windows", "strip"]', "5 lights 4 lights 2 lights"]);
    const mixed = (
      await printed("console.log(square.all.shuffled().map(light => light.name).length, square.all.shuffled());")
    )[0];
    expect(mixed).toBe("9 9 lights");
  });

  it("12: an act writes one cue for the whole selection; an empty one writes none and leaves a note", async () => {
    const outcome = await runWell('square.side("north").on(40);\nsquare.front("library").part("roof").on();');
    expect(listCues(outcome.timeline)).toEqual(["0 on 40 [0 1 2 3] @1"]);
    expect(outcome.findings).toMatchObject([{ rule: "nothing-to-light", severity: "note", lines: [2], moments: [0] }]);
  });

  it("13: cues are sorted by moment and then as written", async () => {
    expect(
      await cuesOf(
        "at(2, () => square.all.on(1));\nsquare.all.on(2);\nsquare.all.on(3);\nat(2, () => square.all.on(4));",
      ),
    ).toEqual(["0 on 2 all @2", "0 on 3 all @3", "2 on 1 all @1", "2 on 4 all @4"]);
  });

  it("14, 15 and 16: every act is written with its own fields, fadeTo without beats as a fade of 0", async () => {
    expect(
      await cuesOf(
        'square.all.on(0).off().fadeTo(50, 2).fadeTo(60, 0).colour("red").colour("#00ff00", 1.5).pulse(1).pulse(2, "blue");',
      ),
    ).toEqual([
      "0 on 0 all @1",
      "0 off all @1",
      "0 fadeTo 50 +2 all @1",
      "0 fadeTo 60 all @1",
      "0 colour #ff0000 all @1",
      "0 colour #00ff00 +1.5 all @1",
      "0 pulse +1 all @1",
      "0 pulse #0000ff +2 all @1",
    ]);
  });

  it("17: levels are clamped with a warning; what is no finite number stops the script", async () => {
    const outcome = await runWell("square.all.on(255);\nsquare.all.fadeTo(-3, 1);");
    expect(listCues(outcome.timeline)).toEqual(["0 on 100 all @1", "0 fadeTo 0 +1 all @2"]);
    expect(outcome.findings.map((finding) => [finding.rule, finding.severity, finding.sentence])).toEqual([
      ["level-clamped", "warn", "A level goes from 0 to 100. I used 100."],
      ["level-clamped", "warn", "A level goes from 0 to 100. I used 0."],
    ]);
    expect(await problemOf("square.all.on(0 / 0);")).toBe("not-finite");
    expect(await problemOf("square.all.on(1 / 0);")).toBe("not-finite");
  });

  it("18: a pulse keeps its length and its colour or none", async () => {
    expect(await cuesOf("square.all.pulse(0.25, hue(240));\nsquare.all.pulse(1);")).toEqual([
      "0 pulse #0000ff +0.25 all @1",
      "0 pulse +1 all @2",
    ]);
    expect(await problemOf("square.all.pulse(-1);")).toBe("negative-time");
  });

  it("19 and 20: acts on lights without colour and on switched ones are written all the same", async () => {
    expect(await cuesOf('square.front("bakery").colour("gold").fadeTo(30, 1);')).toEqual([
      "0 colour #ffd700 [0 1] @1",
      "0 fadeTo 30 +1 [0 1] @1",
    ]);
  });

  it("21: cues at or after the end are dropped with a warning, switching off right at the end is silent", async () => {
    const outcome = await runWell("at(song.end, () => square.all.off());");
    expect(outcome.cueCount).toBe(0);
    expect(outcome.findings).toEqual([]);
    const late = await runWell("at(song.end, () => square.all.on());\nat(40, () => square.all.off());");
    expect(late.cueCount).toBe(0);
    expect(late.findings.map((finding) => [finding.rule, finding.lines[0]])).toEqual([
      ["after-the-end", 1],
      ["after-the-end", 2],
    ]);
    expect(late.timeline.endTick).toBe(17 * 960);
  });

  it("22: bars begin with bar 1; bar 0 is the pick-up; after the last bar only beat 1", async () => {
    expect(
      await printed("console.log(song.bars, song.bar(0), song.bar(2, 3), song.bar(1, 4.5), song.bar(5));"),
    ).toEqual(["[1, 5, 9, 13] 0 7 4.5 17"]);
    expect(await problemOf("song.bar(6);")).toBe("no-such-bar");
    expect(await problemOf("song.bar(5, 2);")).toBe("no-such-bar");
    expect(await problemOf("song.bar(1.5);")).toBe("no-such-bar");
    expect(await problemOf("song.bar(2, 5);")).toBe("no-such-beat");
    expect(await problemOf("song.bar(0, 2);")).toBe("no-such-beat");
  });

  it("23: bars, beats, hits and notes of a section are those that begin in it", async () => {
    expect(
      await printed(`const chorus = song.section("chorus");
      console.log(chorus.start, chorus.end, chorus.bars, chorus.beats, song.hits("drums", chorus), song.notes("bells", chorus));
      console.log(song.section("chorus", 2).start, song.sections.map(s => s.name), song.beatsPerBar, song.hits("drums").length);`),
    ).toEqual([
      "5 9 [5] [5, 6, 7, 8] [5, 7] [{ start: 5, beats: 1, pitch: 60 }, { start: 6, beats: 0.5, pitch: 64 }]",
      '13 ["verse", "chorus", "verse", "chorus"] 4 8',
    ]);
  });

  it("24: waitUntil does not go back, but half a tick is no time", async () => {
    expect(await problemOf("wait(8);\nwaitUntil(4);")).toBe("already-passed");
    expect(
      await printed(
        "for (let i = 0; i < 10; i++) wait(0.1);\nwaitUntil(1); console.log(now());\nwait(1 / 3); wait(1 / 3); wait(1 / 3); waitUntil(2); console.log(now());",
      ),
    ).toEqual(["1", "2"]);
  });

  it("25: names match exactly and the nearest is offered", async () => {
    const outcome = await runScript('const name = "Bakery"; square.front(name).on();');
    expect(outcome).toMatchObject({
      ok: false,
      problem: { code: "unknown-front", sentence: 'No front has the name "Bakery". Did you mean "bakery"?' },
    });
    const far = await runScript('const name = "zeppelin"; square.front(name).on();');
    expect(far).toMatchObject({ ok: false, problem: { sentence: 'No front has the name "zeppelin".' } });
  });

  it("26: equal seeds give equal luck, other seeds other luck, equal statements other draws", async () => {
    const source =
      "console.log(roll(1000), roll(1000));\nconsole.log(roll(1000), roll(1000));\nconsole.log([1, 2, 3].map(() => Math.floor(Math.random() * 1000)));";
    const once = await printed(source);
    expect(await printed(source)).toEqual(once);
    expect(await printed(source, { seed: 8 })).not.toEqual(once);
    expect(once[0]).not.toBe(once[1]);
  });

  it("27: another statement, a comment, a type or other spacing leaves a stream as it is", async () => {
    const [alone] = await printed("const a = roll(1000); console.log(a);");
    expect(
      await printed(
        "const b = roll(6);\nif (chance(50)) { wait(1); }\nconst a: number = roll( 1000 ) /* dice */; console.log(a);",
      ),
    ).toEqual([alone]);
    const body = "repeat(3, () => { console.log(roll(1000)); });";
    const edited = "repeat(3, () => { square.all.on(); console.log(roll(1000)); });";
    expect(await printed(edited)).toEqual(await printed(body));
  });

  it("26: a stream is sfc32 of the seed and the statement's key", async () => {
    const source = "console.log([1, 2, 3, 4, 5, 6, 7, 8].map(() => Math.random()));";
    const compiled = compileScript(source, null);
    if (!compiled.ok) throw new Error(compiled.problem.sentence);
    const random = compiled.marked.sites.findIndex((site) => site.node.getText(compiled.file) === "Math.random()");
    const key = compiled.marked.streams[compiled.marked.streamOf[random] ?? -1] ?? [0, 0, 0];
    const next = referenceSfc32([key[0] ^ 7, key[1], key[2]]);
    const [text = ""] = await printed(source, { seed: 7 });
    expect(JSON.parse(text)).toEqual(Array.from({ length: 8 }, () => Number((next() / 2 ** 32).toPrecision(10))));
  });

  it("28: the same front, part, light or side is the same object", async () => {
    expect(
      await printed(`console.log(square.front("bakery") === square.side("north")[0], square.side("north") === square.side("north"));
      console.log(square.parts("roof")[0] === square.front("bakery").part("roof"), square.all[0] === square.front("bakery")[0], square.all === square.all);`),
    ).toEqual(["true true", "true true true"]);
  });

  it("29: a cue records the calling lines through helpers, loops, callbacks and recursion", async () => {
    expect(
      await cuesOf(`function inner() {
  square.all.on();
}
function outer() {
  inner();
  square.all.off();
}
outer();
for (const beat of [1, 2]) {
  at(beat, () => {
    inner();
  });
}
function down(n) {
  if (n === 0) return inner();
  down(n - 1);
  square.all.pulse(n);
}
at(5, () => down(2));
[3].forEach(beat => { wait(beat); outer(); });`),
    ).toEqual([
      "0 on 100 all @8>5>2",
      "0 off all @8>6",
      "1 on 100 all @10>11>2",
      "2 on 100 all @10>11>2",
      "3 on 100 all @20>5>2",
      "3 off all @20>6",
      "5 on 100 all @19>16>15>2",
      "5 pulse +1 all @19>16>17",
      "5 pulse +2 all @19>17",
    ]);
  });

  it("29: a call over several lines names the line of its own word, after arguments that call something", async () => {
    expect(
      await cuesOf(`function level() { wait(0); return 50; }
square.all
  .on(
    level()
  )
  .pulse(1);`),
    ).toEqual(["0 on 50 all @3", "0 pulse +1 all @6"]);
  });

  it("30: a problem keeps what was written before it, marked incomplete", async () => {
    const outcome = await runScript("square.all.on();\nwait(-1);\nsquare.all.off();");
    expect(outcome).toMatchObject({ ok: false, cueCount: 1, timeline: { isComplete: false } });
  });

  it("34: nesting, size, fuel and cues are limited, in this order", async () => {
    expect(await problemOf(`${"(".repeat(81)}1${")".repeat(81)};${" ".repeat(70_000)}`)).toBe("too-deep");
    expect(await problemOf(`wait(1);${" ".repeat(70_000)}`)).toBe("too-long");
    expect(await problemOf("while (true) {}")).toBe("endless");
    expect(await problemOf("while (true) { square.all[0].on(); wait(0.001); }")).toBe("too-many-cues");
    expect(await problemOf("while (true) { square.all[0].on(); }")).toBe("clock-stood-still");
  });

  it("34: a loop in which the clock stands still is told so on a large group, too", async () => {
    // 5000 lights: 800 cues are all the changes that a run may write.
    const pixels = Array.from({ length: 5 }, () => 1000);
    const large = { layout: buildFront(...pixels) };
    const codeOf = async (source: string): Promise<string> => {
      const outcome = await runScript(source, large);
      return outcome.ok ? "none" : outcome.problem.code;
    };
    expect(await codeOf("while (true) square.all.on();")).toBe("clock-stood-still");
    expect(await codeOf("wait(1);\nwhile (true) { square.all.on(); square.all.off(); }")).toBe("clock-stood-still");
    expect(await codeOf("while (true) { square.all.on(); wait(0.001); }")).toBe("too-many-changes");
    expect(await codeOf("for (let i = 0; i < 900; i++) {\n  square.all.on();\n  if (i % 300 === 0) wait(1);\n}")).toBe(
      "too-many-changes",
    );
    expect(await codeOf("for (let i = 0; i < 800; i++) square.all.on();")).toBe("none");
  });

  it("34: 100 calls deep runs and 101 do not; through the library 25", async () => {
    const plain = (depth: number): string => `function down(n) { if (n > 1) down(n - 1); }\ndown(${depth});`;
    expect(await problemOf(plain(100))).toBe("none");
    expect(await problemOf(plain(101))).toBe("calls-itself");
    const through = (depth: number): string =>
      `function down(n) { if (n > 1) repeat(1, () => down(n - 1)); }\ndown(${depth});`;
    expect(await problemOf(through(26))).toBe("none");
    expect(await problemOf(through(27))).toBe("calls-itself");
    const native = (depth: number): string =>
      `function down(n) { if (n > 1) [n].forEach(() => down(n - 1)); }\ndown(${depth});`;
    expect(await problemOf(native(20))).toBe("none");
  });

  it("prints lights, fronts, sections, lists and objects as a reader expects", async () => {
    expect(
      await printed(`console.log(square.all, square.front("bakery"), square.side("north"), square.all[0], song.section("verse"));
      console.log(0.1 + 0.2, [1, "two", [3]], { level: 50, on: true }, undefined, null, "text");
      console.log(new Map([["a", 1]]), new Set([1, 2]), () => 1);`),
    ).toEqual([
      '9 lights front "bakery" 4 lights 1 light section "verse"',
      '0.3 [1, "two", [3]] { level: 50, on: true } undefined null text',
      "{ a: 1 } [1, 2] a function",
    ]);
  });

  it("findings of the text are told beside a good run", async () => {
    expect(await findingsOf("for (const front of square.fronts) {\n  at(2, () => front.on());\n}")).toEqual([
      "same-each-turn",
    ]);
    expect(await findingsOf("at(song.bars, () => {\n  square.all.on();\n  wait(2);\n});")).toEqual(["last-wait"]);
    expect(await findingsOf("wait(500);")).toEqual(["long-wait"]);
  });
});
