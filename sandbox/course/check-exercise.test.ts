import { describe, expect, it } from "vitest";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import type { RunOutcome, ScriptNote } from "../engine/model.ts";
import { listFronts, listLights } from "../square/lights.ts";
import { buildTimeline } from "../timeline/build.ts";
import type { WrittenCue } from "../timeline/build.ts";
import type { Timeline } from "../timeline/model.ts";
import { checkExercise } from "./check-exercise.ts";
import { ExerciseCheckSchema } from "./exercise.ts";
import type { ExerciseCheckInput, Use } from "./exercise.ts";

const SONG = demoSong("frost-fair").beatMap;
const FRONTS = listFronts(DEMO_SQUARE);
const lightsOf = (name: string): readonly number[] => FRONTS.find((walked) => walked.front.name === name)?.lights ?? [];
const words = { text: "What is asked for.", hint: "One thing to try." };

type Cue = { readonly beat: number; readonly front: string; readonly line?: number } & Omit<
  WrittenCue,
  "tick" | "lights" | "chain"
>;

function timeline(cues: readonly Cue[]): Timeline {
  const head = {
    language: 1,
    songId: "frost-fair",
    layoutHash: "0".repeat(64),
    seed: 1,
    lightCount: listLights(DEMO_SQUARE).length,
    endTick: (SONG.beats.length - 1) * 960,
    isComplete: true,
  };
  return buildTimeline(
    head,
    cues.map(({ beat, front, line = 1, ...rest }) => ({
      tick: beat * 960,
      lights: lightsOf(front),
      chain: [line],
      ...rest,
    })),
  );
}

/** A check without its words; distributes over the kinds. */
type Bare<Check> = Check extends unknown ? Omit<Check, "id" | "text" | "hint"> : never;

function judge(
  check: Bare<ExerciseCheckInput>,
  cues: readonly Cue[],
  rest: { source?: string; notes?: ScriptNote[]; aim?: readonly Cue[] } = {},
) {
  const parsed = ExerciseCheckSchema.parse({ id: "it", ...words, ...check });
  const outcome: RunOutcome = {
    ok: true,
    timeline: timeline(cues),
    hash: "",
    notes: rest.notes ?? [],
    findings: [],
    fuel: 1,
    cueCount: cues.length,
  };
  const aim = rest.aim === undefined ? null : timeline(rest.aim);
  const [result] = checkExercise(
    { checks: [parsed] },
    { outcome, source: rest.source ?? "", layout: DEMO_SQUARE, song: SONG, aim },
  );
  if (!result) throw new Error("No result.");
  return result;
}

const on = (beat: number, front: string, line = 1): Cue => ({ beat, front, action: "on", level: 10_000, line });
const off = (beat: number, front: string, line = 1): Cue => ({ beat, front, action: "off", line });
const colour = (beat: number, front: string, value: number, line = 1): Cue => ({
  beat,
  front,
  action: "colour",
  colour: value,
  length: 0,
  line,
});

describe("checks on the timeline", () => {
  const show = [on(0, "bakery", 1), off(4, "bakery", 3), on(4, "library", 4)];

  it("lit: names the front, the beat and the line that lit it", () => {
    expect(judge({ kind: "lit", lights: { front: "bakery" }, atBeat: 2 }, show)).toMatchObject({
      state: "passed",
      line: 1,
      tick: 1920,
      seen: "The bakery was lit at beat 2.",
      hint: null,
    });
    expect(judge({ kind: "lit", lights: { front: "bakery" }, atBeat: 5 }, show)).toMatchObject({
      state: "not-yet",
      line: null,
      seen: "The bakery was dark at beat 5.",
      hint: words.hint,
    });
    expect(judge({ kind: "lit", lights: { side: "north" }, atBeat: 2 }, show)).toMatchObject({ state: "not-yet" });
    expect(judge({ kind: "lit", lights: { side: "north" }, atBeat: 2, share: 0.01 }, show)).toMatchObject({
      state: "passed",
    });
  });

  it("lit: a choice that names no light is never passed", () => {
    expect(judge({ kind: "lit", lights: { front: "nowhere" }, atBeat: 2 }, show)).toMatchObject({ state: "not-yet" });
  });

  it("dark: names the line that still lights it", () => {
    expect(judge({ kind: "dark", lights: { front: "library" }, atBeat: 5 }, show)).toMatchObject({
      state: "not-yet",
      line: 4,
      seen: "The library was still lit at beat 5.",
    });
    expect(judge({ kind: "dark", lights: { front: "library" }, atBeat: 3 }, show)).toMatchObject({ state: "passed" });
  });

  it("colour: at any level, of lights that can show one", () => {
    const golden = [on(0, "bookshop"), colour(0, "bookshop", 0xffd700, 2)];
    expect(judge({ kind: "colour", lights: { front: "bookshop" }, atBeat: 1, colour: "gold" }, golden)).toMatchObject({
      state: "passed",
    });
    expect(judge({ kind: "colour", lights: { front: "bookshop" }, atBeat: 1, colour: "tomato" }, golden)).toMatchObject(
      { state: "not-yet", seen: "The bookshop was not tomato at beat 1." },
    );
    const dim: Cue[] = [{ ...on(0, "bookshop"), level: 3000 }, colour(0, "bookshop", 0xff6347)];
    expect(judge({ kind: "colour", lights: { front: "bookshop" }, atBeat: 1, colour: "tomato" }, dim)).toMatchObject({
      state: "passed",
    });
    // The bakery has plain lamps: it shows no colour.
    expect(
      judge({ kind: "colour", lights: { front: "bakery" }, atBeat: 1, colour: "gold" }, [on(0, "bakery")]),
    ).toMatchObject({ state: "not-yet" });
  });

  it("order and walking order", () => {
    expect(judge({ kind: "order", fronts: ["bakery", "library"] }, show)).toMatchObject({ state: "passed" });
    expect(judge({ kind: "order", fronts: ["library", "bakery"] }, show)).toMatchObject({
      state: "not-yet",
      seen: "The bakery came on before the library.",
    });
    expect(judge({ kind: "order", fronts: ["bakery", "cinema"] }, show)).toMatchObject({
      state: "not-yet",
      seen: "The cinema was never lit.",
    });
    expect(judge({ kind: "in-walking-order", atLeast: 2 }, show)).toMatchObject({ state: "passed" });
    expect(judge({ kind: "in-walking-order", atLeast: 3 }, show)).toMatchObject({
      state: "not-yet",
      seen: "2 fronts came on.",
    });
    expect(judge({ kind: "in-walking-order", atLeast: 2 }, [on(0, "bakery"), on(0, "library")])).toMatchObject({
      state: "not-yet",
      seen: "The library came on at the same time as the bakery.",
    });
  });

  it("counts fronts, colours and cues", () => {
    expect(judge({ kind: "fronts-lit", atLeast: 2 }, show)).toMatchObject({
      state: "passed",
      seen: "2 fronts were lit.",
    });
    expect(judge({ kind: "fronts-lit", atLeast: 1 }, [])).toMatchObject({
      state: "not-yet",
      seen: "0 fronts were lit.",
    });
    const two = [on(0, "bookshop"), colour(0, "bookshop", 0xffd700), colour(4, "bookshop", 0x87ceeb)];
    expect(judge({ kind: "colours-seen", atLeast: 2 }, two)).toMatchObject({ state: "passed" });
    expect(judge({ kind: "colours-seen", atLeast: 3 }, two)).toMatchObject({
      state: "not-yet",
      seen: "2 colours were seen.",
    });
    expect(judge({ kind: "cue-count", action: "on", atLeast: 2 }, show)).toMatchObject({ state: "passed" });
    expect(judge({ kind: "cue-count", action: "pulse", atLeast: 1 }, show)).toMatchObject({
      state: "not-yet",
      seen: "`pulse` ran 0 times.",
    });
    expect(judge({ kind: "cue-count", atLeast: 1, atMost: 2 }, show)).toMatchObject({
      state: "not-yet",
      seen: "The lights changed 3 times.",
    });
  });

  it("looks at the end", () => {
    expect(judge({ kind: "lasts-until", beat: 4 }, show)).toMatchObject({ state: "passed" });
    expect(judge({ kind: "lasts-until", beat: 5 }, show)).toMatchObject({
      state: "not-yet",
      seen: "The last change was at beat 4.",
    });
    expect(judge({ kind: "dark-at-the-end" }, show)).toMatchObject({
      state: "not-yet",
      seen: "The library stayed lit.",
      line: 4,
    });
    expect(judge({ kind: "dark-at-the-end" }, [...show, off(8, "library")])).toMatchObject({ state: "passed" });
    expect(judge({ kind: "dark-at-the-end" }, [])).toMatchObject({ state: "not-yet", seen: "Nothing was ever lit." });
  });

  it("compares with the aim and names the first place that differs", () => {
    expect(judge({ kind: "same-as-aim" }, show, { aim: show })).toMatchObject({ state: "passed" });
    expect(
      judge({ kind: "same-as-aim" }, [on(0, "bakery"), off(4, "bakery"), on(6, "library")], { aim: show }),
    ).toMatchObject({ state: "not-yet", tick: 3840 });
    expect(judge({ kind: "same-as-aim" }, show, {})).toMatchObject({
      state: "not-yet",
      seen: "The aim could not be run.",
    });
  });
});

describe("checks on the script and its notes", () => {
  const source =
    '// wait wait\nconst mood = "gold";\nlet gap = 1;\nfor (const front of square.fronts) {\n  for (let i = 0; i < 2; i++) {\n    wait(gap);\n  }\n}\ngap = gap + 1;\nconst twice = () => wait(2);\n';

  it("finds uses in the syntax tree", () => {
    const uses = (what: Use) => judge({ kind: "uses", what }, [], { source });
    expect(uses("for-of")).toMatchObject({ state: "passed", line: 4 });
    expect(uses("for")).toMatchObject({ state: "passed" });
    expect(uses("nested-loop")).toMatchObject({ state: "passed", line: 5 });
    expect(uses("changing-variable")).toMatchObject({ state: "passed", line: 9 });
    expect(uses("function")).toMatchObject({ state: "passed", line: 10 });
    expect(uses("if")).toMatchObject({ state: "not-yet", seen: "I found no `if`." });
    // Loops' own variables are not the learner's.
    expect(judge({ kind: "uses", what: "variable", atLeast: 4 }, [], { source })).toMatchObject({
      state: "not-yet",
      seen: "I found a variable 3 times.",
    });
  });

  it("counts words and quoted texts, not comments", () => {
    expect(judge({ kind: "word", word: "wait", atLeast: 2, atMost: 2 }, [], { source })).toMatchObject({
      state: "passed",
    });
    expect(judge({ kind: "quoted", quoted: "gold", atLeast: 1, atMost: 1 }, [], { source })).toMatchObject({
      state: "passed",
    });
    expect(judge({ kind: "quoted", quoted: "tomato", atLeast: 1 }, [], { source })).toMatchObject({ state: "not-yet" });
  });

  it("reads notes", () => {
    const notes = [{ line: 3, text: "gap is 2", tick: 960 }];
    expect(judge({ kind: "note", atLeast: 1, says: "gap is 2" }, [], { notes })).toMatchObject({
      state: "passed",
      line: 3,
      tick: 960,
    });
    expect(judge({ kind: "note", atLeast: 1, says: "gap is 3" }, [], { notes })).toMatchObject({
      state: "not-yet",
      seen: 'The first note says "gap is 2".',
    });
    expect(judge({ kind: "note", atLeast: 1 }, [])).toMatchObject({ state: "not-yet", seen: "No notes were printed." });
  });
});

describe("a script that a problem stopped", () => {
  it("leaves every check waiting", () => {
    const problem = {
      code: "endless",
      sentence: "",
      hint: "",
      range: { line: 1, column: 1, endLine: 1, endColumn: 2 },
      excerpt: "",
    };
    const outcome: RunOutcome = { ok: false, problem, timeline: null, notes: [], findings: [], fuel: 0, cueCount: 0 };
    const check = ExerciseCheckSchema.parse({ id: "it", ...words, kind: "fronts-lit", atLeast: 1 });
    expect(
      checkExercise({ checks: [check] }, { outcome, source: "", layout: DEMO_SQUARE, song: SONG, aim: null }),
    ).toEqual([{ id: "it", text: words.text, state: "waiting", seen: null, hint: null, line: null, tick: null }]);
  });
});
